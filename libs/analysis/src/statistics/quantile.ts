import { at } from './at';
import { selectInPlace } from './quickselect';
import { requireSeries } from './series-error';

/**
 * Quantile by linear interpolation between the order statistics around (n − 1)·p: definition 7 of Hyndman & Fan.
 * O(n) on average by selection, without sorting; the input is not changed.
 *
 * @param p Between 0 and 1.
 * @throws {SeriesError} `too-short` (no values), `not-finite`.
 * @see R. J. Hyndman, Y. Fan, Sample quantiles in statistical packages, The American Statistician 50 (1996) 361.
 */
export function quantile(values: ArrayLike<number>, p: number): number {
  requireSeries('quantile', values, 1);
  return quantileInPlace(new Float64Array(values), p);
}

/**
 * Median: the middle value, or the mean of the two middle ones. O(n) on average.
 *
 * @throws {SeriesError} `too-short` (no values), `not-finite`.
 */
export function median(values: ArrayLike<number>): number {
  requireSeries('median', values, 1);
  return quantileInPlace(new Float64Array(values), 0.5);
}

/** As `quantile`, on a work array of finite values that it may rearrange: no allocation. */
export function quantileInPlace(work: Float64Array, p: number): number {
  const position = (work.length - 1) * p;
  const below = Math.floor(position);
  const lower = selectInPlace(work, below);
  const part = position - below;
  if (part === 0) return lower;
  // Selection leaves everything beyond `below` at least as large: the next order statistic is their smallest.
  let upper = at(work, below + 1);
  for (let i = below + 2; i < work.length; i++) upper = Math.min(upper, at(work, i));
  return lower + part * (upper - lower);
}
