import { at } from '../statistics/at';
import { median } from '../statistics/quantile';
import { type LogFrames } from './log-frames';

/** Frames `from` (included) to `to` (not included) of the log. */
export interface FrameRange {
  readonly from: number;
  readonly to: number;
}

/** A gap ends a run when it is longer than both of these. */
const GAP_CADENCES = 10;
const GAP_SECONDS = 60;

/**
 * Cuts a log into runs: at a change of the run or target column, at a gap longer than max(10 cadences, 60 s) and
 * where time goes backwards. The cadence is the median spacing of the stretch that is cut. A frame that tells no run
 * or target (index below 0) belongs to the one before. O(n).
 */
export function cutRuns(frames: LogFrames): FrameRange[] {
  const runs: FrameRange[] = [];
  let from = 0;
  for (let i = 1; i <= frames.count; i++) {
    if (i < frames.count && !changes(frames.run, i) && !changes(frames.target, i)) continue;
    runs.push(...cutAtGaps(frames.timeSeconds, { from, to: i }));
    from = i;
  }
  return runs;
}

function changes(column: Int32Array | null, i: number): boolean {
  if (column === null) return false;
  const now = at(column, i);
  return now >= 0 && now !== at(column, i - 1) && at(column, i - 1) >= 0;
}

function cutAtGaps(timeSeconds: Float64Array, { from, to }: FrameRange): FrameRange[] {
  if (to - from < 2) return to > from ? [{ from, to }] : [];
  const longest = Math.max(
    GAP_CADENCES * medianSpacing(timeSeconds.subarray(from, to)),
    GAP_SECONDS,
  );
  const cut: FrameRange[] = [];
  let start = from;
  for (let i = from + 1; i < to; i++) {
    const step = at(timeSeconds, i) - at(timeSeconds, i - 1);
    if (step >= 0 && step <= longest) continue;
    cut.push({ from: start, to: i });
    start = i;
  }
  return [...cut, { from: start, to }];
}

/**
 * Median spacing of ascending times: the cadence.
 *
 * @param timeSeconds At least two times.
 */
export function medianSpacing(timeSeconds: Float64Array): number {
  const spacing = new Float64Array(timeSeconds.length - 1);
  for (let i = 0; i < spacing.length; i++) {
    spacing[i] = at(timeSeconds, i + 1) - at(timeSeconds, i);
  }
  return median(spacing);
}
