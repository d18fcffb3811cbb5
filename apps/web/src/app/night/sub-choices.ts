import type { Setup } from '@stillpier/contract';
import { secondsText } from '../figures/measure-text';
import type { ShownRun } from './shown-run';

/** Lengths that people plan with. Common practice, no source. */
const COMMON_SECONDS = [60, 120, 180, 300, 600, 900, 1200, 1800];

/** A length of one sub to choose. */
export interface SubChoice {
  readonly seconds: number;
  /** Filters of the setups that are usually given this length; empty for a common length. */
  readonly filters: readonly string[];
  /** `Ha 600 s`, or `600 s`. */
  readonly text: string;
}

/** The filters of the night's setups with their usual lengths, then the runs' own and the common lengths. */
export function subChoices(runs: readonly ShownRun[], setups: readonly Setup[]): SubChoice[] {
  const used = new Set(runs.map(({ of }) => of.setupId));
  const filters = setups.filter(({ id }) => used.has(id)).flatMap((setup) => setup.filters);
  const filterSeconds = [...new Set(filters.map(({ subSeconds }) => subSeconds))];
  const own = runs.flatMap(({ of }) => of.run.subs?.lengthSeconds ?? []);
  const others = [...new Set([...own, ...COMMON_SECONDS])]
    .filter((seconds) => !filterSeconds.includes(seconds))
    .sort((a, b) => a - b);
  return [...filterSeconds.sort((a, b) => a - b), ...others].map((seconds) => {
    const names = filters
      .filter(({ subSeconds }) => subSeconds === seconds)
      .map(({ name }) => name);
    const unique = [...new Set(names)];
    return {
      seconds,
      filters: unique,
      text: [unique.join(', '), secondsText(seconds)].filter(Boolean).join(' '),
    };
  });
}
