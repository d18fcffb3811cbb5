import { at } from './at';
import { mean } from './mean';
import { requireSameLength, requireSeries, SeriesError } from './series-error';

/**
 * Population covariance of two series (divide by N), about their means. O(n).
 *
 * @throws {SeriesError} `length-mismatch`, `too-short` (no values), `not-finite`.
 */
export function covariance(a: ArrayLike<number>, b: ArrayLike<number>): number {
  requireSameLength('covariance', a, b);
  const aMean = mean(a);
  const bMean = mean(b);
  let products = 0;
  for (let i = 0; i < a.length; i++) products += (at(a, i) - aMean) * (at(b, i) - bMean);
  return products / a.length;
}

/**
 * Pearson's correlation coefficient, between −1 and 1. O(n).
 *
 * @throws {SeriesError} `length-mismatch`, `too-short` (n < 2), `not-finite`, `no-spread` (one series is constant).
 */
export function pearson(a: ArrayLike<number>, b: ArrayLike<number>): number {
  requireSeries('pearson', a, 2);
  const together = covariance(a, b);
  const scale = Math.sqrt(covariance(a, a) * covariance(b, b));
  if (scale === 0) throw new SeriesError('no-spread', 'pearson needs values that differ');
  return Math.max(-1, Math.min(1, together / scale));
}
