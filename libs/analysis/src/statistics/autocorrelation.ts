import { at } from './at';
import { mean } from './mean';
import { requireSeries, SeriesError } from './series-error';

/**
 * Lag-1 autocorrelation as NIST StRD defines it:
 *
 *     r = Σ (yᵢ − ȳ)(yᵢ₋₁ − ȳ) / Σ (yᵢ − ȳ)²
 *
 * O(n).
 *
 * @throws {SeriesError} `too-short` (n < 2), `not-finite`, `no-spread` (all values alike).
 */
export function lag1(values: ArrayLike<number>): number {
  requireSeries('lag1', values, 2);
  const centre = mean(values);
  let products = 0;
  let squares = 0;
  let before = 0;
  for (let i = 0; i < values.length; i++) {
    const off = at(values, i) - centre;
    products += off * before;
    squares += off * off;
    before = off;
  }
  if (squares === 0) throw new SeriesError('no-spread', 'lag1 needs values that differ');
  return products / squares;
}

/**
 * Limit that the autocorrelation of n white values stays within in 95 of 100 cases: 1.96 / √n.
 */
export function whiteLagLimit(count: number): number {
  return 1.959963984540054 / Math.sqrt(count);
}
