import { type Run, type WhyMissing } from './analysis-document';
import { type MountMeasures, unmeasured } from './measure-mount';
import { type RunSeries } from './series/run-series';
import { setAsideStretches } from './series/set-aside';
import { usedFrames } from './series/used-frames';
import { at } from './statistics/at';

/** A run with fewer frames that count is listed and not analysed. */
export const FEWEST_USED_FRAMES = 30;

const MILLISECONDS = 1000;

/** What the document says of any run: when it was, its frames and what was set aside. */
export type RunFacts = Pick<
  Run,
  | 'index'
  | 'target'
  | 'start'
  | 'durationSeconds'
  | 'cadenceSeconds'
  | 'frames'
  | 'used'
  | 'setAside'
  | 'whyMissing'
>;

/** A run of the document but for what the mount measures add. */
export type GuidedRun = Omit<Run, keyof MountMeasures['measures']>;

/** The facts of a run that need no measuring. O(n). */
export function runFacts(index: number, series: RunSeries): RunFacts {
  const whyMissing: WhyMissing = {};
  if (series.target === null) whyMissing['target'] = 'The log names no target.';
  if (series.startEpochSeconds === null) whyMissing['start'] = 'The log tells no date.';
  if (series.cadenceSeconds === 0) {
    whyMissing['cadenceSeconds'] = 'The run has one frame, or most of its frames carry one time.';
  }
  return {
    index,
    target: series.target,
    start: isoInstant(series.startEpochSeconds),
    durationSeconds: at(series.timeSeconds, series.count - 1),
    cadenceSeconds: series.cadenceSeconds === 0 ? null : series.cadenceSeconds,
    frames: series.count,
    used: usedFrames(series).frame.length,
    setAside: setAsideStretches(series),
    whyMissing,
  };
}

/** Why a run in arcseconds cannot be analysed, as one sentence; null when it can. */
export function whyNotAnalysed({ used, cadenceSeconds }: RunFacts): string | null {
  if (used < FEWEST_USED_FRAMES) {
    return `Only ${String(used)} frames of this run count, and ${String(FEWEST_USED_FRAMES)} are needed.`;
  }
  return cadenceSeconds === null ? 'Most frames of this run carry the same time.' : null;
}

/** A run that is listed and not analysed: every measure null for one reason. */
export function listedRun(facts: RunFacts, reason: string): Run {
  const { measures, whyMissing } = unmeasured(reason);
  const guiding = ['ra', 'dec', 'total', 'correlation', 'footprint', 'spectrum', 'subs'];
  return {
    ...facts,
    ra: null,
    dec: null,
    total: null,
    correlation: null,
    footprint: null,
    spectrum: null,
    subs: null,
    ...measures,
    whyMissing: {
      ...facts.whyMissing,
      ...Object.fromEntries(guiding.map((key) => [key, reason])),
      ...whyMissing,
    },
  };
}

function isoInstant(epochSeconds: number | null): string | null {
  if (epochSeconds === null) return null;
  return new Date(epochSeconds * MILLISECONDS).toISOString().replace('.000Z', 'Z');
}
