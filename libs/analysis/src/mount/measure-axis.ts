import { type Loop, type Response, type Uncorrected } from '../analysis-document';
import { type RunSeries } from '../series/run-series';
import { type AxisFacts, axisReasons, motionReason } from './axis-reasons';
import { bestGain } from './best-gain';
import { withoutJumps } from './dither-offsets';
import { describeLoop, loopGain } from './loop';
import { fitMotion } from './motion-fit';
import { summedBefore } from './motion-frames';
import { type FittedLine } from './motion-line';
import { type AxisMotion, NO_MOTION } from './mount-motion';
import { fitPeriodicError, type WormFit } from './periodic-error';
import { playInto } from './play';
import {
  chooseResponse,
  describeResponse,
  estimateResponse,
  type EstimatedResponse,
  expectedPerUnit,
  rigResponse,
} from './response';
import { seeingFloor } from './seeing-floor';
import { type SmoothMotion, smoothMotion } from './smooth-motion';
import { describeUncorrected, displacements, driftError, uncorrectedMotion } from './uncorrected';

export interface AxisInput extends AxisFacts {
  readonly run: RunSeries;
  /** Of the axis to the sky: cos(declination) in RA, 1 in Dec; null where the declination is not known. */
  readonly skyPerAxisAngle: number | null;
  /** Dec only: the gap in the commands, in units of the correction; 0 for none. */
  readonly playWidth: number;
  /** RA only: look for a periodic error; the rig's worm period or null. */
  readonly worm: { readonly periodSeconds: number | null } | null;
}

export interface MeasuredAxis {
  readonly motion: AxisMotion;
  readonly response: Response;
  readonly uncorrected: Uncorrected | null;
  readonly loop: Loop;
  readonly floorArcsec: number | null;
  readonly worm: WormFit | { readonly why: string } | null;
  /** Uncorrected motion less drift and the lines that are not the worm's; for the folded curve. */
  readonly wormMotion: Float64Array | null;
  /** By dotted keys of the run. */
  readonly why: Record<string, string>;
}

/** Guiders answer errors with gains around this: the response that makes it so is a fair guess where nothing else is known. */
const USUAL_GAIN = 0.6;

/** All measures of one axis that rest on its corrections. O(n log n). */
export function measureAxis(input: AxisInput): MeasuredAxis {
  const { run, errorArcsec, correction, sign, guideRateSidereal, skyPerAxisAngle } = input;
  const expected = expectedPerUnit(run.correctionUnit, guideRateSidereal, skyPerAxisAngle);
  const byRig = rigResponse(run.correctionUnit, guideRateSidereal, skyPerAxisAngle);
  const moves = (correction ?? new Float64Array(run.count)).map(
    (given) => given * (sign?.sign ?? 1),
  );
  const moved = input.playWidth > 0 ? throughPlay(moves, input.playWidth) : moves;
  const answered = loopGain(loopFrames(input), moves, 0);
  const guess = byRig?.perUnit ?? (answered === null ? null : USUAL_GAIN / answered.gain);
  const estimated =
    sign !== null && guess !== null
      ? estimateResponse(input.frames, errorArcsec, moved, guess)
      : null;
  const used = chooseResponse(byRig, estimated, answered?.gain ?? null);
  const response = describeResponse(run.correctionUnit, expected, estimated, used);
  const still = correction?.every((given) => given === 0) ?? false;
  if (correction === null || (!still && (sign === null || used === null))) {
    return withoutMotion(input, response, estimated);
  }
  const displaced = (each: Float64Array) =>
    used ? displacements(each, used) : new Float64Array(run.count);
  const motion: AxisMotion = {
    ...NO_MOTION,
    sign: sign?.sign ?? null,
    signFrom: sign?.from ?? null,
    responseUsed: used,
    commandArcsec: displaced(moves),
    displacementArcsec: displaced(moved),
  };
  return withMotion(input, motion, response, estimated);
}

/** What of each correction comes through the gap; the star stands in its middle at the start. */
function throughPlay(moves: Float64Array, width: number): Float64Array {
  const driver = summedBefore(moves);
  const driven = playInto(driver, width, width / 2, new Float64Array(driver.length));
  return moves.map((_, n) => (driven[n + 1] ?? driven[n] ?? 0) - (driven[n] ?? 0));
}

