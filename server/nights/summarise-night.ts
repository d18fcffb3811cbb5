import { type Finding, SEVERITIES } from '@stillpier/contract';
import type { NightModel } from './night-model';
import type { RunModel } from './run-model';
import { weightedMedianItem } from './weighted-median';

export const RUN_MEASURES = [
  'target',
  'startsAt',
  'durationSeconds',
  'frames',
  'used',
  'raRmsArcsec',
  'decRmsArcsec',
  'totalRmsArcsec',
  'aspect',
  'positionAngleDegrees',
  'subs',
  'subsWithin',
] as const;
export type MeasuredRun = Pick<RunModel, (typeof RUN_MEASURES)[number]> & {
  /** Worst first, as in the document. */
  readonly findings: readonly Pick<Finding, 'code' | 'severity'>[];
};

export type NightMeasures = Pick<
  NightModel,
  | 'startsAt'
  | 'endsAt'
  | 'targets'
  | 'runCount'
  | 'guidedHours'
  | 'frames'
  | 'used'
  | 'raRmsArcsec'
  | 'decRmsArcsec'
  | 'totalRmsArcsec'
  | 'aspect'
  | 'positionAngleDegrees'
  | 'keptShare'
  | 'mainLimitCode'
  | 'mainLimitSeverity'
>;

/** The measures of a night from its runs, in order of time, at least one. */
export function summariseNight(runs: readonly MeasuredRun[]): NightMeasures {
  const sum = (of: (run: MeasuredRun) => number) => runs.reduce((all, run) => all + of(run), 0);
  const middle = (of: (run: MeasuredRun) => number | null) =>
    weightedMedianItem(runs, of, ({ used }) => used);
  const roundness = middle(({ aspect }) => aspect);
  const subs = sum((run) => run.subs ?? 0);
  const limit = mainLimit(runs);
  return {
    startsAt: new Date(Math.min(...runs.map(({ startsAt }) => startsAt.getTime()))),
    endsAt: new Date(Math.max(...runs.map(endMs))),
    targets: [...new Set(runs.flatMap(({ target }) => target ?? []))],
    runCount: runs.length,
    guidedHours: sum(({ durationSeconds }) => durationSeconds) / 3600,
    frames: sum(({ frames }) => frames),
    used: sum(({ used }) => used),
    raRmsArcsec: middle((run) => run.raRmsArcsec)?.raRmsArcsec ?? null,
    decRmsArcsec: middle((run) => run.decRmsArcsec)?.decRmsArcsec ?? null,
    totalRmsArcsec: middle((run) => run.totalRmsArcsec)?.totalRmsArcsec ?? null,
    aspect: roundness?.aspect ?? null,
    positionAngleDegrees: roundness?.positionAngleDegrees ?? null, // of the same run: one star
    keptShare: subs === 0 ? null : sum((run) => run.subsWithin ?? 0) / subs,
    mainLimitCode: limit?.code ?? null,
    mainLimitSeverity: limit?.severity ?? null,
  };
}

/** The worst finding of the night; of two as bad, that of the run with more frames. */
function mainLimit(runs: readonly MeasuredRun[]): MeasuredRun['findings'][number] | null {
  const byFrames = [...runs].sort((a, b) => b.used - a.used);
  const first = byFrames.flatMap((run) => limitOf(run) ?? []);
  first.sort((a, b) => SEVERITIES.indexOf(b.severity) - SEVERITIES.indexOf(a.severity));
  return first[0] ?? null;
}

/** Findings stand in the order of their gain; where none asks for anything, the sky is what limited. */
function limitOf({ findings }: MeasuredRun): MeasuredRun['findings'][number] | undefined {
  const [first] = findings;
  if (first?.severity !== 'fine') return first;
  return findings.find(({ code }) => code === 'seeing-limited') ?? first;
}

function endMs({ startsAt, durationSeconds }: MeasuredRun): number {
  return startsAt.getTime() + durationSeconds * 1000;
}
