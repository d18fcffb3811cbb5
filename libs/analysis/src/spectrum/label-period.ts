import { type RigDescription } from '../rig-description';
import { rigWormPeriodSeconds } from './gear-periods';

/** A period that the rig has a name for. */
export interface NamedPeriod {
  readonly label: string;
  readonly periodSeconds: number;
}

const WORM_HARMONICS = 6;
/** A period is known to this part of itself at best: rates and teeth are nominal. */
const SAME_PERIOD = 0.02;

/**
 * The periods that the rig names, in the order in which they claim a peak: the worm, the gear stages (their owner
 * named them), then the worm's harmonics "worm / 2" to "worm / 6".
 */
export function namedPeriods(rig: RigDescription): NamedPeriod[] {
  const worm = rigWormPeriodSeconds(rig);
  const harmonics =
    worm === null
      ? []
      : Array.from({ length: WORM_HARMONICS }, (_, i) => ({
          label: i === 0 ? 'worm' : `worm / ${String(i + 1)}`,
          periodSeconds: worm / (i + 1),
        }));
  const stages = (rig.mount?.gearStages ?? []).map(({ name, periodSeconds }) => ({
    label: name,
    periodSeconds,
  }));
  return [...harmonics.slice(0, 1), ...stages, ...harmonics.slice(1)];
}

/**
 * Name of a peak: the nearest named period within its own resolution or 2 %, null when none is that near. Of two that
 * are equally near within 2 % of each other the first claims it.
 */
export function labelPeriod(
  periodSeconds: number,
  resolutionHz: number,
  named: readonly NamedPeriod[],
): string | null {
  let best: NamedPeriod | null = null;
  let nearest = Infinity;
  for (const candidate of named) {
    const off = Math.abs(1 / candidate.periodSeconds - 1 / periodSeconds);
    const allowed = Math.max(resolutionHz, SAME_PERIOD / periodSeconds);
    const same =
      best !== null && Math.abs(candidate.periodSeconds / best.periodSeconds - 1) < SAME_PERIOD;
    if (off > allowed || off >= nearest || same) continue;
    best = candidate;
    nearest = off;
  }
  return best?.label ?? null;
}
