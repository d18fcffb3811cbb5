import { describe, expect, it } from 'vitest';
import { RandomSource } from '../simulation/random-source';
import { fitMotion } from './motion-fit';
import { type LevelFrames } from './whitened-least-squares';

const COUNT = 1800;
const frames: LevelFrames = {
  timeSeconds: Float64Array.from({ length: COUNT }, (_, n) => 2 * n),
  cadenceSeconds: 2,
  used: new Uint8Array(COUNT).fill(1),
  restartFrames: [],
};
const noise = (seed: number) => {
  const random = new RandomSource(seed);
  return frames.timeSeconds.map(() => 0.5 * random.normal());
};
const fitted = (series: Float64Array, given = frames) =>
  fitMotion({ frames: given, series, commands: [], startLines: [] });

describe('the motion fit', () => {
  it('finds lines between frequencies of the grid with amplitude, period and phase', () => {
    const air = noise(1);
    const series = frames.timeSeconds.map(
      (t, n) =>
        0.002 * t +
        6 * Math.cos((2 * Math.PI * t) / 487.3 + 1) +
        0.5 * Math.cos((2 * Math.PI * t) / 37.31) +
        air[n]!,
    );
    const { lines, trend, driftStandardError, noise: sigma } = fitted(series);
    expect(lines).toHaveLength(2);
    const [slow, fast] = lines;
    // Errors of a sine in white noise: amplitude σ·√(2/N) = 0.017, period below 0.01 %; four of these.
    expect(Math.abs(slow!.amplitude - 6)).toBeLessThan(0.07);
    expect(Math.abs(1 / slow!.frequency - 487.3)).toBeLessThan(0.3);
    expect(Math.abs(Math.atan2(-slow!.sine, slow!.cosine) - 1)).toBeLessThan(0.02);
    expect(Math.abs(fast!.amplitude - 0.5)).toBeLessThan(0.07);
    expect(Math.abs(1 / fast!.frequency - 37.31)).toBeLessThan(0.02);
    expect(Math.abs(trend[0]! - 0.002)).toBeLessThan(4 * driftStandardError);
    expect(Math.abs(sigma - 0.5)).toBeLessThan(0.034); // σ/√(2N) = 0.0083; four of these
  });

  it('finds no line in noise in 95 of 100 starts', () => {
    const seeds = Array.from({ length: 100 }, (_, i) => i);
    const quiet = seeds.filter((seed) => fitted(noise(seed)).lines.length === 0);
    expect(quiet.length).toBeGreaterThanOrEqual(95);
  });

  it('leaves a spike out and lets the level start anew at a step', () => {
    const series = noise(3).map((value, n) => value + (n === 700 ? 9 : 0) + (n >= 1200 ? 5 : 0));
    const { frames: after, trend, driftStandardError } = fitted(series);
    expect(after.used[700]).toBe(0);
    expect(after.restartFrames).toEqual([1200]);
    expect(Math.abs(trend[0]!)).toBeLessThan(4 * driftStandardError);
  });

  it('tells the response inside a closed loop, where plain regression is far off', () => {
    const air = noise(5);
    const moves = new Float64Array(COUNT);
    const errors = new Float64Array(COUNT);
    let moved = 0;
    air.forEach((value, n) => {
      errors[n] = value + moved;
      moves[n] = -0.7 * errors[n];
      moved += moves[n];
    });
    const summed = moves.map((_, n) => moves.subarray(0, n).reduce((sum, move) => sum + move, 0));
    const { coefficients, covariance } = fitMotion({
      frames,
      series: errors,
      commands: [summed],
      startLines: [],
    });
    const standardError = Math.sqrt(covariance[0]!);
    expect(standardError).toBeLessThan(0.05); // SCIENCE 4: 2 to 4 % at gain 0.6 over an hour
    expect(Math.abs(coefficients[0]! - 1)).toBeLessThan(3 * standardError);
    const regress = (x: Float64Array) => {
      const pairs = Array.from({ length: COUNT - 1 }, (_, n) => [
        x[n]!,
        errors[n + 1]! - errors[n]!,
      ]);
      const product = pairs.reduce((sum, [a, b]) => sum + a! * b!, 0);
      return product / pairs.reduce((sum, [a]) => sum + a! * a!, 0);
    };
    expect(regress(moves)).toBeCloseTo(1 / 0.7 + 0.5, 0.5); // REFERENCE 11: 1/k + 1/2, to 0.16
  });
});
