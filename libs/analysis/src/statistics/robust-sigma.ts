import { at } from './at';
import { quantileInPlace } from './quantile';
import { requireSeries } from './series-error';

/** 1 / Φ⁻¹(3/4): makes the median absolute deviation of Gaussian values their standard deviation. */
export const MAD_TO_SIGMA = 1.482602218505602;

/**
 * Median of the absolute deviations from the median, in the unit of the values. O(n) on average.
 *
 * @throws {SeriesError} `too-short` (no values), `not-finite`.
 */
export function medianAbsoluteDeviation(values: ArrayLike<number>): number {
  requireSeries('medianAbsoluteDeviation', values, 1);
  const work = new Float64Array(values);
  const centre = quantileInPlace(work, 0.5);
  for (let i = 0; i < work.length; i++) work[i] = Math.abs(at(work, i) - centre);
  return quantileInPlace(work, 0.5);
}

/**
 * Standard deviation that up to half of the values may spoil: 1.4826 · MAD. O(n) on average.
 *
 * @throws {SeriesError} `too-short` (no values), `not-finite`.
 * @see F. R. Hampel, J. Amer. Statist. Assoc. 69 (1974) 383.
 */
export function robustSigma(values: ArrayLike<number>): number {
  return MAD_TO_SIGMA * medianAbsoluteDeviation(values);
}
