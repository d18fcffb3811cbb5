import {
  type Axis,
  type BudgetPart,
  type Finding,
  type Optics,
  type Part,
  type Run,
} from '../analysis-document';
import { type GainCurve } from '../mount/gain-curve';
import { type RigDescription } from '../rig-description';
import { FWHM_PER_SIGMA, starFootprint } from '../stars/footprint';
import { THRESHOLDS, type Threshold } from './thresholds';

export type AxisName = 'ra' | 'dec';
export type MeasuredRun = Omit<Run, 'findings'>;

export interface FindingContext {
  readonly rig: RigDescription;
  readonly optics: Optics;
  /** By replay; null where the night cannot be replayed. */
  readonly gainCurves: { readonly ra: GainCurve | null; readonly dec: GainCurve | null };
  /** Peak to peak that is usual on this rig; null where no earlier nights are known. */
  readonly usualPeriodicErrorArcsec: number | null;
  /** How many subs would be kept with the errors of each axis so many times as large; null where the seeing is not known. */
  readonly subsKept: ((raFactor: number, decFactor: number) => number) | null;
  /** Dec response to small corrections over that to large ones, with its standard error; null where it cannot be told. */
  readonly smallResponse: { readonly ratio: number; readonly standardError: number } | null;
}

/** A finding before its severity is held to what the sky allows. */
export interface Draft extends Finding {
  /** Whose errors it speaks of; null for both or for the sky and the optics. */
  readonly axis: AxisName | null;
  /** Whether it asks for work on the mount or its loop: such findings may not shout on a night of bad seeing. */
  readonly onMount: boolean;
}

type Severity = Finding['severity'];

/** Severity of a value against a threshold of its own. */
export function severityOf(value: number, { watch, act }: Threshold): Severity {
  if (value >= act) return 'act';
  return value >= watch ? 'watch' : 'fine';
}

const ORDER: readonly Severity[] = ['fine', 'watch', 'act'];

/** The milder of several: all of them must hold. */
export function mildest(...severities: readonly Severity[]): Severity {
  return ORDER[Math.min(...severities.map((each) => ORDER.indexOf(each)))] ?? 'fine';
}

/** The graver of several. */
export function gravest(...severities: readonly Severity[]): Severity {
  return ORDER[Math.max(...severities.map((each) => ORDER.indexOf(each)))] ?? 'fine';
}

/**
 * The RMS of one cause in one axis below which no star shows it, and from which it calls for an act: by the seeing disc and
 * the imaging pixel, whichever forgives more.
 */
export function rmsThreshold({ rig, optics }: FindingContext): Threshold {
  const bySeeing = rig.seeingFwhmArcsec;
  const byPixel = optics.imagingScaleArcsecPerPx;
  if (bySeeing === undefined && byPixel === null) return THRESHOLDS.rmsArcsec;
  const sigma = (bySeeing ?? 0) / FWHM_PER_SIGMA;
  const { rmsPerSeeingSigma: perSigma, rmsImagingPx: perPx } = THRESHOLDS;
  return {
    watch: Math.max(perSigma.watch * sigma, perPx.watch * (byPixel ?? 0)),
    act: Math.max(perSigma.act * sigma, perPx.act * (byPixel ?? 0)),
    because: `${perSigma.because} ${perPx.because}`,
  };
}

export function partOf(run: MeasuredRun, axis: AxisName, name: BudgetPart): Part | null {
  return run.budget?.[axis].find(({ part }) => part === name) ?? null;
}

/** Severity of a part of the budget: its share and its size must both matter. */
export function partSeverity(part: Part, context: FindingContext): Severity {
  return mildest(
    severityOf(part.share, THRESHOLDS.share),
    severityOf(part.rmsArcsec, rmsThreshold(context)),
  );
}

/**
 * What a smaller variance in one or both axes would make of RMS, star and subs, in arcsec² taken off. The errors of every
 * sub are taken to shrink as those of the run do.
 */
export function gainIfCured(
  run: MeasuredRun,
  { rig, subsKept }: FindingContext,
  off: { readonly ra?: number; readonly dec?: number },
): Finding['gain'] {
  if (run.ra === null || run.dec === null) return null;
  const east = Math.max(0, run.ra.rmsArcsec ** 2 - (off.ra ?? 0));
  const north = Math.max(0, run.dec.rmsArcsec ** 2 - (off.dec ?? 0));
  const common = (run.correlation ?? 0) * run.ra.rmsArcsec * run.dec.rmsArcsec;
  const most = Math.sqrt(east * north);
  const cross = Math.max(-most, Math.min(most, common));
  const seeing = rig.seeingFwhmArcsec;
  return {
    rmsIfCuredArcsec: Math.sqrt(east + north),
    aspectIfCured:
      seeing === undefined ? null : starFootprint({ east, north, cross }, seeing).aspect,
    subsKeptIfCured: subsKept?.(factor(east, run.ra), factor(north, run.dec)) ?? null,
  };
}

function factor(variance: number, { rmsArcsec }: Axis): number {
  return rmsArcsec === 0 ? 1 : Math.sqrt(variance) / rmsArcsec;
}
