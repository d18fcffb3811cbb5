import { describe, expect, it } from 'vitest';
import { RandomSource } from '../simulation/random-source';
import { leastSquares } from '../statistics/least-squares';
import { likeliestWalk } from './likeliest-walk';
import { type LevelFrames, whitenedCost, whitenedLeastSquares } from './whitened-least-squares';

const COUNT = 800;
const framesOf = (count: number, restartFrames: number[] = []): LevelFrames => ({
  timeSeconds: Float64Array.from({ length: count }, (_, n) => 2 * n),
  cadenceSeconds: 2,
  used: new Uint8Array(count).fill(1),
  restartFrames,
});
const series = (frames: LevelFrames, value: (t: number, n: number) => number) =>
  frames.timeSeconds.map(value);

describe('least squares over a wandering level', () => {
  const frames = framesOf(COUNT);
  const random = new RandomSource(1);
  const noise = series(frames, () => random.normal());
  const wave = series(frames, (t) => Math.sin(t / 37));
  const y = series(frames, (t, n) => 5 + 0.3 * t + 2 * wave[n]! + noise[n]!);

  it('is ordinary least squares with a constant when the level stands still', () => {
    const fit = whitenedLeastSquares(frames, 0, [frames.timeSeconds, wave], y);
    const ones = new Float64Array(COUNT).fill(1);
    const plain = leastSquares([frames.timeSeconds, wave, ones], y);
    // The same problem solved by normal equations and by Householder's reflections.
    expect(fit.coefficients[0]).toBeCloseTo(plain.coefficients[0]!, 9);
    expect(fit.coefficients[1]).toBeCloseTo(plain.coefficients[1]!, 9);
    expect(fit.covariance[3]! / plain.covariance[4]!).toBeCloseTo(1, 9);
    expect(fit.squaresByColumns[2]! / plain.residualSquares).toBeCloseTo(1, 9);
  });

  it('is ordinary least squares on first differences when the level is all there is', () => {
    const fit = whitenedLeastSquares(frames, 1e9, [frames.timeSeconds, wave], y);
    const steps = (values: Float64Array) => values.slice(1).map((value, n) => value - values[n]!);
    const plain = leastSquares([frames.timeSeconds, wave].map(steps), steps(y));
    expect(fit.coefficients[1]! / plain.coefficients[1]!).toBeCloseTo(1, 6); // noise 1e-9 of the walk
  });

  it('does not mind jumps at restarts', () => {
    const jumpy = framesOf(COUNT, [200, 501]);
    const jumps = series(jumpy, (_, n) => (n >= 501 ? -40 : n >= 200 ? 7 : 0));
    const moved = y.map((value, n) => value + jumps[n]!);
    const one = whitenedLeastSquares(jumpy, 0.01, [jumpy.timeSeconds, wave], y);
    const other = whitenedLeastSquares(jumpy, 0.01, [jumpy.timeSeconds, wave], moved);
    expect(other.coefficients[1]).toBeCloseTo(one.coefficients[1]!, 9);
  });

  it('gives a column that hangs on others no part', () => {
    const twice = wave.map((value) => 2 * value);
    const fit = whitenedLeastSquares(frames, 0.01, [wave, twice], y);
    expect(fit.coefficients[1]).toBe(0);
    expect(fit.coefficients.every(Number.isFinite)).toBe(true);
  });

  it('tells the cost of a trial as the fit does', () => {
    const columns = [frames.timeSeconds, wave];
    const { cost } = whitenedLeastSquares(frames, 0.02, columns, y);
    expect(whitenedCost(frames, 0.02, columns, y)).toBeCloseTo(cost, 9);
  });

  it('stays finite when nothing is left', () => {
    const flat = new Float64Array(COUNT);
    expect(whitenedLeastSquares(frames, 0.1, [wave], flat).coefficients[0]).toBe(0);
    expect(likeliestWalk(frames, [], flat)).toBeGreaterThan(0);
  });
});

describe('the likeliest walk', () => {
  it.each([0.001, 0.1, 1])('is %d times the noise where that is the truth', (variance) => {
    const frames = framesOf(4000);
    const random = new RandomSource(7);
    let level = 0;
    const y = series(frames, () => {
      level += Math.sqrt(variance) * random.normal();
      return level + random.normal();
    });
    const walk = likeliestWalk(frames, [], y) * frames.cadenceSeconds;
    // 2048 frames tell the logarithm of the ratio to about 0.25 at the least of these; three of that.
    expect(Math.abs(Math.log(walk / variance))).toBeLessThan(0.75);
  });
});
