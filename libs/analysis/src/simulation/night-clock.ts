import { type NightScenario } from './night-scenario';
import { RandomSource } from './random-source';

export interface NightClock {
  /** Seconds since the first frame of the log. */
  readonly timeSeconds: Float64Array;
  /** Index of the run that a frame belongs to. */
  readonly run: Int32Array;
}

/** When the frames of a night are taken: each run's cadence with its jitter, and the pauses between runs. */
export function nightClock(scenario: NightScenario, seed: number): NightClock {
  const random = RandomSource.forCause(seed, 'clock');
  const times: number[] = [];
  const runs: number[] = [];
  let start = 0;
  scenario.runs.forEach((run, index) => {
    if (index > 0) start += run.pauseSeconds;
    const frames = Math.floor(run.durationSeconds / scenario.cadenceSeconds);
    for (let n = 0; n < frames; n++) {
      const late = n === 0 ? 0 : scenario.cadenceJitterSeconds * random.uniform();
      times.push(start + n * scenario.cadenceSeconds + late);
      runs.push(index);
    }
    start += frames * scenario.cadenceSeconds;
  });
  return { timeSeconds: Float64Array.from(times), run: Int32Array.from(runs) };
}
