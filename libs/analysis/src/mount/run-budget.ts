import { type Part, type Peak, type Run, type WhyMissing } from '../analysis-document';
import { type RunSeries } from '../series/run-series';
import { usedFrames } from '../series/used-frames';
import { axisBudget, type AxisBudget } from './budget';
import { budgetByError } from './budget-by-error';
import { type MountMotion } from './mount-motion';
import { type ReplayableAxis } from './replay';

/** Budget of a run, and why parts of it are not told. */
export interface RunBudget {
  readonly budget: { readonly ra: Part[]; readonly dec: Part[] };
  /** Parts that stand at 0 because they could not be told, as `budget.dec.backlash`. */
  readonly whyMissing: WhyMissing;
}

/**
 * Error budget of both axes of a run: by replay where the corrections tell the star's own motion, else by the error alone.
 * O(n).
 *
 * @param axes From `replayableAxis`.
 * @param spectrum Of the guided error, from the run's guiding measures.
 */
export function runBudget(
  series: RunSeries,
  motion: MountMotion,
  axes: { readonly ra: ReplayableAxis | null; readonly dec: ReplayableAxis | null },
  spectrum: Run['spectrum'],
): RunBudget {
  const ra = axes.ra
    ? replayedBudget(series, motion, axes.ra, 'ra')
    : guessedBudget(series, motion, spectrum?.ra.peaks ?? [], 'ra');
  const dec = axes.dec
    ? replayedBudget(series, motion, axes.dec, 'dec')
    : guessedBudget(series, motion, spectrum?.dec.peaks ?? [], 'dec');
  const reasons = [...reasonsOf('ra', ra), ...reasonsOf('dec', dec)];
  return {
    budget: { ra: ra.parts, dec: dec.parts },
    whyMissing: Object.fromEntries<string>(reasons),
  };
}

function replayedBudget(
  series: RunSeries,
  motion: MountMotion,
  replayable: ReplayableAxis,
  axis: 'ra' | 'dec',
): AxisBudget {
  const { decPlay } = motion;
  return axisBudget({
    axis: replayable,
    run: series,
    errorArcsec: axis === 'ra' ? series.raErrorArcsec : series.decErrorArcsec,
    noiseArcsec: motion[axis].noiseArcsec,
    // RA is driven one way all night: its gap stays closed.
    whyNoGap: axis === 'dec' && 'why' in decPlay ? decPlay.why : null,
  });
}

function guessedBudget(
  series: RunSeries,
  motion: MountMotion,
  peaks: readonly Peak[],
  axis: 'ra' | 'dec',
): AxisBudget {
  const used = usedFrames(series);
  return budgetByError(
    used,
    axis === 'ra' ? used.raErrorArcsec : used.decErrorArcsec,
    series.cadenceSeconds,
    peaks,
    motion.whyMissing[`uncorrected.${axis}`] ??
      motion.whyMissing['uncorrected'] ??
      'The corrections do not tell how this axis was guided.',
  );
}

function reasonsOf(axis: 'ra' | 'dec', { whyMissing }: AxisBudget): [string, string][] {
  return Object.entries(whyMissing).map(([part, why]) => [`budget.${axis}.${part}`, why]);
}
