import { type Run, type WhyMissing } from './analysis-document';
import { type GuidedRun } from './listed-run';
import { type RigDescription } from './rig-description';
import { type RunSeries } from './series/run-series';

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

const NOT_COMPUTED = 'This is not computed by this version.';

/** The mount measures and findings of all analysed runs of a log together: polar alignment needs them side by side. */
export function measureMount(runs: readonly AnalysedRun[], _rig: RigDescription): MountMeasures[] {
  return runs.map(() => unmeasured(NOT_COMPUTED));
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
