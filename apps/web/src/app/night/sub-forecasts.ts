import { subForecast, type SubFrames } from '@stillpier/analysis';
import type { Run } from '@stillpier/contract';
import type { RunStretch } from '../api/run-stretch';
import { idleTurns } from '../page/idle-turns';
import type { ShownRun } from './shown-run';

export type Subs = NonNullable<Run['subs']>;

/** The share that a person wants to keep when asking for the longest sub. */
export const SHARE_WANTED = 0.9;
/** Fewer subs than this tell no share. Own choice. */
export const FEWEST_SUBS = 3;
const STEP_SECONDS = 30;
/** Half an hour: the longest subs that narrowband filters are given. */
const LONGEST_SECONDS = 1800;

/** The forecasts of one run. */
export interface RunForecasts {
  readonly byLength: ReadonlyMap<number, Subs>;
  /** Longest sub, in steps of 30 s up to half an hour, of which nine in ten are kept; null: none is. */
  readonly longestSeconds: number | null;
}

/**
 * The forecasts of all runs for several lengths, by the analysis' own rules on all frames, a piece whenever the page is idle.
 * Runs without a forecast in the document, or without all of their frames, are left out.
 */
export async function forecastRuns(
  runs: readonly ShownRun[],
  framesOf: ReadonlyMap<string, RunStretch>,
  lengthsSeconds: readonly number[],
  signal: AbortSignal,
): Promise<ReadonlyMap<string, RunForecasts>> {
  const turn = idleTurns(signal);
  const forecasts = new Map<string, RunForecasts>();
  for (const run of runs) {
    const stretch = framesOf.get(run.id);
    if (stretch) {
      const frames = subFrames(run.of.run, stretch);
      const byLength = new Map<number, Subs>();
      for (const lengthSeconds of lengthsSeconds) {
        await turn();
        const subs = forecastOf(run, frames, lengthSeconds);
        if (subs) byLength.set(lengthSeconds, subs);
      }
      const longestSeconds = await longestKept(run, frames, turn);
      if (byLength.size > 0) forecasts.set(run.id, { byLength, longestSeconds });
    }
  }
  return forecasts;
}

/** The frames of a run as the analysis wants them; a stretch of every frame. */
export function subFrames(run: Run, { timeSeconds, ra, dec, setAside }: RunStretch): SubFrames {
  return {
    count: timeSeconds.length,
    timeSeconds,
    cadenceSeconds: run.cadenceSeconds ?? 0,
    raErrorArcsec: Float64Array.from(ra.leastArcsec),
    decErrorArcsec: Float64Array.from(dec.leastArcsec),
    setAside,
  };
}

/** The document's own where it has that length; null where it has no forecast at all. */
export function forecastOf(
  { of }: ShownRun,
  frames: SubFrames,
  lengthSeconds: number,
): Subs | null {
  const { run, seeingFwhmArcsec } = of;
  if (run.subs === null || seeingFwhmArcsec === null) return null;
  if (run.subs.lengthSeconds === lengthSeconds) return run.subs;
  return subForecast(frames, lengthSeconds, seeingFwhmArcsec, run.subs.keepAspect);
}

async function longestKept(
  run: ShownRun,
  frames: SubFrames,
  turn: () => Promise<void>,
): Promise<number | null> {
  for (let seconds = LONGEST_SECONDS; seconds >= STEP_SECONDS; seconds -= STEP_SECONDS) {
    await turn();
    const subs = forecastOf(run, frames, seconds);
    if (subs && subs.count >= FEWEST_SUBS && subs.within >= SHARE_WANTED * subs.count) {
      return seconds;
    }
  }
  return null;
}
