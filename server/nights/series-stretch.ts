/** Gaps in time longer than this many usual spacings are shown as gaps. */
const GAP_SPACINGS = 5;

/** Frames `from` (included) to `to` (not included). */
export interface FrameRange {
  readonly from: number;
  readonly to: number;
}

/** The frames whose time lies in a stretch, both ends included. Times ascend. */
export function framesWithin(
  timeSeconds: Float64Array,
  fromSeconds: number,
  toSeconds: number,
): FrameRange {
  const from = firstIndex(timeSeconds, (time) => time >= fromSeconds);
  return {
    from,
    to: Math.max(
      from,
      firstIndex(timeSeconds, (time) => time > toSeconds),
    ),
  };
}

function firstIndex(times: Float64Array, isThere: (time: number) => boolean): number {
  let low = 0;
  let high = times.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (isThere(times[middle] ?? Infinity)) high = middle;
    else low = middle + 1;
  }
  return low;
}

/** Equal steps of time with the frames that fall on each; a step without frames is a gap. */
export interface ThinnedSteps {
  readonly timeSeconds: Float32Array;
  readonly frames: readonly FrameRange[];
}

/**
 * Cuts a stretch into equal steps of time. A step in the middle of a real gap stays, empty, so that no line is drawn
 * across; one that is empty only because frames do not come on the beat is left out.
 *
 * @param timeSeconds Times of the frames of the stretch, ascending, at least two.
 */
export function cutIntoSteps(timeSeconds: Float64Array, points: number): ThinnedSteps {
  const first = timeSeconds[0] ?? 0;
  const last = timeSeconds.at(-1) ?? first;
  const stepSeconds = (last - first) / points;
  const gapSeconds = (GAP_SPACINGS * (last - first)) / (timeSeconds.length - 1);
  const centres: number[] = [];
  const frames: FrameRange[] = [];
  let from = 0;
  for (let step = 0; step < points; step++) {
    const end = first + (step + 1) * stepSeconds;
    let to = from;
    while (to < timeSeconds.length && ((timeSeconds[to] ?? 0) < end || step === points - 1)) to++;
    const hole = (timeSeconds[to] ?? last) - (timeSeconds[from - 1] ?? first);
    if (to > from || hole > gapSeconds) {
      centres.push(end - stepSeconds / 2);
      frames.push({ from, to });
    }
    from = to;
  }
  return { timeSeconds: Float32Array.from(centres), frames };
}

/** Least and greatest of the frames on each step; NaN where no frame of it has a value. */
export function extremes(
  samples: Float32Array,
  frames: readonly FrameRange[],
): { least: Float32Array; greatest: Float32Array } {
  const least = new Float32Array(frames.length).fill(NaN);
  const greatest = new Float32Array(frames.length).fill(NaN);
  frames.forEach(({ from, to }, step) => {
    const measured = samples.subarray(from, to).filter((sample) => !Number.isNaN(sample));
    if (measured.length === 0) return;
    least[step] = measured.reduce((a, b) => Math.min(a, b));
    greatest[step] = measured.reduce((a, b) => Math.max(a, b));
  });
  return { least, greatest };
}
