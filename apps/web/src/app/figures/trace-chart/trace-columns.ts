import {
  firstAtOrAfter,
  type AxisExtent,
  type SecondsRange,
  type TraceStretch,
} from './trace-stretch';

/** One column of the drawing, or one single frame. */
export interface TraceColumn {
  readonly seconds: number;
  readonly leastArcsec: number;
  readonly greatestArcsec: number;
  readonly meanArcsec: number;
}

/** Columns that touch each other: a line may join them. */
export type TraceSegment = readonly TraceColumn[];

export interface TraceColumns {
  /** Width of a column in seconds; 0 where each frame stands alone. */
  readonly stepSeconds: number;
  readonly ra: readonly TraceSegment[];
  readonly dec: readonly TraceSegment[];
}

/** A frame stands alone from this many pixels a frame. */
const PX_PER_SINGLE_FRAME = 2;
const FRAMES_PER_COLUMN = 4;

/** The kept frames in sight, gathered into columns of a pixel or more: extent and mean of each column. */
export function traceColumns(
  stretch: TraceStretch,
  sight: SecondsRange,
  widthPx: number,
): TraceColumns {
  const first = Math.max(0, firstAtOrAfter(stretch.timeSeconds, sight.fromSeconds) - 1);
  const last = Math.min(
    stretch.timeSeconds.length,
    firstAtOrAfter(stretch.timeSeconds, sight.toSeconds) + 1,
  );
  const count = last - first;
  const single = !stretch.thinned && count * PX_PER_SINGLE_FRAME <= widthPx;
  const perColumn = stretch.thinned ? 1 : FRAMES_PER_COLUMN; // a thinned step holds several already
  const columns = Math.max(1, Math.min(widthPx, Math.floor(count / perColumn)));
  const stepSeconds = single ? 0 : (sight.toSeconds - sight.fromSeconds) / columns;
  const gather = (axis: AxisExtent): TraceSegment[] =>
    single
      ? singleFrames(stretch, axis, first, last)
      : gathered(stretch, axis, first, last, sight.fromSeconds, stepSeconds);
  return { stepSeconds, ra: gather(stretch.ra), dec: gather(stretch.dec) };
}

function isKept(stretch: TraceStretch, axis: AxisExtent, index: number): boolean {
  return stretch.setAside[index] === 0 && Number.isFinite(axis.leastArcsec[index] ?? NaN);
}

function singleFrames(
  stretch: TraceStretch,
  axis: AxisExtent,
  first: number,
  last: number,
): TraceSegment[] {
  const segments: TraceColumn[][] = [];
  let open: TraceColumn[] | null = null;
  for (let i = first; i < last; i += 1) {
    if (!isKept(stretch, axis, i)) {
      open = null;
      continue;
    }
    const leastArcsec = axis.leastArcsec[i] ?? NaN;
    const greatestArcsec = axis.greatestArcsec[i] ?? NaN;
    const column = {
      seconds: stretch.timeSeconds[i] ?? NaN,
      leastArcsec,
      greatestArcsec,
      meanArcsec: (leastArcsec + greatestArcsec) / 2,
    };
    if (open) open.push(column);
    else segments.push((open = [column]));
  }
  return segments;
}

function gathered(
  stretch: TraceStretch,
  axis: AxisExtent,
  first: number,
  last: number,
  fromSeconds: number,
  stepSeconds: number,
): TraceSegment[] {
  const segments: TraceColumn[][] = [];
  let lastColumn = NaN;
  let i = first;
  while (i < last) {
    const column = Math.floor(((stretch.timeSeconds[i] ?? NaN) - fromSeconds) / stepSeconds);
    let least = Infinity;
    let greatest = -Infinity;
    let sum = 0;
    let kept = 0;
    for (; i < last; i += 1) {
      const seconds = stretch.timeSeconds[i] ?? NaN;
      if (Math.floor((seconds - fromSeconds) / stepSeconds) !== column) break;
      if (!isKept(stretch, axis, i)) continue;
      const low = axis.leastArcsec[i] ?? NaN;
      const high = axis.greatestArcsec[i] ?? NaN;
      least = Math.min(least, low);
      greatest = Math.max(greatest, high);
      sum += (low + high) / 2;
      kept += 1;
    }
    if (kept === 0) continue;
    const drawn = {
      seconds: fromSeconds + (column + 0.5) * stepSeconds,
      leastArcsec: least,
      greatestArcsec: greatest,
      meanArcsec: sum / kept,
    };
    // A column without frames is bridged (frames come unevenly), a longer gap is not.
    const open = segments.at(-1);
    if (open && column - lastColumn <= 2) open.push(drawn);
    else segments.push([drawn]);
    lastColumn = column;
  }
  return segments;
}
