import { type Part, type Spectrum, type WhyMissing } from '../analysis-document';
import { type RunSeries } from '../series/run-series';
import { usedFrames } from '../series/used-frames';
import { axisBudget, type AxisBudget } from './budget';
import { budgetByError } from './budget-by-error';
import { type MountMotion } from './mount-motion';
import { replayableAxis } from './replay';

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
 * @param spectrum Of the guided error, from the run's guiding measures.
 */
export function runBudget(
  series: RunSeries,
  motion: MountMotion,
  spectrum: { readonly ra: Spectrum; readonly dec: Spectrum },
): RunBudget {
  const ra = budgetOf(series, motion, spectrum.ra, 'ra');
  const dec = budgetOf(series, motion, spectrum.dec, 'dec');
  const reasons = [...reasonsOf('ra', ra), ...reasonsOf('dec', dec)];
  return {
    budget: { ra: ra.parts, dec: dec.parts },
    whyMissing: Object.fromEntries<string>(reasons),
  };
}

function budgetOf(
  series: RunSeries,
  motion: MountMotion,
  spectrum: Spectrum,
  axis: 'ra' | 'dec',
): AxisBudget {
  const replayable = replayableAxis(series, motion, axis);
  if (replayable === null) {
    const used = usedFrames(series);
    return budgetByError(
      used,
      axis === 'ra' ? used.raErrorArcsec : used.decErrorArcsec,
      series.cadenceSeconds,
      spectrum,
      motion.whyMissing[`uncorrected.${axis}`] ??
        motion.whyMissing['uncorrected'] ??
        'The corrections do not tell how this axis was guided.',
    );
  }
  // RA is driven one way all night: its gap stays closed.
  const gapUnknown = axis === 'dec' && 'why' in motion.decPlay;
  return axisBudget({
    axis: replayable,
    run: series,
    errorArcsec: axis === 'ra' ? series.raErrorArcsec : series.decErrorArcsec,
    noiseArcsec: motion[axis].noiseArcsec,
    whyNoGap: gapUnknown && 'why' in motion.decPlay ? motion.decPlay.why : null,
  });
}

function reasonsOf(axis: 'ra' | 'dec', { whyMissing }: AxisBudget): [string, string][] {
  return Object.entries(whyMissing).map(([part, why]) => [`budget.${axis}.${part}`, why]);
}
