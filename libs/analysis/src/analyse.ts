import { type AnalysisDocument, type Reading, type Run } from './analysis-document';
import { analyseRun, type RunSetting } from './analyse-run';
import { type GuidedRun, listedRun, runFacts, whyNotAnalysed } from './listed-run';
import { measureMount, unmeasured } from './measure-mount';
import { describeOptics } from './optics/describe-optics';
import { type RigDescription } from './rig-description';
import { cutRuns, type FrameRange } from './series/cut-runs';
import { type LogFrames } from './series/log-frames';
import { prepareRun } from './series/prepare-run';
import { type RunSeries } from './series/run-series';
import { type ByHandRange } from './series/set-aside';
import { type AmplitudeCurve } from './spectrum/amplitude-curve';

/** Length of a sub when neither the caller nor the rig tells one: five minutes. Common practice. */
export const USUAL_SUB_SECONDS = 300;

const NO_SCALE =
  "The errors are in guide pixels, and the rig's description does not tell the guide scale (focal length and pixel size).";

/** A stretch of one run that the user leaves out, in seconds since the run's first frame. */
export interface RunByHand extends ByHandRange {
  /** `Run.index`: 1 for the first. */
  readonly run: number;
}

export interface AnalysisOptions {
  /** Length of one sub; wins over the rig's. */
  readonly subSeconds?: number | undefined;
  readonly byHand?: readonly RunByHand[] | undefined;
  /** Told the share of the work that is done, from 0 to 1. */
  readonly onProgress?: ((share: number) => void) | undefined;
}

/** A run's frames beside the document: what is kept to draw them. */
export interface AnalysedSeries {
  /** null when the log is in guide pixels and no scale is known. */
  readonly series: RunSeries | null;
  /** A value a frame of the run; null when not known. */
  readonly uncorrectedRaArcsec: Float64Array | null;
  readonly uncorrectedDecArcsec: Float64Array | null;
  readonly spectrumCurve: AmplitudeCurve | null;
}

export interface LogAnalysis {
  readonly document: AnalysisDocument;
  /** One a run of the document, in its order. */
  readonly runs: readonly AnalysedSeries[];
}

/** Everything found in one log, as the document of REPORT. See `analyseLogWithSeries`. */
export function analyseLog(
  frames: LogFrames,
  reading: Reading,
  rig: RigDescription,
  options: AnalysisOptions,
): AnalysisDocument {
  return analyseLogWithSeries(frames, reading, rig, options).document;
}

/**
 * Everything found in one log, and the frames as they were analysed. A run that cannot be analysed is listed with the
 * reason; the rest is analysed all the same. No number of the document is NaN. O(n log n).
 *
 * @param frames The log as read.
 * @param reading What reading it found, taken over as it is.
 */
export function analyseLogWithSeries(
  frames: LogFrames,
  reading: Reading,
  rig: RigDescription,
  options: AnalysisOptions,
): LogAnalysis {
  const optics = describeOptics(rig);
  const subSeconds = options.subSeconds ?? rig.subSeconds ?? USUAL_SUB_SECONDS;
  const setting: RunSetting = { rig, optics, subSeconds };
  const steps = cutRuns(frames).map((range, i) => {
    const step = examine(frames, range, i + 1, setting, options.byHand ?? []);
    options.onProgress?.(range.to / frames.count);
    return step;
  });
  const analysed = steps.filter((step) => 'guided' in step);
  const mounts = measureMount(
    analysed.map(({ guided, series }) => ({ run: guided, series })),
    rig,
  );
  const whole = steps.map((step) => {
    if (!('guided' in step)) return { run: step.listed, beside: { ...NOTHING_BESIDE, ...step } };
    const mount = mounts[analysed.indexOf(step)] ?? unmeasured('The run was not measured.');
    const whyMissing = { ...step.guided.whyMissing, ...mount.whyMissing };
    return {
      run: { ...step.guided, ...mount.measures, whyMissing },
      beside: { ...mount, series: step.series, spectrumCurve: step.curve },
    };
  });
  return {
    document: {
      schema: 'stillpier-analysis/1',
      reading,
      optics,
      runs: whole.map(({ run }) => run),
    },
    runs: whole.map(({ beside }) => ({
      series: beside.series,
      uncorrectedRaArcsec: beside.uncorrectedRaArcsec,
      uncorrectedDecArcsec: beside.uncorrectedDecArcsec,
      spectrumCurve: beside.spectrumCurve,
    })),
  };
}

const NOTHING_BESIDE = {
  uncorrectedRaArcsec: null,
  uncorrectedDecArcsec: null,
  spectrumCurve: null,
};

type Examined =
  | { readonly listed: Run; readonly series: RunSeries | null }
  | { readonly guided: GuidedRun; readonly series: RunSeries; readonly curve: AmplitudeCurve };

/** One run, listed with the reason or analysed but for the mount. */
function examine(
  frames: LogFrames,
  range: FrameRange,
  index: number,
  setting: RunSetting,
  byHand: readonly RunByHand[],
): Examined {
  const guideScale = setting.optics.guideScaleArcsecPerPx;
  const inArcsec = frames.errorUnit === 'arcsec';
  const series = prepareRun(
    frames,
    range,
    // Frames are set aside by shape in any unit: a run that cannot be analysed in arcseconds is still listed in full.
    inArcsec ? 1 : (guideScale ?? 1),
    byHand.filter(({ run }) => run === index),
  );
  const facts = runFacts(index, series);
  if (!inArcsec && guideScale === null) return { listed: listedRun(facts, NO_SCALE), series: null };
  const reason = whyNotAnalysed(facts);
  if (reason !== null) return { listed: listedRun(facts, reason), series };
  const { run, curve } = analyseRun(facts, series, setting);
  return { guided: run, series, curve };
}
