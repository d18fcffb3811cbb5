import { type Optics, type Run } from './analysis-document';
import { axisMeasures, totalMeasures } from './guiding/axis-measures';
import { type GuidedRun, type RunFacts } from './listed-run';
import { type RigDescription } from './rig-description';
import { type RunSeries } from './series/run-series';
import { type UsedFrames, usedFrames } from './series/used-frames';
import { type AmplitudeCurve } from './spectrum/amplitude-curve';
import { namedPeriods } from './spectrum/label-period';
import { runSpectrum } from './spectrum/run-spectrum';
import { starFootprint } from './stars/footprint';
import { subForecast } from './stars/sub-forecast';
import { covariance, pearson } from './statistics/pearson';

/** Largest aspect of a star that is kept when the rig does not say: between what passes for round (1.1) and for long (1.2). Common practice. */
export const USUAL_KEEP_ASPECT = 1.15;

export interface RunSetting {
  readonly rig: RigDescription;
  readonly optics: Optics;
  readonly subSeconds: number;
}

export interface RunAnalysis {
  readonly run: GuidedRun;
  readonly curve: AmplitudeCurve;
}

/**
 * The guiding measures, star shapes and spectra of one run. O(n log n).
 *
 * @param facts Facts that `whyNotAnalysed` has nothing against.
 * @param series The run that they are of.
 */
export function analyseRun(facts: RunFacts, series: RunSeries, setting: RunSetting): RunAnalysis {
  const { rig, optics } = setting;
  const used = usedFrames(series);
  const ra = axisMeasures(used, used.raErrorArcsec);
  const dec = axisMeasures(used, used.decErrorArcsec);
  const total = totalMeasures(used, ra, dec, optics.imagingScaleArcsecPerPx);
  const { spectrum, curve } = runSpectrum(used, series.cadenceSeconds, namedPeriods(rig));
  const still = ra.rmsArcsec === 0 || dec.rmsArcsec === 0;
  const correlation = still ? null : pearson(used.raErrorArcsec, used.decErrorArcsec);
  const stars = starShapes(series, used, setting);
  const missing: [string, unknown, string][] = [
    ['correlation', correlation, 'The error of one axis never changes.'],
    [
      'ra.lag1',
      ra.lag1,
      'The RA error never changes, or no two frames that count follow each other.',
    ],
    [
      'dec.lag1',
      dec.lag1,
      'The Dec error never changes, or no two frames that count follow each other.',
    ],
    [
      'total.rmsImagingPx',
      total.rmsImagingPx,
      "The rig's description does not tell the imaging scale.",
    ],
    ['footprint', stars.footprint, 'The star size without guide error (seeing) is not known.'],
    ['subs', stars.subs, 'The star size without guide error (seeing) is not known.'],
  ];
  const reasons = missing.filter(([, value]) => value === null);
  const whyMissing = {
    ...facts.whyMissing,
    ...Object.fromEntries(reasons.map(([key, , reason]) => [key, reason])),
  };
  return {
    run: { ...facts, ra, dec, total, correlation, spectrum, ...stars, whyMissing },
    curve,
  };
}

function starShapes(
  series: RunSeries,
  used: UsedFrames,
  { rig, subSeconds }: RunSetting,
): Pick<Run, 'footprint' | 'subs'> {
  const seeing = rig.seeingFwhmArcsec;
  if (seeing === undefined) return { footprint: null, subs: null };
  const { raErrorArcsec: ra, decErrorArcsec: dec } = used;
  const spread = {
    east: covariance(ra, ra),
    north: covariance(dec, dec),
    cross: covariance(ra, dec),
  };
  const keepAspect = rig.keepAspect ?? USUAL_KEEP_ASPECT;
  return {
    footprint: starFootprint(spread, seeing),
    subs: subForecast(series, subSeconds, seeing, keepAspect),
  };
}
