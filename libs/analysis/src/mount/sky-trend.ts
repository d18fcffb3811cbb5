import { ARCSEC_PER_RADIAN } from '../optics/plate-scale';
import { STAR_RATE_ARCSEC_PER_SECOND } from '../sky/earth-rotation';

/**
 * Over so long the drift of a polar error bends beyond what a wandering level follows: an error of 5 arcmin by 16 ″ in two
 * and a half hours. On shorter runs a bend cannot be told from wandering, and a straight drift is told better without it.
 */
const BENDS_FROM_SECONDS = 9000;

/**
 * Columns of a drift: the time, and on long runs the two ways in which a polar error bends it as the sky turns, 1 − cos wc
 * and wc − sin wc, c the time from the middle of the run and w the star rate. Both bends begin and end at one height, so
 * that the coefficient of the time is the mean drift over the run, arcsec per second. O(n).
 */
export function skyTrend(timeSeconds: Float64Array): readonly Float64Array[] {
  const span = (timeSeconds.at(-1) ?? 0) - (timeSeconds[0] ?? 0);
  if (span < BENDS_FROM_SECONDS) return [timeSeconds];
  const angle = skyAngle(timeSeconds);
  const end = angle.at(-1) ?? 0;
  const slope = (end - Math.sin(end)) / end;
  return [
    timeSeconds,
    angle.map((each) => 1 - Math.cos(each)),
    angle.map((each) => each - Math.sin(each) - slope * each),
  ];
}

/** By how much the sky has turned since the middle of the run, radians. */
export function skyAngle(timeSeconds: Float64Array): Float64Array {
  const middle = ((timeSeconds[0] ?? 0) + (timeSeconds.at(-1) ?? 0)) / 2;
  const rate = STAR_RATE_ARCSEC_PER_SECOND / ARCSEC_PER_RADIAN;
  return timeSeconds.map((time) => rate * (time - middle));
}

/** The drift that coefficients of `skyTrend` make, a value a frame. O(n). */
export function driftOf(timeSeconds: Float64Array, coefficients: Float64Array): Float64Array {
  const drift = new Float64Array(timeSeconds.length);
  skyTrend(timeSeconds).forEach((column, j) => {
    const times = coefficients[j] ?? 0;
    for (let n = 0; n < drift.length; n++) drift[n] = (drift[n] ?? 0) + times * (column[n] ?? 0);
  });
  return drift;
}
