import { at } from './at';
import { mean } from './mean';
import { requireSeries } from './series-error';

/**
 * Sum of squares about the mean, in two passes with the rounding of the mean taken back. The one-pass form
 * Σy² − (Σy)²/n loses every digit when the mean is large against the spread (NIST StRD NumAcc4). O(n).
 *
 * @throws {SeriesError} `too-short` (no values), `not-finite`.
 * @see T. F. Chan, G. H. Golub, R. J. LeVeque, The American Statistician 37 (1983) 242, eq. 1.7.
 */
export function squaresAboutMean(values: ArrayLike<number>): number {
  const centre = mean(values);
  let squares = 0;
  let left = 0;
  for (let i = 0; i < values.length; i++) {
    const off = at(values, i) - centre;
    squares += off * off;
    left += off;
  }
  return squares - (left * left) / values.length;
}

/**
 * Standard deviation of the values themselves: divides by N. The RMS about the mean.
 *
 * @throws {SeriesError} `too-short` (no values), `not-finite`.
 */
export function populationDeviation(values: ArrayLike<number>): number {
  return Math.sqrt(squaresAboutMean(values) / values.length);
}

/**
 * Standard deviation estimated for what the values were drawn from: divides by N − 1.
 *
 * @throws {SeriesError} `too-short` (n < 2), `not-finite`.
 */
export function sampleDeviation(values: ArrayLike<number>): number {
  requireSeries('sampleDeviation', values, 2);
  return Math.sqrt(squaresAboutMean(values) / (values.length - 1));
}

/**
 * Root of the mean square about zero: about the lock position, for an error series. O(n).
 *
 * @throws {SeriesError} `too-short` (no values), `not-finite`.
 */
export function rootMeanSquare(values: ArrayLike<number>): number {
  requireSeries('rootMeanSquare', values, 1);
  let squares = 0;
  for (let i = 0; i < values.length; i++) squares += at(values, i) ** 2;
  return Math.sqrt(squares / values.length);
}
