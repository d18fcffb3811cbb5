import type { Run } from '@stillpier/contract';

const SMALLEST_ARCSEC = 2.5;
/** Nineteen frames in twenty stay within p95: half as much again holds nearly all. */
const ROOM = 1.6;

/** Half the height of a strip of the trace: the same for all runs of a night. */
export function traceHalfRangeArcsec(runs: readonly Run[]): number {
  const widest = runs.reduce(
    (most, { ra, dec }) => Math.max(most, ra?.p95Arcsec ?? 0, dec?.p95Arcsec ?? 0),
    0,
  );
  return Math.max(SMALLEST_ARCSEC, Math.ceil(widest * ROOM * 2) / 2);
}
