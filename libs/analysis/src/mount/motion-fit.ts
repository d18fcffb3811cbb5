import { withoutBumps } from './bumps-and-steps';
import { innovationLines } from './innovation-lines';
import { likeliestWalk } from './likeliest-walk';
import { type FittedLine, lineColumns, lineFrom, newLine } from './motion-line';
import { skyTrend } from './sky-trend';
import {
  addScaled,
  type LevelFrames,
  whitenedLeastSquares,
  type WhitenedFit,
} from './whitened-least-squares';

export interface MotionFitInput {
  readonly frames: LevelFrames;
  /** Error or uncorrected motion, arcsec; NaN only where a frame is not used. */
  readonly series: Float64Array;
  /** What else the series may hold: summed corrections, in any unit. */
  readonly commands: readonly Float64Array[];
  /** Lines that are known already, to begin with; none: the fit finds all itself. */
  readonly startLines: readonly FittedLine[];
}

export interface MotionFit {
  /** As given, less the frames that were bumps; a bump that stays is a new start of the level. */
  readonly frames: LevelFrames;
  readonly walkPerSecond: number;
  /** White noise of one frame, arcsec. */
  readonly noise: number;
  /** One a command, and their covariance, row after row. */
  readonly coefficients: Float64Array;
  readonly covariance: Float64Array;
  /** Of the columns of `skyTrend`; the first is the mean drift, arcsec per second. */
  readonly trend: Float64Array;
  /** Of the mean drift. */
  readonly driftStandardError: number;
  /** Strongest first. */
  readonly lines: readonly FittedLine[];
  readonly innovations: Float64Array;
  readonly count: number;
}

const MOST_PASSES = 8;
const MOST_LINES = 12;
/** Two lines closer than this part of the resolution 1/span are one. */
const ONE_LINE = 0.8;
/** An amplitude below so many standard errors is no line. */
const CREDIBLE_ERRORS = 4;
const SLOWEST_TURNS = 1.2;
/** A frequency that moves less than this part of the resolution has settled. */
const SETTLED = 0.02;
/** Step in the logarithm of the walk for its slopes. */
const WALK_STEP = 0.5;
/** Where the likelihood is flat the walk is next to nothing and moves nothing: no larger variance is needed. */
const MOST_WALK_VARIANCE = 4;
/**
 * One-step prediction-error fit of the motion of one axis (SCIENCE 4):
 *
 *     e[n] = Σ sᵢ·cᵢ[n] + drift (`skyTrend`) + significant lines + wandering level + white noise,
 *
 * which in first differences reads Δe = s·Δc + lines + (1 − θB)ε. The lines are found in the innovations, strongest first,
 * and their periods refined together with all else; the wandering follows by likelihood. A correction is a function of
 * the errors before it, the innovation is not: so the fit is unbiased inside a closed loop, where regressing the motion
 * on the correction is not (REFERENCE 11). O(n log n).
 *
 * @see L. Ljung, System Identification: Theory for the User, 2nd ed. 1999, ch. 8 and sec. 13.4.
 */
export function fitMotion(input: MotionFitInput): MotionFit {
  const { series, commands } = input;
  const span = (input.frames.timeSeconds.at(-1) ?? 0) - (input.frames.timeSeconds[0] ?? 0);
  const trend = skyTrend(input.frames.timeSeconds);
  const known = [...commands, ...trend];
  let frames = input.frames;
  let lines: readonly FittedLine[] = input.startLines;
  for (let pass = 1; ; pass++) {
    const { columns, places } = designMatrix(frames, known, lines);
    // How the rest wanders hardly depends on the last digits of the frequencies: their columns are left out.
    const plainLines = lines.map((line) => newLine(line.frequency));
    const plain = designMatrix(frames, known, plainLines).columns;
    const walkPerSecond = likeliestWalk(frames, plain, series);
    const fit = whitenedLeastSquares(frames, walkPerSecond, columns, series);
    const refined = lines.map((line, i) => lineFrom(line, fit, places[i] ?? 0, span));
    const moved = refined.some(
      (line, i) => Math.abs(line.frequency - (lines[i]?.frequency ?? 0)) * span > SETTLED,
    );
    const unrefined = lines.some((line) => line.amplitude === 0);
    const found = pass < MOST_PASSES - 2 ? newLines(frames, fit, refined, span) : [];
    const credible = refined.filter((line) => isCredible(line, span));
    const calm = withoutBumps(
      input.frames,
      frames,
      fit.innovations,
      residualOf(series, columns, fit),
    );
    lines = [...credible, ...found];
    const settled =
      found.length === 0 && !moved && !unrefined && credible.length === refined.length;
    if ((settled && calm === frames) || pass >= MOST_PASSES) {
      const solve = (walk: number) => whitenedLeastSquares(frames, walk, columns, series);
      const sizes = { commands: commands.length, trendColumns: trend.length };
      return described(frames, walkPerSecond, fit, sizes, lines, solve);
    }
    frames = calm;
  }
}

