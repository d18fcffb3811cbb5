import { describe, expect, it } from 'vitest';
import { RandomSource } from '../simulation/random-source';
import { ColourFilter } from './colour-filter';
import { LevelWhitening } from './level-whitening';

const every = (count: number) => new Uint8Array(count).fill(1);
const times = (count: number) => Float64Array.from({ length: count }, (_, n) => 2 * n);
const lag1 = (values: Float64Array) => {
  const squares = values.reduce((sum, value) => sum + value * value, 0);
  return values.reduce((sum, value, n) => sum + value * (values[n - 1] ?? 0), 0) / squares;
};

describe('whitening over a wandering level', () => {
  it('takes the mean so far off where the level stands still (by hand)', () => {
    const whitening = new LevelWhitening({
      timeSeconds: times(3),
      used: every(3),
      restartFrames: [],
      walkPerSecond: 0,
    });
    // Innovations 4 − 2 and 9 − 3; their variances 2 and 3/2.
    const white = whitening.whiten(Float64Array.of(2, 4, 9), new Float64Array(3));
    expect(white[0]).toBe(0);
    expect(white[1]).toBeCloseTo(2 / Math.SQRT2, 12);
    expect(white[2]).toBeCloseTo(6 / Math.sqrt(1.5), 12);
    expect(whitening.count).toBe(2);
    expect(whitening.logDeterminant).toBeCloseTo(Math.log(2 * 1.5), 12);
  });

  it('makes a random walk in noise white', () => {
    const random = new RandomSource(1);
    let level = 0;
    const series = Float64Array.from({ length: 20000 }, () => {
      level += 0.3 * random.normal();
      return level + random.normal();
    });
    const whitening = new LevelWhitening({
      timeSeconds: times(series.length),
      used: every(series.length),
      restartFrames: [],
      walkPerSecond: 0.09 / 2,
    });
    const white = whitening.whiten(series, new Float64Array(series.length));
    expect(Math.abs(lag1(white))).toBeLessThan(0.03); // four times 1/√20000
    const variance = white.reduce((sum, value) => sum + value * value, 0) / whitening.count;
    expect(variance).toBeCloseTo(1, 1); // in units of the noise
  });

  it('knows nothing of what was before a restart', () => {
    const input = { timeSeconds: times(4), used: every(4), walkPerSecond: 0.1 };
    const jumped = new LevelWhitening({ ...input, restartFrames: [2] });
    const white = jumped.whiten(Float64Array.of(0, 0, 500, 500), new Float64Array(4));
    expect([...white]).toEqual([0, 0, 0, 0]);
  });

  it('passes over frames that are not used', () => {
    const whitening = new LevelWhitening({
      timeSeconds: times(3),
      used: Uint8Array.of(1, 0, 1),
      restartFrames: [],
      walkPerSecond: 0,
    });
    const white = whitening.whiten(Float64Array.of(1, NaN, 1), new Float64Array(3));
    expect([...white]).toEqual([0, 0, 0]);
  });
});

describe('colour filter', () => {
  it('makes an autoregressive process white', () => {
    const random = new RandomSource(2);
    let value = 0;
    const series = Float64Array.from({ length: 20000 }, () => {
      value = 0.6 * value + random.normal();
      return value;
    });
    expect(lag1(series)).toBeCloseTo(0.6, 1);
    const white = ColourFilter.fittedTo(series, 4).apply(Float64Array.from(series));
    expect(Math.abs(lag1(white))).toBeLessThan(0.03); // four times 1/√20000
  });

  it('passes everything through when there is none', () => {
    expect([...ColourFilter.none().apply(Float64Array.of(1, 2, 3))]).toEqual([1, 2, 3]);
  });
});
