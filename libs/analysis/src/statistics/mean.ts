import { at } from './at';
import { requireSeries } from './series-error';

/**
 * Arithmetic mean in two passes: the second adds the mean of what the first left over, which takes back the
 * rounding of a long sum of large values.
 *
 *     m = Σy / n,   mean = m + Σ(y − m) / n
 *
 * O(n).
 *
 * @throws {SeriesError} `too-short` (no values), `not-finite`.
 * @see T. F. Chan, G. H. Golub, R. J. LeVeque, The American Statistician 37 (1983) 242.
 */
export function mean(values: ArrayLike<number>): number {
  requireSeries('mean', values, 1);
  let sum = 0;
  for (let i = 0; i < values.length; i++) sum += at(values, i);
  const first = sum / values.length;
  let left = 0;
  for (let i = 0; i < values.length; i++) left += at(values, i) - first;
  return first + left / values.length;
}
