import { at } from '../statistics/at';
import { FRAME_STATES } from './log-frames';

const DITHER = FRAME_STATES.indexOf('dither');
const SETTLING = FRAME_STATES.indexOf('settling');

/**
 * The frames at which dithers arrive, from a state column. Logs differ in whether the first frame called a dither is
 * still at the old place or already at the new one: the arrival is the largest jump within the stretch. A stretch of
 * settling alone counts as well: something moved the star. O(n).
 *
 * @param state Index into FRAME_STATES, n frames.
 * @param ra Errors, n frames; NaN where no star was measured.
 * @param dec As `ra`.
 * @returns ascending frames.
 */
export function stateDitherFrames(
  state: Uint8Array,
  ra: Float64Array,
  dec: Float64Array,
): number[] {
  const arrivals: number[] = [];
  let i = 0;
  while (i < state.length) {
    const begins = isDithering(at(state, i));
    if (!begins) {
      i++;
      continue;
    }
    const start = i;
    // A new dither may be called before the last one has settled.
    while (i < state.length && isDithering(at(state, i)) && !(i > start && startsAnew(state, i))) {
      i++;
    }
    const arrival = largestJump(ra, dec, start, i);
    if (arrival !== null) arrivals.push(arrival);
  }
  return arrivals;
}

function isDithering(code: number): boolean {
  return code === DITHER || code === SETTLING;
}

function startsAnew(state: Uint8Array, i: number): boolean {
  return at(state, i) === DITHER && at(state, i - 1) === SETTLING;
}

/** Frame of [from, to) that lies farthest from the frame with a star before it; null when none has one. */
function largestJump(ra: Float64Array, dec: Float64Array, from: number, to: number): number | null {
  let before = from - 1;
  while (before >= 0 && Number.isNaN(at(ra, before) + at(dec, before))) before--;
  let arrival: number | null = null;
  let largest = -1;
  for (let i = from; i < to; i++) {
    if (Number.isNaN(at(ra, i) + at(dec, i))) continue;
    const jump =
      before < 0 ? 0 : Math.hypot(at(ra, i) - at(ra, before), at(dec, i) - at(dec, before));
    if (jump > largest) {
      largest = jump;
      arrival = i;
    }
    before = i;
  }
  return arrival;
}
