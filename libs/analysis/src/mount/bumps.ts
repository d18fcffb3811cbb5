import { type RunSeries } from '../series/run-series';
import { MAD_TO_SIGMA } from '../statistics/robust-sigma';
import { quantileInPlace } from '../statistics/quantile';

/** A bump starts beyond so many robust sigmas (SCIENCE 4), */
const BUMP_SIGMAS = 4.5;
/** and lasts while the star stays beyond so many on the same side. */
const TAIL_SIGMAS = 1;
/** What a bump stands out of is the median of so much time around it: longer than a gust, shorter than a worm. */
const WINDOW_SECONDS = 30;
const FEWEST_WINDOW_FRAMES = 11;
const MOST_WINDOW_FRAMES = 61;

/**
 * Gusts and bumps in a motion that drift and lines have been taken out of: what stands out beyond 4.5 robust sigmas from
 * the running median, with its tail; 0 in all other frames. O(n) for the window's fixed length.
 *
 * @param restArcsec NaN where no star was measured.
 */
export function bumpsOf(restArcsec: Float64Array, cadenceSeconds: number): Float64Array {
  const half = Math.floor(windowFrames(cadenceSeconds) / 2);
  const over = standingOut(restArcsec, half);
  const finite = over.filter(Number.isFinite);
  const bumps = new Float64Array(restArcsec.length);
  if (finite.length === 0) return bumps;
  const sigma = MAD_TO_SIGMA * quantileInPlace(finite.map(Math.abs), 0.5);
  if (sigma === 0) return bumps;
  for (let n = 0; n < over.length; n++) {
    if (!(Math.abs(over[n] ?? NaN) > BUMP_SIGMAS * sigma)) continue;
    const side = Math.sign(over[n] ?? 0);
    const reach = (step: 1 | -1) => {
      let at = n;
      while (side * (over[at] ?? NaN) > TAIL_SIGMAS * sigma) {
        bumps[at] = over[at] ?? 0;
        at += step;
      }
    };
    reach(1);
    reach(-1);
  }
  return bumps;
}

/** How many bumps there are: stretches of frames that touch. */
export function countBumps(bumps: Float64Array, run: RunSeries): number {
  let count = 0;
  for (let n = 0; n < bumps.length; n++) {
    const kept = bumps[n] !== 0 && run.setAside[n] === 0;
    if (kept && (n === 0 || bumps[n - 1] === 0)) count++;
  }
  return count;
}

function windowFrames(cadenceSeconds: number): number {
  const frames = Math.round(WINDOW_SECONDS / cadenceSeconds);
  return Math.min(MOST_WINDOW_FRAMES, Math.max(FEWEST_WINDOW_FRAMES, frames));
}

/** Each value less the median of its neighbours; NaN where there is none. */
function standingOut(values: Float64Array, half: number): Float64Array {
  const out = new Float64Array(values.length);
  const window = new Float64Array(2 * half + 1);
  for (let n = 0; n < values.length; n++) {
    let size = 0;
    for (let i = Math.max(0, n - half); i <= Math.min(values.length - 1, n + half); i++) {
      const value = values[i] ?? NaN;
      if (Number.isFinite(value)) window[size++] = value;
    }
    out[n] = size === 0 ? NaN : (values[n] ?? NaN) - quantileInPlace(window.subarray(0, size), 0.5);
  }
  return out;
}
