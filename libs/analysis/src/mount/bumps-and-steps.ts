import { quantileInPlace } from '../statistics/quantile';
import { robustSigma } from '../statistics/robust-sigma';
import { type LevelFrames } from './whitened-least-squares';

const BUMP_SIGMAS = 4.5;
/** A gust has faded so many frames after its last bump. */
const FADING_FRAMES = 2;
/** Frames on either side whose medians tell whether a jump stays. */
const SIDE_FRAMES = 6;
/** A jump that stays by more than this part is a step. */
const STAYING_PART = 0.5;

/**
 * Keeps what no noise explains out of a fit. A frame whose innovation lies beyond 4.5 robust sigmas is a bump: it and the
 * two after it, in which a gust fades, do not count. If the jump stays (a dither that nobody noted, a snagged
 * cable), it is a step: the level starts anew, and the frames count. O(n).
 *
 * @param given The frames that may count at all.
 * @param frames The same as the fit before used them.
 * @param residual What that fit left of the series, n values.
 * @returns `frames` itself when nothing changes.
 */
export function withoutBumps(
  given: LevelFrames,
  frames: LevelFrames,
  innovations: Float64Array,
  residual: Float64Array,
): LevelFrames {
  const present = innovations.filter((value) => value !== 0);
  if (present.length === 0) return frames;
  const limit = BUMP_SIGMAS * robustSigma(present);
  const used = frames.used.slice();
  const restarts = new Set(frames.restartFrames);
  let fading = 0;
  for (let n = 0; n < used.length; n++) {
    if (given.used[n] !== 1) continue;
    const isBump = Math.abs(innovations[n] ?? 0) > limit;
    if (isBump && stays(residual, given.used, n)) {
      restarts.add(n);
      // The innovations that follow are measured from the old level: the next fit tells them anew.
      const last = Math.min(n + SIDE_FRAMES, used.length - 1);
      for (; n <= last; n++) used[n] = given.used[n] ?? 0;
      n = last;
      fading = 0;
      continue;
    }
    fading = isBump ? FADING_FRAMES + 1 : fading;
    if (fading > 0) used[n] = 0;
    fading--;
  }
  const isSame = restarts.size === frames.restartFrames.length && sameFrames(used, frames.used);
  if (isSame) return frames;
  return { ...frames, used, restartFrames: [...restarts].sort((a, b) => a - b) };
}

function sameFrames(a: Uint8Array, b: Uint8Array): boolean {
  for (let n = 0; n < a.length; n++) if (a[n] !== b[n]) return false;
  return true;
}

function stays(residual: Float64Array, used: Uint8Array, n: number): boolean {
  const before = sideMedian(residual, used, n - 1, -1);
  const after = sideMedian(residual, used, n + 1, 1);
  const jump = (residual[n] ?? NaN) - before;
  return (after - before) / jump > STAYING_PART;
}

function sideMedian(
  residual: Float64Array,
  used: Uint8Array,
  from: number,
  direction: 1 | -1,
): number {
  const values: number[] = [];
  for (let n = from; values.length < SIDE_FRAMES; n += direction) {
    const value = residual[n];
    if (value === undefined) break;
    if (used[n] === 1) values.push(value);
  }
  return values.length === 0 ? NaN : quantileInPlace(new Float64Array(values), 0.5);
}
