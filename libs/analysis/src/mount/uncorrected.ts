import { type Uncorrected } from '../analysis-document';
import { type UsedResponse } from './mount-motion';
import { summedBefore } from './motion-frames';
import { type EstimatedResponse } from './response';

/** Displacement of the star that each correction causes by a response, towards +error positive. O(n). */
export function displacements(moves: Float64Array, response: UsedResponse): Float64Array {
  return moves.map(
    (move) => move * (move > 0 ? response.positivePerUnit : response.negativePerUnit),
  );
}

/**
 * Uncorrected motion u[n] = e[n] − Σ of the displacements that the corrections before n caused (REFERENCE 11), dither
 * jumps still in it; NaN where no star was measured. O(n).
 */
export function uncorrectedMotion(
  errorArcsec: Float64Array,
  displacementArcsec: Float64Array,
): Float64Array {
  const moved = summedBefore(displacementArcsec);
  return errorArcsec.map((error, n) => error - (moved[n] ?? 0));
}

export interface UncorrectedInput {
  /** Without jumps; NaN where there is none. */
  readonly motion: Float64Array;
  /** Drift and lines fitted to it. */
  readonly smooth: Float64Array;
  /** 0: the frame counts in the figures. */
  readonly setAside: Uint8Array;
  readonly driftPerSecond: number;
  readonly driftStandardError: number;
  readonly floorArcsec: number | null;
}

/**
 * REPORT's Uncorrected over the frames that count. Roughness: what drift, lines and the seeing floor leave, the last
 * in quadrature.
 *
 * @returns null when no frame counts.
 */
export function describeUncorrected(input: UncorrectedInput): Uncorrected | null {
  const { motion, smooth, setAside, floorArcsec } = input;
  const counts = (value: number, n: number) => setAside[n] === 0 && Number.isFinite(value);
  const kept = motion.filter(counts);
  if (kept.length === 0) return null;
  const rest = motion.map((value, n) => value - (smooth[n] ?? 0)).filter(counts);
  const spread = rmsAboutMean(rest);
  return {
    rmsArcsec: rmsAboutMean(kept),
    peakToPeakArcsec: rangeOf(kept),
    driftArcsecPerMinute: 60 * input.driftPerSecond,
    driftStandardError: 60 * input.driftStandardError,
    roughnessArcsec:
      floorArcsec === null ? null : Math.sqrt(Math.max(0, spread ** 2 - floorArcsec ** 2)),
  };
}

function rmsAboutMean(values: Float64Array): number {
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
  return Math.sqrt(values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / values.length);
}

function rangeOf(values: Float64Array): number {
  const [lowest, highest] = values.reduce<[number, number]>(
    ([low, high], value) => [Math.min(low, value), Math.max(high, value)],
    [Infinity, -Infinity],
  );
  return highest - lowest;
}

/**
 * Standard error of a drift with that of the response in it: what of the response comes from the log moves the drift, its
 * mean with all that was corrected, a difference between the directions with the sum of all sizes.
 */
export function driftError(
  fitted: number,
  displacementArcsec: Float64Array,
  timeSeconds: Float64Array,
  response: {
    readonly used: UsedResponse | null;
    readonly estimated: EstimatedResponse | null;
  },
): number {
  const { used, estimated } = response;
  if (used === null || estimated === null) return fitted;
  const span = (timeSeconds.at(-1) ?? 0) - (timeSeconds[0] ?? 0);
  let [net, all] = [0, 0];
  for (const move of displacementArcsec) {
    net += move;
    all += Math.abs(move);
  }
  const isDifferenceOfLog = used.from === 'log' || used.positivePerUnit !== used.negativePerUnit;
  const ofDifference = isDifferenceOfLog ? estimated.halfDifferenceError / estimated.perUnit : 0;
  return Math.hypot(fitted, (net / span) * used.relativeStandardError, (all / span) * ofDifference);
}
