import { describe, expect, it } from 'vitest';
import { RandomSource } from './random-source';

const COUNT = 100_000;

describe('a source of random numbers', () => {
  it('draws evenly between 0 and 1', () => {
    const random = new RandomSource(1);
    const bins = new Uint32Array(10);
    for (let i = 0; i < COUNT; i++) bins[Math.floor(10 * random.uniform())]!++;
    // Each bin holds 10,000 ± 95 (one standard deviation, binomial); five of these.
    for (const bin of bins) expect(Math.abs(bin - COUNT / 10)).toBeLessThan(475);
  });

  it('draws normal numbers of mean 0, deviation 1 and no memory', () => {
    const random = new RandomSource(2);
    const draws = Float64Array.from({ length: COUNT }, () => random.normal());
    const moment = (power: number) => draws.reduce((sum, x) => sum + x ** power, 0) / COUNT;
    const lagged = draws.reduce((sum, x, i) => sum + x * (draws[i - 1] ?? 0), 0) / COUNT;
    // Standard errors 1/√N, √2/√N, √96/√N, 1/√N; five of each.
    expect(Math.abs(moment(1))).toBeLessThan(0.016);
    expect(Math.abs(moment(2) - 1)).toBeLessThan(0.023);
    expect(Math.abs(moment(4) - 3)).toBeLessThan(0.16);
    expect(Math.abs(lagged)).toBeLessThan(0.016);
  });

  it('gives every cause a stream of its own', () => {
    const first = (cause: string) => RandomSource.forCause(3, cause).uniform();
    expect(first('ra seeing')).toBe(first('ra seeing'));
    expect(first('ra seeing')).not.toBe(first('dec seeing'));
  });
});
