import { type Loop, type Response, type Uncorrected } from '../analysis-document';
import { type RunSeries } from '../series/run-series';
import { bestGain } from './best-gain';
import { type CorrectionSign } from './correction-sign';
import { withoutJumps } from './dither-offsets';
import { describeLoop, loopGain } from './loop';
import { fitMotion, type MotionFit } from './motion-fit';
import { type FittedLine, sineInto } from './motion-line';
import { summedBefore } from './motion-frames';
import { type AxisMotion } from './mount-motion';
import { fitPeriodicError, type WormFit } from './periodic-error';
import { playInto } from './play';
import {
  chooseResponse,
  describeResponse,
  estimateResponse,
  type EstimatedResponse,
} from './response';
import { secondDifferenceNoise, seeingFloor } from './seeing-floor';
import { describeUncorrected, displacements, uncorrectedMotion } from './uncorrected';
import { type LevelFrames } from './whitened-least-squares';

export interface AxisInput {
  readonly axis: 'ra' | 'dec';
  readonly run: RunSeries;
  readonly frames: LevelFrames;
  readonly errorArcsec: Float64Array;
  readonly correction: Float64Array;
  readonly sign: CorrectionSign | null;
  readonly guideRateSidereal: number | undefined;
  /** What one unit of correction should do, arcsec on the sky; null where nothing tells. */
  readonly expected: number | null;
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
  /** By keys relative to the axis: `response`, `uncorrected`, `loop.gain`, … */
  readonly why: Record<string, string>;
}

/** Guiders answer errors with gains around this: the response that makes it so is a fair guess where nothing else is known. */
const USUAL_GAIN = 0.6;

/** All measures of one axis that rest on its corrections. O(n log n). */
export function measureAxis(input: AxisInput): MeasuredAxis {
  const { run, errorArcsec, correction, sign, expected } = input;
  const moves = correction.map((given) => given * (sign?.sign ?? 1));
  const moved = input.playWidth > 0 ? throughPlay(moves, input.playWidth) : moves;
  const corrected = correction.some((given) => given !== 0);
  const answered = loopGain(loopFrames(input), moves, 0);
  const guess = expected ?? (answered === null ? null : USUAL_GAIN / answered.gain);
  const estimated =
    sign !== null && guess !== null
      ? estimateResponse(input.frames, errorArcsec, moved, guess)
      : null;
  const used = chooseResponse(expected, estimated, answered?.gain ?? null);
  const known = !corrected || (sign !== null && used !== null);
  const response = describeResponse(run.correctionUnit, expected, estimated, used);
  if (!known) return withoutMotion(input, response, estimated);

  const displaced = (each: Float64Array) =>
    used ? displacements(each, used) : new Float64Array(run.count);
  const displacement = displaced(moved);
  const command = displaced(moves);
  const jumpy = uncorrectedMotion(errorArcsec, displacement);
  const fit = fitMotion({
    frames: input.frames,
    series: jumpy,
    commands: [],
    startLines: estimated?.fit.lines ?? [],
  });
  const worm = input.worm && fitPeriodicError(fit, jumpy, input.worm.periodSeconds);
  const model = smoothModel(
    run.timeSeconds,
    fit,
    worm !== null && 'harmonics' in worm ? worm : null,
  );
  const motion = withoutJumps(jumpy, model.smooth, fit.frames, fit.walkPerSecond);
  const rest = motion.map((value, n) => value - (model.smooth[n] ?? 0));
  const floor = seeingFloor(rest, input.frames, fit.noise);
  const gain = corrected
    ? loopGain(loopFrames(input), command, used?.relativeStandardError ?? 0)
    : null;
  const step = fit.noise * Math.sqrt(fit.walkPerSecond * run.cadenceSeconds);
  return {
    motion: {
      sign: sign?.sign ?? null,
      signFrom: sign?.from ?? null,
      responseUsed: used,
      commandArcsec: command,
      displacementArcsec: displacement,
      uncorrectedArcsec: motion,
      smoothArcsec: model.smooth,
      periodicErrorArcsec: model.periodic,
      lines: model.lines.map(lineOf),
      noiseArcsec: floor,
      stepArcsec: step,
    },
    response,
    uncorrected: describeUncorrected({
      motion,
      smooth: model.smooth,
      setAside: run.setAside,
      driftPerSecond: model.driftPerSecond,
      driftStandardError: driftError(
        model.driftStandardError,
        displacement,
        input,
        estimated,
        used?.from,
      ),
      floorArcsec: floor,
    }),
    loop: describeLoop(
      loopFrames(input),
      gain,
      bestGain({
        noise: floor,
        step,
        driftPerFrame: model.driftPerSecond * run.cadenceSeconds,
        lines: model.lines.map((line) => ({
          amplitude: line.amplitude,
          periodFrames: 1 / (line.frequency * run.cadenceSeconds),
        })),
      }),
    ),
    floorArcsec: floor,
    worm,
    wormMotion: rest.map((value, n) => value + (model.periodic[n] ?? 0)),
    why: reasons(input, estimated, corrected),
  };
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
  const why = missingResponse(input);
  const floor = estimated?.fit.noise ?? null;
  const reason = reasons(input, estimated, true);
  return {
    motion: {
      sign: input.sign?.sign ?? null,
      signFrom: input.sign?.from ?? null,
      responseUsed: null,
      commandArcsec: null,
      displacementArcsec: null,
      uncorrectedArcsec: null,
      smoothArcsec: null,
      periodicErrorArcsec: null,
      lines: [],
      noiseArcsec: floor,
      stepArcsec: null,
    },
    response,
    uncorrected: null,
    loop: describeLoop(loopFrames(input), null, null),
    floorArcsec: floor,
    worm: input.worm && { why },
    wormMotion: null,
    why: {
      ...reason,
      uncorrected: why,
      'loop.gain': why,
      'loop.bestGain': why,
      ...(floor === null ? { seeingFloor: boundSentence(input.errorArcsec, input.frames) } : {}),
    },
  };
}

