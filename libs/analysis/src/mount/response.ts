import { type Response } from '../analysis-document';
import { SIDEREAL_RATE_ARCSEC_PER_SECOND } from '../spectrum/gear-periods';
import { fitMotion, type MotionFit } from './motion-fit';
import { type FittedLine } from './motion-line';
import { type UsedResponse } from './mount-motion';
import { type LevelFrames } from './whitened-least-squares';

/** Response of one axis as the log tells it, arcsec on the sky per unit of correction. */
export interface EstimatedResponse {
  /** Mean of both directions. */
  readonly perUnit: number;
  readonly standardError: number;
  /** Half of (positive − negative). */
  readonly halfDifference: number;
  readonly halfDifferenceError: number;
  /** Of one direction. */
  readonly directionError: number;
  readonly fit: MotionFit;
}

/** What one unit of correction does by the rig, arcsec on the sky. */
export interface RigResponse {
  readonly perUnit: number;
  /** Whether it may do less: RA at an unknown declination, where `perUnit` is that of the celestial equator. */
  readonly isUpperLimit: boolean;
}

/** A relative standard error beyond this tells nothing. */
const LARGEST_RELATIVE_ERROR = 0.2;
const CONTRADICTION = 3;
/**
 * Seeing whose neighbouring frames correlate by 0.2 makes a response read low by a quarter at gains up to 0.7 and by 0.18
 * over the gain beyond (simulated nights of one and two hours), and leaves no trace that tells it from a weaker response.
 */
const LOW_BY_SEEING = { most: 0.24, timesGain: 0.18 };
const FEWEST_A_DIRECTION = 20;

/**
 * Response of one axis by a one-step prediction-error fit (`fitMotion`), both directions together with their difference.
 *
 * @param moves Corrections in their unit, towards +error positive; behind a gap of the gears what comes through it.
 * @param guessPerUnit Response within a factor of two or three, where the search begins.
 * @returns null with fewer than 20 corrections, or when the star does not follow them.
 */
export function estimateResponse(
  frames: LevelFrames,
  errorArcsec: Float64Array,
  moves: Float64Array,
  guessPerUnit: number,
): EstimatedResponse | null {
  const positive = moves.reduce((count, move) => count + (move > 0 ? 1 : 0), 0);
  const negative = moves.reduce((count, move) => count + (move < 0 ? 1 : 0), 0);
  if (positive + negative < FEWEST_A_DIRECTION) return null;
  const both = Math.min(positive, negative) >= FEWEST_A_DIRECTION;
  const commands = [summed(moves, (move) => move)];
  if (both) commands.push(summed(moves, Math.abs));
  const startLines = linesAtGuess(frames, errorArcsec, moves, guessPerUnit);
  const fit = fitMotion({ frames, series: errorArcsec, commands, startLines });
  const perUnit = fit.coefficients[0] ?? 0;
  const variance = fit.covariance[0] ?? 0;
  const differenceVariance = both ? (fit.covariance[3] ?? 0) : 0;
  const standardError = Math.sqrt(variance);
  if (!(perUnit > 0) || !(standardError < LARGEST_RELATIVE_ERROR * perUnit)) return null;
  return {
    perUnit,
    standardError,
    halfDifference: both ? (fit.coefficients[1] ?? 0) : 0,
    halfDifferenceError: Math.sqrt(differenceVariance),
    directionError: Math.sqrt(
      variance + differenceVariance + 2 * Math.abs(both ? (fit.covariance[1] ?? 0) : 0),
    ),
    fit,
  };
}

/**
 * Lines of the motion by a rough response. Without them the fit may begin in a false optimum, where corrections do nothing
 * and the mount hardly moves: a wrong response scales the lines, it does not move them.
 */
function linesAtGuess(
  frames: LevelFrames,
  errorArcsec: Float64Array,
  moves: Float64Array,
  guessPerUnit: number,
): readonly FittedLine[] {
  const moved = summed(moves, (move) => move * guessPerUnit);
  const series = errorArcsec.map((error, n) => error - (moved[n] ?? 0));
  return fitMotion({ frames, series, commands: [], startLines: [] }).lines;
}

function summed(moves: Float64Array, part: (move: number) => number): Float64Array {
  const sums = new Float64Array(moves.length);
  let sum = 0;
  for (let n = 1; n < moves.length; n++) {
    sum += part(moves[n - 1] ?? 0);
    sums[n] = sum;
  }
  return sums;
}

