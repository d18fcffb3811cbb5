import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { lag1 } from './autocorrelation';
import { populationDeviation, rootMeanSquare } from './deviation';
import { leastSquares } from './least-squares';
import { correlatedSlopeError, linearTrend } from './linear-trend';
import { mean } from './mean';
import { pearson } from './pearson';
import { median, quantile } from './quantile';
import { robustSigma } from './robust-sigma';
import { RandomSource } from '../simulation/random-source';

const values = fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), {
  minLength: 1,
  maxLength: 60,
});

describe('quantiles by selection', () => {
  it('are those of the sorted values (definition 7 of Hyndman & Fan 1996)', () => {
    fc.assert(
      fc.property(values, fc.double({ min: 0, max: 1, noNaN: true }), (y, p) => {
        const sorted = [...y].sort((a, b) => a - b);
        const place = (y.length - 1) * p;
        const low = sorted[Math.floor(place)]!;
        const high = sorted[Math.min(Math.floor(place) + 1, y.length - 1)]!;
        // Two ways of rounding one interpolation.
        expect(quantile(y, p)).toBeCloseTo(low + (place - Math.floor(place)) * (high - low), 6);
      }),
    );
  });

  it('leave their input as it was and take sorted, constant and falling series alike', () => {
    const rising = Float64Array.from({ length: 1001 }, (_, i) => i);
    expect(median(rising)).toBe(500);
    expect(rising[0]).toBe(0);
    expect(median(rising.slice().reverse())).toBe(500);
    expect(median(new Float64Array(1000).fill(3))).toBe(3);
    expect(median([4, 1])).toBe(2.5);
  });
});

it('mean and deviation keep their digits far from zero', () => {
  const y = Float64Array.from({ length: 1000 }, (_, i) => 1e9 + (i % 2));
  expect(mean(y)).toBe(1e9 + 0.5);
  expect(populationDeviation(y)).toBe(0.5);
  expect(rootMeanSquare([3, 4])).toBe(Math.sqrt(12.5));
});

it('a third of wild values does not move the robust sigma far', () => {
  const random = new RandomSource(1);
  const y = Float64Array.from({ length: 3000 }, (_, i) => (i % 3 === 0 ? 1000 : random.normal()));
  // With a third far to one side the median is the normal's 0.75 quantile, 0.674, and the MAD the 0.75 quantile of
  // |x - 0.674|, 1.37: 2.03 sigma, within 3 % at 3000 values.
  expect(Math.abs(robustSigma(y) / 2.03 - 1)).toBeLessThan(0.06);
});

describe('least squares', () => {
  it('leave a residual that is square to every column', () => {
    const random = new RandomSource(2);
    const t = Float64Array.from({ length: 200 }, (_, i) => i / 10);
    const columns = [t.map(() => 1), t, t.map((x) => Math.cos(x))];
    const y = t.map((x) => 2 - 0.3 * x + 1.5 * Math.cos(x) + 0.1 * random.normal());
    const { coefficients, covariance } = leastSquares(columns, y);
    const left = y.map((v, i) =>
      columns.reduce((rest, c, j) => rest - coefficients[j]! * c[i]!, v),
    );
    for (const column of columns) {
      expect(column.reduce((sum, c, i) => sum + c * left[i]!, 0)).toBeCloseTo(0, 9);
    }
    // Within four of its own standard errors of the truth.
    expect(Math.abs(coefficients[2]! - 1.5)).toBeLessThan(4 * Math.sqrt(covariance[8]!));
  });

  it('refuse columns that hang on each other', () => {
    const x = [1, 2, 3, 4];
    const fit = () => leastSquares([x, x.map((v) => 2 * v)], [1, 2, 3, 5]);
    expect(fit).toThrow(expect.objectContaining({ fault: 'no-spread' }));
  });
});

describe('the slope error of correlated residuals', () => {
  /** Share of 300 starts whose slope lies within 1.96 standard errors of the truth, 0. */
  const coverage = (memory: number) => {
    let inside = 0;
    for (let seed = 0; seed < 300; seed++) {
      const random = new RandomSource(seed);
      let level = 0;
      const t = Float64Array.from({ length: 1500 }, (_, i) => 2 * i);
      const y = t.map(() => (level = memory * level + random.normal()));
      const { slope } = linearTrend(t, y);
      if (Math.abs(slope) < 1.96 * correlatedSlopeError(t, y)) inside++;
    }
    return inside / 300;
  };

  it.each([0, 0.6, -0.35])('covers the truth as often as it says at a lag-1 of %d', (memory) => {
    // 95 % with a standard error of 1.3 %, less up to 3 % since the blocks at the ends weigh most.
    expect(coverage(memory)).toBeGreaterThan(0.89);
    expect(coverage(memory)).toBeLessThan(0.99);
  });
});

it('the correlation is 1, -1 or refused', () => {
  expect(pearson([1, 2, 3], [2, 4, 6])).toBeCloseTo(1, 12);
  expect(pearson([1, 2, 3], [3, 2, 1])).toBeCloseTo(-1, 12);
  expect(() => pearson([1, 2], [5, 5])).toThrow(expect.objectContaining({ fault: 'no-spread' }));
});

it.each([
  ['too-short', () => mean([])],
  ['not-finite', () => median([1, NaN])],
  ['length-mismatch', () => linearTrend([1, 2], [1])],
  ['no-spread', () => linearTrend([3, 3], [1, 2])],
  ['no-spread', () => lag1([2, 2, 2])],
])('throws %s by its name', (fault, call) => {
  expect(call).toThrow(expect.objectContaining({ fault }));
});
