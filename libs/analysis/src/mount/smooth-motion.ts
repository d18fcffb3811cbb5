import { type MotionFit } from './motion-fit';
import { type FittedLine, sineInto } from './motion-line';
import { type WormFit } from './periodic-error';
import { driftOf } from './sky-trend';

/** What of an uncorrected motion is drift and lines, a value a frame. */
export interface SmoothMotion {
  readonly smooth: Float64Array;
  readonly drift: Float64Array;
  /** The worm's part of it. */
  readonly periodic: Float64Array;
  /** Strongest first. */
  readonly lines: readonly FittedLine[];
  /** Over the run in the mean: a polar error bends the drift of a long one. */
  readonly driftPerSecond: number;
  readonly driftStandardError: number;
}

/** Drift and lines at every frame: the worm's fit where there is one, else the motion's own. O(n) a line. */
export function smoothMotion(
  timeSeconds: Float64Array,
  fit: MotionFit,
  worm: WormFit | null,
): SmoothMotion {
  const { trend, driftStandardError } = worm ?? fit;
  const others = worm?.otherLines ?? fit.lines;
  const drift = driftOf(timeSeconds, trend);
  const smooth = drift.slice();
  const periodic = new Float64Array(timeSeconds.length);
  for (const line of others) sineInto(timeSeconds, line, smooth);
  for (const line of worm?.harmonics ?? []) sineInto(timeSeconds, line, periodic);
  periodic.forEach((value, n) => {
    smooth[n] = (smooth[n] ?? 0) + value;
  });
  const lines = [...others, ...(worm?.harmonics ?? [])].sort((a, b) => b.amplitude - a.amplitude);
  return { smooth, drift, periodic, lines, driftPerSecond: trend[0] ?? 0, driftStandardError };
}
