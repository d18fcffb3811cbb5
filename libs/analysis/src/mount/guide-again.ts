import { type LoopLaw } from './loop-law';

export interface GuideAgainInput {
  /**
   * The star with no correction at all, seeing and dither jumps in it, so that error = this + what the corrections have
   * moved; NaN where no star was measured.
   */
  readonly starArcsec: Float64Array;
  readonly law: LoopLaw;
  /** Gap between the corrections and the star; 0 for none. */
  readonly gapArcsec: number;
  /** 1: a correction after every frame, 2: after every other one. */
  readonly everyFrames: number;
}

/**
 * Runs a guider over a night: in every frame that it reads it answers the error, and the answer has moved the star before the next
 * frame. O(n).
 *
 * @returns The error that it leaves, a value a frame.
 * @see REFERENCE 11: e[n] = open loop[n] + Σ of the motions before n.
 */
export function guideAgain(input: GuideAgainInput): Float64Array {
  const { starArcsec, law, gapArcsec, everyFrames } = input;
  const error = new Float64Array(starArcsec.length);
  let driver = 0;
  // The star may stand anywhere in the gap at the start: its middle is never further off than half of it.
  let moved = 0;
  for (let n = 0; n < error.length; n++) {
    const seen = (starArcsec[n] ?? NaN) + moved;
    error[n] = seen;
    if (n % everyFrames !== 0) continue;
    if (!(Math.abs(seen) >= law.minimumMoveArcsec)) continue;
    const wanted = -law.gain * seen;
    driver += Math.min(law.maximumArcsec, Math.max(-law.maximumArcsec, wanted));
    moved = Math.min(Math.max(moved, driver - gapArcsec / 2), driver + gapArcsec / 2);
  }
  return error;
}
