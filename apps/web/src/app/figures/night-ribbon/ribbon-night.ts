import type { SecondsRange, TraceStretch } from '../trace-chart/trace-stretch';

/** A run as the ribbon needs it. */
export interface RibbonRun {
  readonly id: string;
  readonly name: string;
  readonly totalRmsArcsec: number | null;
  readonly startMs: number;
  readonly durationSeconds: number;
  /** null while it loads. */
  readonly stretch: TraceStretch | null;
  readonly setAside: readonly (SecondsRange & { readonly reason: string })[];
  readonly subs: RibbonSubs | null;
}

export interface RibbonSubs {
  readonly lengthSeconds: number;
  readonly keepAspect: number;
  readonly aspects: readonly number[];
  readonly startsSeconds: readonly number[];
}

/** Nine frames in ten of these milliseconds stayed inside the two sizes. */
export interface EnvelopeColumn {
  readonly fromMs: number;
  readonly toMs: number;
  readonly raArcsec: number;
  readonly decArcsec: number;
}

const LEAST_FRAMES = 12;
const SHARE_INSIDE = 0.9;

/**
 * The width that nine frames in ten stay inside, for equal steps of time of at least `stepMs`: longer where the cadence
 * would leave a step with fewer than 12 frames. Steps that still have fewer are left out.
 */
export function envelopeColumns(run: RibbonRun, stepMs: number): EnvelopeColumn[] {
  const { stretch } = run;
  if (!stretch || stretch.timeSeconds.length < 2) return [];
  const steps = stretch.timeSeconds.length;
  const msPerFrame = (run.durationSeconds * 1000) / (steps - 1);
  const columnMs = stepMs * Math.max(1, Math.ceil(((LEAST_FRAMES + 1) * msPerFrame) / stepMs));
  const gathered = new Map<number, { ra: number[]; dec: number[] }>();
  for (let i = 0; i < steps; i += 1) {
    const ra = farther(stretch.ra.leastArcsec[i], stretch.ra.greatestArcsec[i]);
    const dec = farther(stretch.dec.leastArcsec[i], stretch.dec.greatestArcsec[i]);
    if (stretch.setAside[i] !== 0 || Number.isNaN(ra) || Number.isNaN(dec)) continue;
    const column = Math.floor(((stretch.timeSeconds[i] ?? 0) * 1000) / columnMs);
    const sizes = gathered.get(column) ?? { ra: [], dec: [] };
    sizes.ra.push(ra);
    sizes.dec.push(dec);
    gathered.set(column, sizes);
  }
  return [...gathered]
    .filter(([, sizes]) => sizes.ra.length >= LEAST_FRAMES)
    .map(([column, sizes]) => ({
      fromMs: run.startMs + column * columnMs,
      toMs: run.startMs + (column + 1) * columnMs,
      raArcsec: inside(sizes.ra),
      decArcsec: inside(sizes.dec),
    }));
}

function farther(least = NaN, greatest = NaN): number {
  return Math.max(Math.abs(least), Math.abs(greatest));
}

function inside(sizes: number[]): number {
  const sorted = sizes.sort((a, b) => a - b);
  return sorted[Math.ceil(SHARE_INSIDE * sorted.length) - 1] ?? NaN;
}

export interface SubCell {
  readonly fromMs: number;
  readonly toMs: number;
  readonly aspect: number;
  readonly over: boolean;
}

export function subCells(run: RibbonRun): SubCell[] {
  const { subs } = run;
  if (!subs) return [];
  return subs.startsSeconds.map((startSeconds, i) => {
    const fromMs = run.startMs + startSeconds * 1000;
    const aspect = subs.aspects[i] ?? NaN;
    return {
      fromMs,
      toMs: fromMs + subs.lengthSeconds * 1000,
      aspect,
      over: aspect > subs.keepAspect,
    };
  });
}

export const endMs = (run: RibbonRun): number => run.startMs + run.durationSeconds * 1000;