/** No uncorrected motion: what the error alone tells. */
function withoutMotion(
  input: AxisInput,
  response: Response,
  estimated: EstimatedResponse | null,
): MeasuredAxis {
  const floorArcsec = estimated?.fit.noise ?? null;
  const loop = describeLoop(loopFrames(input), null, null);
  const isResponseTold = estimated !== null;
  const parts = { response, uncorrected: null, loop, floorArcsec, isResponseTold };
  return {
    ...parts,
    motion: {
      ...NO_MOTION,
      sign: input.sign?.sign ?? null,
      signFrom: input.sign?.from ?? null,
      noiseArcsec: floorArcsec,
    },
    worm: input.worm && { why: motionReason(input, isResponseTold) },
    wormMotion: null,
    why: axisReasons(input, parts),
  };
}

/** @param known The axis' motion with its displacements. */
function withMotion(
  input: AxisInput,
  known: AxisMotion,
  response: Response,
  estimated: EstimatedResponse | null,
): MeasuredAxis {
  const { run, frames, errorArcsec } = input;
  const displacement = known.displacementArcsec ?? new Float64Array(run.count);
  const series = uncorrectedMotion(errorArcsec, displacement);
  const startLines = estimated?.fit.lines ?? [];
  const fit = fitMotion({ frames, series, commands: [], startLines });
  const worm = input.worm && fitPeriodicError(fit, series, input.worm.periodSeconds);
  const wormFit = worm !== null && 'harmonics' in worm ? worm : null;
  const model = smoothMotion(run.timeSeconds, fit, wormFit);
  const motion = withoutJumps(series, model.smooth, fit.frames, fit.walkPerSecond);
  const rest = motion.map((value, n) => value - (model.smooth[n] ?? 0));
  const floorArcsec = seeingFloor(rest, frames, fit.noise);
  const stepArcsec = fit.noise * Math.sqrt(fit.walkPerSecond * run.cadenceSeconds);
  const uncorrected = describeUncorrected({
    motion,
    smooth: model.smooth,
    setAside: run.setAside,
    driftPerSecond: model.driftPerSecond,
    driftStandardError: driftError(model.driftStandardError, displacement, run.timeSeconds, {
      used: known.responseUsed,
      estimated,
    }),
    floorArcsec,
  });
  const loop = axisLoop(input, known, model, floorArcsec, stepArcsec);
  const parts = { response, uncorrected, loop, floorArcsec, isResponseTold: estimated !== null };
  return {
    ...parts,
    motion: {
      ...known,
      uncorrectedArcsec: motion,
      smoothArcsec: model.smooth,
      driftArcsec: model.drift,
      periodicErrorArcsec: model.periodic,
      lines: model.lines.map(lineOf),
      noiseArcsec: floorArcsec,
      stepArcsec,
    },
    worm,
    wormMotion: rest.map((value, n) => value + (model.periodic[n] ?? 0)),
    why: axisReasons(input, parts),
  };
}

function axisLoop(
  input: AxisInput,
  { commandArcsec, responseUsed }: AxisMotion,
  model: SmoothMotion,
  noise: number,
  step: number,
): Loop {
  const { cadenceSeconds } = input.run;
  const responseError = responseUsed?.relativeStandardError ?? 0;
  const gain = commandArcsec && loopGain(loopFrames(input), commandArcsec, responseError);
  const lines = model.lines.map(({ amplitude, frequency }) => ({
    amplitude,
    periodFrames: 1 / (frequency * cadenceSeconds),
  }));
  const driftPerFrame = model.driftPerSecond * cadenceSeconds;
  return describeLoop(loopFrames(input), gain, bestGain({ noise, step, driftPerFrame, lines }));
}

function loopFrames({ run, errorArcsec }: AxisInput) {
  const { setAside, timeSeconds, cadenceSeconds } = run;
  return { errorArcsec, setAside, timeSeconds, cadenceSeconds };
}

function lineOf({ frequency, amplitude, cosine, sine }: FittedLine) {
  return {
    periodSeconds: 1 / frequency,
    amplitudeArcsec: amplitude,
    phaseRadians: Math.atan2(-sine, cosine),
  };
}
