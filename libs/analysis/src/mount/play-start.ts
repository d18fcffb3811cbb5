import { LevelWhitening } from './level-whitening';
import { orthonormal, squaresWithout } from './orthonormal';
import { playInto } from './play';
import { costOf, type LevelFrames } from './whitened-least-squares';

/** The start inside the gap is not known: it is tried at these parts of the width. */
export const START_LAGS = [0, 0.5, 1];
/** Widths that are tried beside none: parts of the way that the driver goes. */
const WIDTHS = [0.003, 0.006, 0.012, 0.025, 0.05, 0.08, 0.12, 0.2, 0.3, 0.45, 0.65, 0.9];
/** Variances of the level's step a frame over the noise's. */
const WALKS_PER_FRAME = [1e-6, 1e-4, 1e-3, 0.01, 0.1, 1];

/**
 * Where the scan for a gap may begin: the likeliest of a few widths and a few wanderings of the level together, with
 * the star following its driver by the whole. Either alone leads astray: without the gap the star seems to wander, and a
 * level that wanders freely hides a gap. O(n) a pair.
 */
export function playStart(
  frames: LevelFrames,
  trend: readonly Float64Array[],
  error: Float64Array,
  driver: Float64Array,
): number {
  const way = wayOf(driver);
  const rest = new Float64Array(error.length);
  const white = new Float64Array(error.length);
  const levels = WALKS_PER_FRAME.map((walkPerFrame) => {
    const walkPerSecond = walkPerFrame / frames.cadenceSeconds;
    const whitening = new LevelWhitening({ ...frames, walkPerSecond });
    const columns = trend.map((each) => whitening.whiten(each, new Float64Array(each.length)));
    return { whitening, columns: orthonormal(columns) };
  });
  let best = 0;
  let bestCost = Infinity;
  for (const part of [0, ...WIDTHS]) {
    for (const lag of part === 0 ? [0] : START_LAGS) {
      playInto(driver, part * way, lag * part * way, rest);
      for (let n = 0; n < rest.length; n++) rest[n] = (error[n] ?? NaN) - (rest[n] ?? NaN);
      for (const { whitening, columns } of levels) {
        const squares = squaresWithout(columns, whitening.whiten(rest, white));
        const cost = costOf(whitening, squares);
        if (cost < bestCost) [best, bestCost] = [part * way, cost];
      }
    }
  }
  return best;
}

/** How far apart the ends of a driver's way lie. */
export function wayOf(driver: Float64Array): number {
  let low = Infinity;
  let high = -Infinity;
  for (const place of driver) {
    low = Math.min(low, place);
    high = Math.max(high, place);
  }
  return high - low;
}
