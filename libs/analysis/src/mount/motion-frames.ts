import { type RunSeries, SET_ASIDE_CODES } from '../series/run-series';
import { type LevelFrames } from './whitened-least-squares';

const STAR_LOST = SET_ASIDE_CODES.indexOf('star lost');
const BY_HAND = SET_ASIDE_CODES.indexOf('by hand');
/** After a gap of so many cadences nobody knows what the guider did meanwhile. */
const GAP_CADENCES = 3;

/**
 * The frames that the fits of one axis rest on. Settling frames count: large corrections tell the response best. The
 * level starts anew where the lock position jumps, after a gap without frames, and after a stretch that was set
 * aside by hand. O(n).
 */
export function motionFrames(run: RunSeries, errorArcsec: Float64Array): LevelFrames {
  const { timeSeconds, cadenceSeconds, setAside } = run;
  const used = new Uint8Array(run.count);
  const restarts = new Set(run.ditherFrames);
  for (let n = 0; n < run.count; n++) {
    const aside = setAside[n] ?? 0;
    const counts = Number.isFinite(errorArcsec[n]) && aside !== STAR_LOST && aside !== BY_HAND;
    used[n] = counts ? 1 : 0;
    const spacing = n === 0 ? 0 : (timeSeconds[n] ?? 0) - (timeSeconds[n - 1] ?? 0);
    const returns = n > 0 && setAside[n - 1] === BY_HAND && aside !== BY_HAND;
    if (returns || spacing > GAP_CADENCES * cadenceSeconds) restarts.add(n);
  }
  return {
    timeSeconds,
    cadenceSeconds,
    used,
    restartFrames: [...restarts].sort((a, b) => a - b),
  };
}

/** Sum of all values before each frame: a correction written in frame n moves the star before frame n + 1. */
export function summedBefore(values: Float64Array): Float64Array {
  const sums = new Float64Array(values.length);
  let sum = 0;
  for (let n = 1; n < values.length; n++) {
    sum += values[n - 1] ?? 0;
    sums[n] = sum;
  }
  return sums;
}
