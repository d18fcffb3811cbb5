import type { NightRun } from '@stillpier/contract';

/** A run of the night with the name that the page gives it. */
export interface ShownRun {
  readonly id: string;
  /** Of the night, from 1: the logs of a night each count their own. */
  readonly number: number;
  readonly name: string;
  readonly startMs: number | null;
  readonly of: NightRun;
}

/** In the order of the night; a run without a target goes by its number. */
export function shownRuns(runs: readonly NightRun[]): ShownRun[] {
  const startOf = ({ run }: NightRun): number | null =>
    run.start === null ? null : Date.parse(run.start);
  return [...runs]
    .sort((a, b) => (startOf(a) ?? Infinity) - (startOf(b) ?? Infinity))
    .map((each, i) => ({
      id: each.id,
      number: i + 1,
      name: each.run.target ?? `Run ${i + 1}`,
      startMs: startOf(each),
      of: each,
    }));
}

/** The run that a page shows first: the one with the most frames in its numbers. */
export function leadingRun(runs: readonly ShownRun[]): ShownRun | undefined {
  return runs.reduce<ShownRun | undefined>(
    (most, each) => (most && most.of.run.used >= each.of.run.used ? most : each),
    undefined,
  );
}

/** `run 2, M 33`, or `run 2` where there is no target. */
export function runTitle(run: ShownRun): string {
  return run.of.run.target === null ? `Run ${run.number}` : `Run ${run.number}, ${run.name}`;
}