/** A line that the rest of the fit has taken over, or one that went too slow to be told from drift, is given up. */
function isCredible(line: FittedLine, span: number): boolean {
  return (
    line.amplitude > CREDIBLE_ERRORS * line.standardError && line.frequency * span > SLOWEST_TURNS
  );
}

/** Commands and drift, then the lines; `places` tells where each line's columns begin. */
function designMatrix(
  frames: LevelFrames,
  known: readonly Float64Array[],
  lines: readonly FittedLine[],
) {
  const columns = [...known];
  const places = lines.map((line) => {
    const place = columns.length;
    columns.push(...lineColumns(frames.timeSeconds, line));
    return place;
  });
  return { columns, places };
}

function newLines(
  frames: LevelFrames,
  fit: WhitenedFit,
  known: readonly FittedLine[],
  span: number,
): FittedLine[] {
  const isNew = (frequency: number) =>
    known.every((line) => Math.abs(line.frequency - frequency) * span > ONE_LINE);
  return innovationLines(frames, fit.innovations)
    .filter(isNew)
    .slice(0, MOST_LINES - known.length)
    .map(newLine);
}

function residualOf(
  series: Float64Array,
  columns: readonly Float64Array[],
  fit: WhitenedFit,
): Float64Array {
  const residual = series.slice();
  columns.forEach((column, j) => {
    addScaled(residual, column, -(fit.coefficients[j] ?? 0));
  });
  return residual;
}

function described(
  frames: LevelFrames,
  walkPerSecond: number,
  fit: WhitenedFit,
  { commands, trendColumns }: { readonly commands: number; readonly trendColumns: number },
  lines: readonly FittedLine[],
  solve: (walkPerSecond: number) => WhitenedFit,
): MotionFit {
  const size = fit.coefficients.length;
  return {
    frames,
    walkPerSecond,
    noise: fit.noise,
    coefficients: fit.coefficients.slice(0, commands),
    covariance: commandCovariance(walkPerSecond, fit, commands, solve),
    trend: fit.coefficients.slice(commands, commands + trendColumns),
    driftStandardError: Math.sqrt(fit.covariance[commands * size + commands] ?? 0),
    lines: [...lines].sort((a, b) => b.amplitude - a.amplitude),
    innovations: fit.innovations,
    count: fit.count,
  };
}

/**
 * Covariance of the commands' coefficients with the walk's own uncertainty in it: on a rough drive the two hang together.
 * The walk's logarithm has the variance 2 / curvature of the cost; it moves each coefficient along its slope.
 */
function commandCovariance(
  walkPerSecond: number,
  fit: WhitenedFit,
  commands: number,
  solve: (walkPerSecond: number) => WhitenedFit,
): Float64Array {
  const size = fit.coefficients.length;
  const covariance = new Float64Array(commands * commands);
  if (commands === 0) return covariance;
  const lower = solve(walkPerSecond * Math.exp(-WALK_STEP));
  const upper = solve(walkPerSecond * Math.exp(WALK_STEP));
  const curvature = (lower.cost - 2 * fit.cost + upper.cost) / WALK_STEP ** 2;
  const variance = curvature > 0 ? Math.min(2 / curvature, MOST_WALK_VARIANCE) : MOST_WALK_VARIANCE;
  const slope = (i: number) =>
    ((upper.coefficients[i] ?? 0) - (lower.coefficients[i] ?? 0)) / (2 * WALK_STEP);
  for (let i = 0; i < commands; i++) {
    for (let j = 0; j < commands; j++) {
      covariance[i * commands + j] =
        (fit.covariance[i * size + j] ?? 0) + variance * slope(i) * slope(j);
    }
  }
  return covariance;
}
