import { MAD_TO_SIGMA } from '../statistics/robust-sigma';
import { quantileInPlace } from '../statistics/quantile';
import { type LevelFrames } from './whitened-least-squares';

/** Second differences of white noise have 1² + 2² + 1² times its variance. */
const SECOND_DIFFERENCE_FACTOR = Math.sqrt(6);
/** Frames count as neighbours when they lie at most so many cadences apart. */
const NEIGHBOURS = 1.5;
const FEWEST_DIFFERENCES = 20;

/**
 * White noise of one frame by robust second differences, 1.4826 · MAD(Δ²u) / √6: bumps do not move it, roughness of
 * the drive inflates it. O(n) on average.
 *
 * @param motion Without drift and lines; NaN where there is none.
 * @returns null with fewer than 20 second differences of neighbouring frames.
 */
export function secondDifferenceNoise(motion: Float64Array, frames: LevelFrames): number | null {
  const { timeSeconds, cadenceSeconds, restartFrames } = frames;
  const restarts = new Set(restartFrames);
  const sizes: number[] = [];
  for (let n = 2; n < motion.length; n++) {
    const difference = (motion[n] ?? NaN) - 2 * (motion[n - 1] ?? NaN) + (motion[n - 2] ?? NaN);
    const longest = NEIGHBOURS * cadenceSeconds;
    const near =
      (timeSeconds[n] ?? 0) - (timeSeconds[n - 1] ?? 0) < longest &&
      (timeSeconds[n - 1] ?? 0) - (timeSeconds[n - 2] ?? 0) < longest;
    if (near && Number.isFinite(difference) && !restarts.has(n) && !restarts.has(n - 1)) {
      sizes.push(Math.abs(difference));
    }
  }
  if (sizes.length < FEWEST_DIFFERENCES) return null;
  const middle = quantileInPlace(new Float64Array(sizes), 0.5);
  return (MAD_TO_SIGMA * middle) / SECOND_DIFFERENCE_FACTOR;
}

/**
 * Seeing floor (SCIENCE 2): the smaller of the noise by second differences and of the white part that the one-step
 * prediction error leaves.
 */
export function seeingFloor(
  motion: Float64Array,
  frames: LevelFrames,
  onePredictionNoise: number,
): number {
  const byDifferences = secondDifferenceNoise(motion, frames);
  return byDifferences === null ? onePredictionNoise : Math.min(byDifferences, onePredictionNoise);
}
