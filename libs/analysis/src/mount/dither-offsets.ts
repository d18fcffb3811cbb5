import { type LevelFrames } from './whitened-least-squares';

/**
 * Takes the jumps of the lock position out of a motion: at each restart, the level just after it less the level just
 * before it, both by the local-level filter that fits the motion, the first run forwards and the second backwards.
 * O(n).
 *
 * @param motion Uncorrected motion, NaN where no star was measured; not changed.
 * @param smooth What is known of it (drift, lines), so that the levels need to follow the rest alone.
 * @param frames Those used for levels; its `restartFrames` are the jumps.
 * @returns The motion with one level, starting near zero.
 */
export function withoutJumps(
  motion: Float64Array,
  smooth: Float64Array,
  frames: LevelFrames,
  walkPerSecond: number,
): Float64Array {
  const rest = motion.map((value, n) => value - (smooth[n] ?? 0));
  const before = levelsAlong(rest, frames, walkPerSecond, 1);
  const after = levelsAlong(rest, frames, walkPerSecond, -1);
  const level = motion.slice();
  const restarts = new Set(frames.restartFrames);
  let offset = after[0] ?? 0;
  for (let n = 0; n < level.length; n++) {
    if (n > 0 && restarts.has(n)) {
      const jump = (after[n] ?? NaN) - (before[n - 1] ?? NaN);
      if (Number.isFinite(jump)) offset += jump;
    }
    level[n] = (level[n] ?? NaN) - (Number.isFinite(offset) ? offset : 0);
  }
  return level;
}

/** The filtered level at every frame, from the frames of its own stretch up to it; NaN before the first used one. */
function levelsAlong(
  rest: Float64Array,
  { timeSeconds, used, restartFrames }: LevelFrames,
  walkPerSecond: number,
  direction: 1 | -1,
): Float64Array {
  const count = rest.length;
  const restarts = new Set(restartFrames);
  const levels = new Float64Array(count).fill(NaN);
  let level = NaN;
  let variance = 0;
  for (let step = 0; step < count; step++) {
    const n = direction === 1 ? step : count - 1 - step;
    // Backwards, a stretch ends where the next one has begun.
    if (restarts.has(direction === 1 ? n : n + 1)) level = NaN;
    const previous = n - direction;
    if (step > 0)
      variance += walkPerSecond * Math.abs((timeSeconds[n] ?? 0) - (timeSeconds[previous] ?? 0));
    if (used[n] === 1) {
      if (Number.isNaN(level)) {
        level = rest[n] ?? NaN;
        variance = 1;
      } else {
        const gain = variance / (variance + 1);
        level += gain * ((rest[n] ?? 0) - level);
        variance *= 1 - gain;
      }
    }
    levels[n] = level;
  }
  return levels;
}
