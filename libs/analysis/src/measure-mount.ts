import { type Backlash, type PolarAlignment, type Run, type WhyMissing } from './analysis-document';
import { findFindings } from './diagnosis/find-findings';
import { type FindingContext } from './diagnosis/finding-context';
import { type GuidedRun } from './listed-run';
import { gainCurve } from './mount/gain-curve';
import { measureMountMotion } from './mount/measure-mount-motion';
import { type MountMotion } from './mount/mount-motion';
import { polarAlignment } from './mount/polar-alignment';
import { replayableAxis } from './mount/replay';
import { runBudget } from './mount/run-budget';
import { smallResponse } from './mount/small-response';
import { describeOptics } from './optics/describe-optics';
import { type RigDescription } from './rig-description';
import { type RunSeries } from './series/run-series';
import { subForecast } from './stars/sub-forecast';

/** A run that is analysed: its frames, and what the document says of it so far. */
export interface AnalysedRun {
  readonly series: RunSeries;
  readonly run: GuidedRun;
}

/** What the mount measures add to a run of the document. */
export interface MountMeasures {
  readonly measures: Pick<
    Run,
    | 'uncorrected'
    | 'periodicError'
    | 'polarAlignment'
    | 'backlash'
    | 'response'
    | 'loop'
    | 'seeingFloor'
    | 'budget'
    | 'findings'
  >;
  readonly whyMissing: WhyMissing;
  /** The motion that the mount would have shown with no corrections, a value a frame of the run; null when not known. */
  readonly uncorrectedRaArcsec: Float64Array | null;
  readonly uncorrectedDecArcsec: Float64Array | null;
}

/** The mount measures and findings of all analysed runs of a log together: polar alignment needs them side by side. */
export function measureMount(runs: readonly AnalysedRun[], rig: RigDescription): MountMeasures[] {
  const moved = runs.map((each) => ({ ...each, motion: measureMountMotion(each.series, rig) }));
  const optics = describeOptics(rig);
  const motions = moved.map(({ motion }) => motion);
  const polar = polarAlignments(runs, motions, rig.site?.latitudeDegrees ?? null);
  return moved.map(({ run, series, motion }) => {
    const alignment = polar.of.get(motion) ?? null;
    const backlash = backlashOf(motion);
    const axes = {
      ra: replayableAxis(series, motion, 'ra'),
      dec: replayableAxis(series, motion, 'dec'),
    };
    const { budget, whyMissing: whyBudget } = runBudget(series, motion, axes, run.spectrum);
    const context: FindingContext = {
      rig,
      optics,
      gainCurves: {
        ra: axes.ra && gainCurve(axes.ra, series),
        dec: axes.dec && gainCurve(axes.dec, series),
      },
      usualPeriodicErrorArcsec: null,
      subsKept: subsKept(run, series, rig),
      smallResponse: smallResponse(series, motion),
    };
    const measures = {
      uncorrected: motion.uncorrected,
      periodicError: motion.periodicError,
      polarAlignment: alignment,
      backlash,
      response: motion.response,
      loop: motion.loop,
      seeingFloor: motion.seeingFloor,
      budget,
    };
    return {
      measures: { ...measures, findings: findFindings({ ...run, ...measures }, context) },
      whyMissing: {
        ...motion.whyMissing,
        ...(alignment === null
          ? { polarAlignment: 'The drift of Dec without corrections is not known.' }
          : polar.whyMissing),
        ...('why' in motion.decPlay ? { backlash: motion.decPlay.why } : {}),
        ...(backlash !== null && backlash.ms === null
          ? { 'backlash.ms': 'The corrections are logged in arcseconds.' }
          : {}),
        ...whyBudget,
      },
      uncorrectedRaArcsec: motion.ra.uncorrectedArcsec,
      uncorrectedDecArcsec: motion.dec.uncorrectedArcsec,
    };
  });
}

/** Subs within the owner's aspect, with the errors of the run made larger or smaller. */
function subsKept(
  { subs }: GuidedRun,
  series: RunSeries,
  { seeingFwhmArcsec }: RigDescription,
): FindingContext['subsKept'] {
  if (subs === null || seeingFwhmArcsec === undefined) return null;
  return (raFactor, decFactor) => {
    const changed = {
      ...series,
      raErrorArcsec: series.raErrorArcsec.map((error) => raFactor * error),
      decErrorArcsec: series.decErrorArcsec.map((error) => decFactor * error),
    };
    return subForecast(changed, subs.lengthSeconds, seeingFwhmArcsec, subs.keepAspect).within;
  };
}

/** The document's part of the Dec gap. */
function backlashOf({ decPlay }: MountMotion): Backlash | null {
  if ('why' in decPlay) return null;
  const { arcsec, ms, low, high, determined, reversals } = decPlay;
  return { arcsec, ms, low, high, determined, reversals };
}

/** Polar alignment of the runs whose uncorrected Dec drift is known. */
function polarAlignments(
  runs: readonly AnalysedRun[],
  motions: readonly MountMotion[],
  latitudeDegrees: number | null,
): { readonly of: Map<MountMotion, PolarAlignment>; readonly whyMissing: WhyMissing } {
  const known = motions.flatMap((motion, i) => {
    const dec = motion.uncorrected?.dec;
    const series = runs[i]?.series;
    return dec === undefined || series === undefined ? [] : [{ motion, dec, series }];
  });
  const { runs: alignments, whyMissing } = polarAlignment(
    known.map(({ dec, series }) => ({
      decDriftArcsecPerMinute: dec.driftArcsecPerMinute,
      standardError: dec.driftStandardError,
      hourAngleHours: series.hourAngleHours,
      declinationDegrees: series.declinationDegrees,
    })),
    latitudeDegrees,
  );
  const of = new Map<MountMotion, PolarAlignment>();
  known.forEach(({ motion }, i) => {
    const alignment = alignments[i];
    if (alignment !== undefined) of.set(motion, alignment);
  });
  const dotted = Object.entries(whyMissing).map(([key, why]) => [`polarAlignment.${key}`, why]);
  return { of, whyMissing: Object.fromEntries(dotted) as WhyMissing };
}

/** No mount measures, and the one reason for it. */
export function unmeasured(reason: string): MountMeasures {
  const keys = [
    ...['uncorrected', 'periodicError', 'polarAlignment', 'backlash', 'response'],
    ...['loop.ra', 'loop.dec', 'seeingFloor', 'budget'],
  ];
  return {
    measures: {
      uncorrected: null,
      periodicError: null,
      polarAlignment: null,
      backlash: null,
      response: null,
      loop: { ra: null, dec: null },
      seeingFloor: null,
      budget: null,
      findings: [],
    },
    whyMissing: Object.fromEntries(keys.map((key) => [key, reason])),
    uncorrectedRaArcsec: null,
    uncorrectedDecArcsec: null,
  };
}