/** A guided error whose corrections are not known gives an upper bound only: at gain 0.7 it reads 45 % too high. */
export function boundSentence(errorArcsec: Float64Array, frames: LevelFrames): string {
  const bound = secondDifferenceNoise(errorArcsec, frames);
  if (bound === null) return 'Too few neighbouring frames to tell the seeing floor.';
  return `Without known corrections only an upper bound can be told: at most ${bound.toFixed(2)} arcsec.`;
}

function missingResponse({ sign, axis, guideRateSidereal }: AxisInput): string {
  const name = axis === 'ra' ? 'RA' : 'Dec';
  if (sign === null) {
    return `The log does not tell clearly whether a ${name} correction of +1 moves the star towards +error, and no column map says so.`;
  }
  const rig =
    guideRateSidereal === undefined
      ? 'the rig tells no guide rate'
      : 'the declination is not known';
  return `The log does not tell the ${name} response well enough, and ${rig}.`;
}

function reasons(
  input: AxisInput,
  estimated: EstimatedResponse | null,
  corrected: boolean,
): Record<string, string> {
  const name = input.axis === 'ra' ? 'RA' : 'Dec';
  const why: Record<string, string> = {};
  if (!corrected) {
    why['response'] = `The log has no ${name} corrections other than zero.`;
    why['loop.gain'] = why['response'];
  } else if (estimated === null) {
    why['response'] = `The corrections of this run do not tell the ${name} response within 20 %.`;
  } else if (input.run.correctionUnit === 'arcsec') {
    why['response'] =
      'Corrections are logged in arcsec: a response per second of correction cannot be told.';
  }
  return why;
}

function loopFrames({ run, errorArcsec }: AxisInput) {
  const { setAside, timeSeconds, cadenceSeconds } = run;
  return { errorArcsec, setAside, timeSeconds, cadenceSeconds };
}

/** Drift and lines at every frame: the worm's fit where there is one, else the motion's own. */
function smoothModel(timeSeconds: Float64Array, fit: MotionFit, worm: WormFit | null) {
  const { driftPerSecond, driftStandardError } = worm ?? fit;
  const others = worm?.otherLines ?? fit.lines;
  const smooth = timeSeconds.map((time) => driftPerSecond * time);
  const periodic = new Float64Array(timeSeconds.length);
  for (const line of others) sineInto(timeSeconds, line, smooth);
  for (const line of worm?.harmonics ?? []) sineInto(timeSeconds, line, periodic);
  periodic.forEach((value, n) => {
    smooth[n] = (smooth[n] ?? 0) + value;
  });
  const lines = [...others, ...(worm?.harmonics ?? [])].sort((a, b) => b.amplitude - a.amplitude);
  return { smooth, periodic, lines, driftPerSecond, driftStandardError };
}

function lineOf({ frequency, amplitude, cosine, sine }: FittedLine) {
  return {
    periodSeconds: 1 / frequency,
    amplitudeArcsec: amplitude,
    phaseRadians: Math.atan2(-sine, cosine),
  };
}

/** The response's own error moves the drift with all that was corrected. */
function driftError(
  fitted: number,
  displacement: Float64Array,
  { run }: AxisInput,
  estimated: EstimatedResponse | null,
  from: 'rig' | 'log' | undefined,
): number {
  if (estimated === null || from !== 'log') return fitted;
  const span = (run.timeSeconds.at(-1) ?? 0) - (run.timeSeconds[0] ?? 0);
  const [net, all] = displacement.reduce<[number, number]>(
    ([sum, size], move) => [sum + move, size + Math.abs(move)],
    [0, 0],
  );
  return Math.hypot(
    fitted,
    (net / span) * (estimated.standardError / estimated.perUnit),
    (all / span) * (estimated.halfDifferenceError / estimated.perUnit),
  );
}