/**
 * What one unit of correction should do by the rig, arcsec on the sky: guide rate · 15.0411 ″/s · cos δ in RA. A
 * correction in arcsec should do what it says. Null where the rig or the declination is not told.
 */
export function expectedPerUnit(
  unit: 'ms' | 'arcsec',
  guideRateSidereal: number | undefined,
  skyPerAxisAngle: number | null,
): number | null {
  if (unit === 'arcsec') return 1;
  if (guideRateSidereal === undefined || skyPerAxisAngle === null) return null;
  return (guideRateSidereal * SIDEREAL_RATE_ARCSEC_PER_SECOND * skyPerAxisAngle) / 1000;
}

/** The rig's response for choosing; at an unknown declination that of the celestial equator, as an upper limit. */
export function rigResponse(
  unit: 'ms' | 'arcsec',
  guideRateSidereal: number | undefined,
  skyPerAxisAngle: number | null,
): RigResponse | null {
  const perUnit = expectedPerUnit(unit, guideRateSidereal, skyPerAxisAngle ?? 1);
  return perUnit === null
    ? null
    : { perUnit, isUpperLimit: unit === 'ms' && skyPerAxisAngle === null };
}

/**
 * The response that the uncorrected motion rests on: the rig's, unless the log contradicts it by more than three
 * standard errors; else the log's; else null. Seeing that is correlated from frame to frame, and gusts, make the log's
 * response read low. A reading below the rig's contradicts it only beyond `LOW_BY_SEEING` and one standard error; one
 * below an upper limit contradicts it as it stands, since the declination explains it as well. A difference between the directions that the log shows beyond three standard errors is
 * kept either way: it would add up to a drift.
 *
 * @param gainPerUnit Part of an error that a guider answers, in units of correction per arcsec; null where not known.
 */
export function chooseResponse(
  rig: RigResponse | null,
  estimated: EstimatedResponse | null,
  gainPerUnit: number | null,
): UsedResponse | null {
  const contradicted = rig !== null && contradicts(rig, estimated, gainPerUnit);
  const perUnit = rig === null || contradicted ? estimated?.perUnit : rig.perUnit;
  if (perUnit === undefined) return null;
  const from = perUnit === rig?.perUnit ? 'rig' : 'log';
  const unequal =
    estimated !== null &&
    Math.abs(estimated.halfDifference) > CONTRADICTION * estimated.halfDifferenceError;
  const half = unequal ? (estimated.halfDifference / estimated.perUnit) * perUnit : 0;
  return {
    positivePerUnit: perUnit + half,
    negativePerUnit: perUnit - half,
    relativeStandardError:
      from === 'rig' || estimated === null ? 0 : estimated.standardError / estimated.perUnit,
    from,
  };
}

function contradicts(
  rig: RigResponse,
  estimated: EstimatedResponse | null,
  gainPerUnit: number | null,
): boolean {
  if (estimated === null) return false;
  const allowed = CONTRADICTION * estimated.standardError;
  const excess = estimated.perUnit - rig.perUnit;
  if (rig.isUpperLimit || gainPerUnit === null) return Math.abs(excess) > allowed;
  const { most, timesGain } = LOW_BY_SEEING;
  const lowBySeeing = Math.min(most * rig.perUnit, timesGain / gainPerUnit);
  return excess > allowed || excess < -Math.max(allowed, lowBySeeing + estimated.standardError);
}

/** REPORT's Response: what the log tells, in arcsec per second of correction; corrections in arcsec have no seconds. */
export function describeResponse(
  unit: 'ms' | 'arcsec',
  expected: number | null,
  estimated: EstimatedResponse | null,
  used: UsedResponse | null,
): Response {
  const perSecond = (perUnit: number | null | undefined) =>
    unit === 'ms' && perUnit !== null && perUnit !== undefined ? 1000 * perUnit : null;
  const positive = estimated && estimated.perUnit + estimated.halfDifference;
  const negative = estimated && estimated.perUnit - estimated.halfDifference;
  return {
    positiveArcsecPerSecond: perSecond(positive),
    negativeArcsecPerSecond: perSecond(negative),
    standardError: perSecond(estimated?.directionError),
    expectedArcsecPerSecond: perSecond(expected),
    asymmetry:
      estimated && estimated.halfDifferenceError > 0
        ? (2 * estimated.halfDifference) / estimated.perUnit
        : null,
    from: used?.from ?? 'log',
  };
}
