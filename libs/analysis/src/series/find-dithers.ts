import { at } from '../statistics/at';
import { median } from '../statistics/quantile';
import { robustSigma } from '../statistics/robust-sigma';

/** A dither found by its shape: the frame at which it arrives and the first frame that counts again. */
export interface ShapedDither {
  readonly jump: number;
  readonly settled: number;
}

export interface DitherSearch {
  /** Times and errors of the frames that have a star, n each, NaN-free. */
  readonly timeSeconds: Float64Array;
  readonly ra: Float64Array;
  readonly dec: Float64Array;
  /** Whether the log has corrections: then a guider pulls a kept jump back within frames. */
  readonly guided: boolean;
}

const JUMP_SIGMAS = 8;
const SETTLED_SIGMAS = 2;
const SETTLED_FRAMES = 3;
/** A jump that never settles (no guider pulls it back) is set aside for so long. */
const SETTLE_AT_MOST_SECONDS = 120;
/** A jump that an equal one undoes within so many frames was a gust or a bump. */
const KEPT_FRAMES = 10;
/** A later step back by this part of the jump undoes it: a stable guider's own steps stay below 0.25 of it. */
const UNDOING_STEP = 0.5;
/**
 * What must be left of a jump one frame later. A guider of gain k leaves 1 − k of a dither and −k of a spike (it
 * answers what is no longer there): with corrections the border lies below 0, so that gains up to 1.35 keep their
 * dithers; with none in the log, a jump that is gone one frame later is a spike.
 */
const LEFT_WHEN_GUIDED = -0.35;
const LEFT_WHEN_NOT = 0.2;

/**
 * Dithers of a log without a state column, by their shape: a jump of both axes together beyond 8 robust sigmas that
 * is not undone, and what follows until the error has stayed within 2 robust sigmas of its usual place for 3 frames.
 * A lone spike and a gust (a jump that an opposite one undoes) are not dithers. O(n).
 *
 * The sigma of a jump is the smaller of the error's own and its first differences' over √2: the second does not grow
 * with slow motion in a log that nothing corrects.
 */
export function findDithers(search: DitherSearch): ShapedDither[] {
  const { ra, dec } = search;
  if (ra.length < SETTLED_FRAMES + 2) return [];
  const sigmas = { ra: robustSigma(ra), dec: robustSigma(dec) };
  const centre = { ra: median(ra), dec: median(dec) };
  const jumpSigmas = { ra: jumpSigma(ra, sigmas.ra), dec: jumpSigma(dec, sigmas.dec) };
  const dithers: ShapedDither[] = [];
  for (let i = 1; i < ra.length - 1; i++) {
    const size = Math.hypot(
      inSigmas(at(ra, i) - at(ra, i - 1), jumpSigmas.ra),
      inSigmas(at(dec, i) - at(dec, i - 1), jumpSigmas.dec),
    );
    if (size <= JUMP_SIGMAS || !isKept(search, i)) continue;
    const settled = settledFrom(search, i, centre, sigmas);
    dithers.push({ jump: i, settled });
    i = settled;
  }
  return dithers;
}

function jumpSigma(errors: Float64Array, sigma: number): number {
  const steps = new Float64Array(errors.length - 1);
  for (let i = 0; i < steps.length; i++) steps[i] = at(errors, i + 1) - at(errors, i);
  return Math.min(sigma, robustSigma(steps) / Math.SQRT2);
}

/** An axis that stands still in half of its frames has no sigma to measure a jump by. */
function inSigmas(jump: number, sigma: number): number {
  return sigma > 0 ? jump / sigma : 0;
}

function isKept({ ra, dec, guided }: DitherSearch, i: number): boolean {
  const raJump = at(ra, i) - at(ra, i - 1);
  const decJump = at(dec, i) - at(dec, i - 1);
  const squared = raJump ** 2 + decJump ** 2;
  /** The part of the jump that the way from frame a to frame b makes. */
  const along = (a: number, b: number): number =>
    ((at(ra, b) - at(ra, a)) * raJump + (at(dec, b) - at(dec, a)) * decJump) / squared;
  if (along(i - 1, i + 1) < (guided ? LEFT_WHEN_GUIDED : LEFT_WHEN_NOT)) return false;
  const last = Math.min(i + KEPT_FRAMES, ra.length - 1);
  for (let j = i + 2; j <= last; j++) {
    if (along(j - 1, j) < -UNDOING_STEP) return false;
  }
  // The way back from a spike or a gust is a jump as well, and stays where it leads.
  for (let j = Math.max(1, i - KEPT_FRAMES); j < i; j++) {
    if (along(j - 1, j) < -UNDOING_STEP) return false;
  }
  return true;
}

function settledFrom(
  { timeSeconds, ra, dec }: DitherSearch,
  jump: number,
  centre: { readonly ra: number; readonly dec: number },
  sigmas: { readonly ra: number; readonly dec: number },
): number {
  let quiet = 0;
  for (let i = jump + 1; i < ra.length; i++) {
    const near =
      Math.abs(at(ra, i) - centre.ra) <= SETTLED_SIGMAS * sigmas.ra &&
      Math.abs(at(dec, i) - centre.dec) <= SETTLED_SIGMAS * sigmas.dec;
    quiet = near ? quiet + 1 : 0;
    if (quiet === SETTLED_FRAMES) return i + 1;
    if (at(timeSeconds, i) - at(timeSeconds, jump) >= SETTLE_AT_MOST_SECONDS) return i;
  }
  return ra.length;
}
