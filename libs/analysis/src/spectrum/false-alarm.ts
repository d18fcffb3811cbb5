import { gammaln } from 'simple-statistics';
import { squaresAboutMean } from '../statistics/deviation';

/**
 * Duration of a sampling as the false-alarm probability counts it: sqrt(4π var t).
 */
export function effectiveDuration(t: Float64Array): number {
  return Math.sqrt((4 * Math.PI * squaresAboutMean(t)) / t.length);
}

/**
 * Probability that the highest of all peaks up to a frequency reaches a power by chance, for white noise, as an
 * upper bound that is close for small values:
 *
 *     s = (1 − z)^((N − 3)/2),   τ = γ W (1 − z)^((N − 4)/2) sqrt((N − 1) z / 2),   FAP = 1 − (1 − s) exp(−τ)
 *
 * @param power z between 0 and 1: the part of the variance that the line explains.
 * @param count N, the number of samples (more than 4).
 * @param trials W, highest frequency × effective duration.
 * @see R. V. Baluev, Mon. Not. R. Astron. Soc. 385 (2008) 1279, eqs 5 and 6.
 */
export function falseAlarmProbability(power: number, count: number, trials: number): number {
  const logLeft = Math.log1p(-Math.min(power, 1));
  const gamma =
    Math.sqrt(2 / (count - 1)) * Math.exp(gammaln((count - 1) / 2) - gammaln((count - 2) / 2));
  const single = Math.exp(((count - 3) / 2) * logLeft);
  const tau =
    gamma * trials * Math.exp(((count - 4) / 2) * logLeft) * Math.sqrt(((count - 1) * power) / 2);
  // 1 − (1 − s) e^−τ without losing small values to the rounding of 1.
  return -Math.expm1(Math.log1p(-Math.min(single, 1 - Number.EPSILON)) - tau);
}

/**
 * The same for a line that stands against the noise around it, whose level is known from so many bins: an
 * exponential power over a level estimated from m of them is distributed as with N = 2m + 3 samples.
 *
 * @param overNoise Power over the local noise level.
 * @param bins m, the number of independent bins that the level's uncertainty is worth.
 */
export function localFalseAlarmProbability(
  overNoise: number,
  bins: number,
  trials: number,
): number {
  return falseAlarmProbability(overNoise / (bins + overNoise), 2 * bins + 3, trials);
}

/** W of `falseAlarmProbability` for a sampling and its highest frequency. */
export function trialsUpTo(t: Float64Array, highest: number): number {
  return Math.max(1, highest * effectiveDuration(t));
}
