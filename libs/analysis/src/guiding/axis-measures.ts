import { type Axis, type Total } from '../analysis-document';
import { type UsedFrames } from '../series/used-frames';
import { at } from '../statistics/at';
import { populationDeviation, rootMeanSquare } from '../statistics/deviation';
import { correlatedSlopeError, linearTrend } from '../statistics/linear-trend';
import { mean } from '../statistics/mean';
import { quantileInPlace } from '../statistics/quantile';

const SECONDS_PER_MINUTE = 60;
const NINETY_FIFTH = 0.95;

/**
 * What one axis did over the frames used: SCIENCE's guiding measures. The lock position is error 0. O(n).
 *
 * @param used At least 30 frames (12 for the drift's standard error).
 * @param errors `raErrorArcsec` or `decErrorArcsec` of `used`.
 * @throws {SeriesError} `too-short`, `no-spread` (all frames at one time).
 */
export function axisMeasures(used: UsedFrames, errors: Float64Array): Axis {
  const trend = linearTrend(used.timeSeconds, errors);
  let lowest = Infinity;
  let highest = -Infinity;
  for (const error of errors) {
    lowest = Math.min(lowest, error);
    highest = Math.max(highest, error);
  }
  return {
    meanArcsec: mean(errors),
    rmsArcsec: populationDeviation(errors),
    rmsAboutLockArcsec: rootMeanSquare(errors),
    peakToPeakArcsec: highest - lowest,
    p95Arcsec: quantileInPlace(errors.map(Math.abs), NINETY_FIFTH),
    driftArcsecPerMinute: trend.slope * SECONDS_PER_MINUTE,
    driftStandardError: correlatedSlopeError(used.timeSeconds, errors) * SECONDS_PER_MINUTE,
    lag1: lag1OfNeighbours(used.frame, errors),
  };
}

/**
 * Both axes together. The RMS is about the means, sqrt(RA² + Dec²); the radius is taken from the lock position. O(n).
 *
 * @param imagingScaleArcsecPerPx null when the rig does not tell it: then the RMS in imaging pixels is null.
 */
export function totalMeasures(
  used: UsedFrames,
  ra: Axis,
  dec: Axis,
  imagingScaleArcsecPerPx: number | null,
): Total {
  const rmsArcsec = Math.hypot(ra.rmsArcsec, dec.rmsArcsec);
  const radius = used.raErrorArcsec.map((east, i) => Math.hypot(east, at(used.decErrorArcsec, i)));
  return {
    rmsArcsec,
    rmsImagingPx: imagingScaleArcsecPerPx === null ? null : rmsArcsec / imagingScaleArcsecPerPx,
    p95Arcsec: quantileInPlace(radius, NINETY_FIFTH),
    peakArcsec: radius.reduce((largest, value) => Math.max(largest, value), 0),
  };
}

/**
 * Lag-1 autocorrelation over pairs of frames that follow each other in the run, so that a dither between two frames
 * does not join them:
 *
 *     r = N/(P + 1) · Σ_pairs (yᵢ − ȳ)(yᵢ₋₁ − ȳ) / Σ (yᵢ − ȳ)²,   P pairs
 *
 * which is the NIST StRD definition when no frame is missing (P = N − 1). Null when the frames are all alike or no
 * two follow each other. O(n).
 *
 * @param frame The frames' places in the run, ascending.
 */
export function lag1OfNeighbours(frame: Int32Array, errors: Float64Array): number | null {
  const centre = mean(errors);
  let products = 0;
  let pairs = 0;
  let squares = 0;
  for (let i = 0; i < errors.length; i++) {
    const off = at(errors, i) - centre;
    squares += off * off;
    if (i > 0 && at(frame, i) === at(frame, i - 1) + 1) {
      products += off * (at(errors, i - 1) - centre);
      pairs++;
    }
  }
  if (squares === 0 || pairs === 0) return null;
  return ((products / squares) * errors.length) / (pairs + 1);
}
