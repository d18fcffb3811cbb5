/** A stretch of a run's guide error. Where `thinned`, each step of time holds the least and greatest of its frames. */
export interface TraceStretch {
  readonly fromSeconds: number;
  readonly toSeconds: number;
  readonly thinned: boolean;
  /** Since the start of the run. */
  readonly timeSeconds: Float64Array;
  readonly ra: AxisExtent;
  readonly dec: AxisExtent;
  /** Whether no frame of the step may enter a number: dither, settling, star lost, by hand. */
  readonly setAside: Uint8Array;
}

/** One and the same array for both where the frames are single. */
export interface AxisExtent {
  readonly leastArcsec: Float32Array;
  readonly greatestArcsec: Float32Array;
}

export interface SecondsRange {
  readonly fromSeconds: number;
  readonly toSeconds: number;
}

/** Index of the first step at or after a time; the count of steps where there is none. */
export function firstAtOrAfter(timeSeconds: Float64Array, seconds: number): number {
  let low = 0;
  let high = timeSeconds.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((timeSeconds[middle] ?? Infinity) < seconds) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** Index of the step nearest to a time; -1 for an empty stretch. */
export function nearestIndex(timeSeconds: Float64Array, seconds: number): number {
  const after = firstAtOrAfter(timeSeconds, seconds);
  const before = after - 1;
  const distance = (index: number): number => Math.abs((timeSeconds[index] ?? Infinity) - seconds);
  return distance(after) < distance(before) ? after : before;
}

/** Whether a stretch holds what is in sight, to a second. */
export function covers(stretch: SecondsRange, sight: SecondsRange): boolean {
  return stretch.fromSeconds <= sight.fromSeconds + 1 && stretch.toSeconds >= sight.toSeconds - 1;
}
