import { type SetAside } from '../analysis-document';
import { at } from '../statistics/at';
import { pick } from '../statistics/pick';
import { findDithers } from './find-dithers';
import { FRAME_STATES } from './log-frames';
import { type RunSeries, SET_ASIDE_CODES } from './run-series';
import { stateDitherFrames } from './state-dithers';

/** A stretch that the user leaves out: frames with fromSeconds ≤ time < toSeconds, seconds in the run. */
export interface ByHandRange {
  readonly fromSeconds: number;
  readonly toSeconds: number;
}

export interface SetAsideFrames {
  /** Index into SET_ASIDE_CODES, a code a frame. */
  readonly setAside: Uint8Array;
  readonly ditherFrames: readonly number[];
}

const DITHER = SET_ASIDE_CODES.indexOf('dither');
const SETTLING = SET_ASIDE_CODES.indexOf('settling');
const STAR_LOST = SET_ASIDE_CODES.indexOf('star lost');
const BY_HAND = SET_ASIDE_CODES.indexOf('by hand');

/** The reason for each state; 'ignore' is the log's owner leaving a frame out, so it counts as by hand. */
const CODE_OF_STATE = FRAME_STATES.map((state) => {
  if (state === 'ignore') return BY_HAND;
  return state === 'guiding' ? 0 : SET_ASIDE_CODES.indexOf(state);
});

/**
 * Which frames of a run are set aside, and why: what the state column says; where there is none, dithers by their
 * shape; frames without an error as star lost; and over all of it what the user left out by hand. O(n).
 *
 * @param state Index into FRAME_STATES, or null without a state column.
 * @param ra Errors in arcseconds, NaN where no star was measured.
 * @param guided Whether the log has corrections.
 */
export function setAsideFrames(
  timeSeconds: Float64Array,
  ra: Float64Array,
  dec: Float64Array,
  state: Uint8Array | null,
  guided: boolean,
  byHand: readonly ByHandRange[],
): SetAsideFrames {
  const setAside = new Uint8Array(ra.length);
  let ditherFrames: number[];
  if (state === null) {
    ditherFrames = markShapedDithers(setAside, timeSeconds, ra, dec, guided);
  } else {
    state.forEach((code, i) => (setAside[i] = CODE_OF_STATE[code] ?? 0));
    ditherFrames = stateDitherFrames(state, ra, dec);
  }
  for (let i = 0; i < setAside.length; i++) {
    if (Number.isNaN(at(ra, i) + at(dec, i))) setAside[i] = STAR_LOST;
    const time = at(timeSeconds, i);
    if (byHand.some((range) => time >= range.fromSeconds && time < range.toSeconds)) {
      setAside[i] = BY_HAND;
    }
  }
  return { setAside, ditherFrames };
}

function markShapedDithers(
  setAside: Uint8Array,
  timeSeconds: Float64Array,
  ra: Float64Array,
  dec: Float64Array,
  guided: boolean,
): number[] {
  const seen: number[] = [];
  for (let i = 0; i < ra.length; i++) if (!Number.isNaN(at(ra, i) + at(dec, i))) seen.push(i);
  const dithers = findDithers({
    timeSeconds: pick(timeSeconds, seen),
    ra: pick(ra, seen),
    dec: pick(dec, seen),
    guided,
  });
  return dithers.map(({ jump, settled }) => {
    for (let i = jump + 1; i < settled; i++) setAside[at(seen, i)] = SETTLING;
    setAside[at(seen, jump)] = DITHER;
    return at(seen, jump);
  });
}

/**
 * The stretches of frames set aside for one reason, in order. A stretch ends where its last frame does: one cadence
 * later, or at the next frame when that comes sooner.
 */
export function setAsideStretches(series: RunSeries): SetAside[] {
  const { setAside, timeSeconds, cadenceSeconds, count } = series;
  const stretches: SetAside[] = [];
  let from = 0;
  for (let i = 1; i <= count; i++) {
    if (i < count && at(setAside, i) === at(setAside, from)) continue;
    const reason = SET_ASIDE_CODES[at(setAside, from)] ?? 'kept';
    if (reason !== 'kept') {
      const next = i < count ? at(timeSeconds, i) : Infinity;
      stretches.push({
        fromSeconds: at(timeSeconds, from),
        toSeconds: Math.min(at(timeSeconds, i - 1) + cadenceSeconds, next),
        frames: i - from,
        reason,
      });
    }
    from = i;
  }
  return stretches;
}
