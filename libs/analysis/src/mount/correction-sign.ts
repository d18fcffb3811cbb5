import { type LevelFrames } from './whitened-least-squares';

export interface CorrectionSign {
  /** +1: a logged correction of +1 moves the star towards +error; −1: towards −error. */
  readonly sign: 1 | -1;
  readonly from: 'map' | 'log';
}

const FEWEST_CORRECTIONS = 10;
/** Standard errors by which the slope must leave zero. */
const CLEAR_SLOPE = 4;

/**
 * The sign of a log's corrections, from the slope of e[n+1] − e[n] on the correction of frame n. Inside a closed loop the
 * slope's size is biased (REFERENCE 11: by the factor 1/k + 1/2 under seeing), its sign is not. O(n).
 *
 * @returns null without a clear slope.
 */
export function correctionSignFromLog(
  frames: LevelFrames,
  errorArcsec: Float64Array,
  correction: Float64Array,
): 1 | -1 | null {
  const restarts = new Set(frames.restartFrames);
  let count = 0;
  let [squares, products, motions] = [0, 0, 0];
  for (let n = 0; n + 1 < errorArcsec.length; n++) {
    const given = correction[n] ?? 0;
    if (given === 0 || frames.used[n] !== 1 || frames.used[n + 1] !== 1 || restarts.has(n + 1)) {
      continue;
    }
    const motion = (errorArcsec[n + 1] ?? 0) - (errorArcsec[n] ?? 0);
    count++;
    squares += given * given;
    products += given * motion;
    motions += motion * motion;
  }
  if (count < FEWEST_CORRECTIONS || squares === 0) return null;
  const slope = products / squares;
  const left = Math.max(0, motions - slope * products);
  const standardError = Math.sqrt(left / (count - 1) / squares);
  if (Math.abs(slope) <= CLEAR_SLOPE * standardError) return null;
  return slope > 0 ? 1 : -1;
}
