import { at } from './at';
import { mean } from './mean';
import { requireSameLength, requireSeries, SeriesError } from './series-error';

export interface LinearTrend {
  /** Value of the line at `t = 0`, in the unit of `y`. */
  readonly intercept: number;
  /** In the unit of `y` per unit of `t`. */
  readonly slope: number;
  /** Standard error of `slope` for independent residuals; null for two samples, which leave no residual. */
  readonly slopeError: number | null;
}

/**
 * Straight line through a series by least squares: the drift of an axis.
 *
 *     slope = Σ(tᵢ − t̄)(yᵢ − ȳ) / Σ(tᵢ − t̄)²
 *     slopeError² = Σrᵢ² / ((n − 2) Σ(tᵢ − t̄)²),  rᵢ = yᵢ − intercept − slope·tᵢ
 *
 * Sums are taken about the means: late in a night t is large against its spacing, and the shorter form
 * n·Σty − Σt·Σy would lose digits by cancellation. O(n).
 *
 * @param t n times; need be neither sorted nor evenly spaced.
 * @param y n values.
 * @throws {SeriesError} `length-mismatch`, `too-short` (n < 2), `not-finite`, `no-spread` (one time only).
 * @see P. R. Bevington, D. K. Robinson, Data Reduction and Error Analysis, 3rd ed., ch. 6.
 */
export function linearTrend(t: ArrayLike<number>, y: ArrayLike<number>): LinearTrend {
  requireSameLength('linearTrend', t, y);
  requireSeries('linearTrend', t, 2);
  requireSeries('linearTrend', y, 2);
  const tMean = mean(t);
  const yMean = mean(y);
  let tt = 0;
  let ty = 0;
  for (let i = 0; i < t.length; i++) {
    const off = at(t, i) - tMean;
    tt += off * off;
    ty += off * (at(y, i) - yMean);
  }
  if (tt === 0) throw new SeriesError('no-spread', 'linearTrend needs two different times');
  const slope = ty / tt;
  let residualSquares = 0;
  for (let i = 0; i < t.length; i++) {
    residualSquares += (at(y, i) - yMean - slope * (at(t, i) - tMean)) ** 2;
  }
  const freedom = t.length - 2;
  const slopeError = freedom === 0 ? null : Math.sqrt(residualSquares / freedom / tt);
  return { intercept: yMean - slope * tMean, slope, slopeError };
}

/** Blocks that the residuals are gathered in: long enough to hold what correlates, enough of them to tell a spread. */
const SLOPE_ERROR_BLOCKS = 24;

/**
 * Standard error of a least-squares slope whose residuals are correlated from frame to frame, as guided errors are.
 * The residuals' moments are summed over consecutive blocks, and only blocks are taken to be independent:
 *
 *     slopeError² = (m − 1)/m · Σ_b (Σ_{i in b} (tᵢ − t̄) rᵢ / (1 − h_b))² / (Σ(tᵢ − t̄)²)²,   m blocks,
 *
 * where h_b, the block's leverage (its part of the samples and of Σ(tᵢ − t̄)²), gives back what the fitted line has
 * taken from its residuals: nearly the jackknife over blocks. Right for any correlation shorter than a block (a 24th
 * of the series); it reads low where the residual wanders for longer. O(n).
 *
 * @param t n times, ascending.
 * @param y n values.
 * @throws {SeriesError} as `linearTrend`, and `too-short` (n < 12).
 * @see W. K. Newey, K. D. West, Econometrica 55 (1987) 703, with blocks in place of a lag window; J. G. MacKinnon,
 *   H. White, J. Econometrics 29 (1985) 305 for the leverage.
 */
export function correlatedSlopeError(t: ArrayLike<number>, y: ArrayLike<number>): number {
  requireSeries('correlatedSlopeError', y, 12);
  const { slope, intercept } = linearTrend(t, y);
  const blocks = Math.min(SLOPE_ERROR_BLOCKS, Math.floor(t.length / 3));
  const moments = new Float64Array(blocks);
  const parts = new Float64Array(blocks);
  const counts = new Float64Array(blocks);
  const tMean = mean(t);
  let tt = 0;
  for (let i = 0; i < t.length; i++) {
    const off = at(t, i) - tMean;
    const block = Math.floor((i * blocks) / t.length);
    moments[block] = at(moments, block) + off * (at(y, i) - intercept - slope * at(t, i));
    parts[block] = at(parts, block) + off * off;
    counts[block] = at(counts, block) + 1;
    tt += off * off;
  }
  let squares = 0;
  for (let block = 0; block < blocks; block++) {
    const leverage = at(counts, block) / t.length + at(parts, block) / tt;
    squares += (at(moments, block) / (1 - leverage)) ** 2;
  }
  return Math.sqrt((squares * (blocks - 1)) / blocks) / tt;
}
