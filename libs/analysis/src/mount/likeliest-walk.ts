import { goldenSection } from './golden-section';
import { type LevelFrames, whitenedCost } from './whitened-least-squares';

/** Natural logarithms of the walk's variance a frame over the noise's: from a level that stands still to one that is all there is. */
const LOWEST = Math.log(1e-8);
const HIGHEST = Math.log(1e4);
const COARSE_TRIALS = 9;
const COARSE_STEP = (HIGHEST - LOWEST) / COARSE_TRIALS;
/** A third in the logarithm of a variance ratio changes no weight that matters. */
const FINE_STEP = 0.35;
/** So many frames tell the ratio well enough: on longer nights the middle of the run speaks for it. */
const ENOUGH_FRAMES = 2048;

/**
 * How fast the level under a series wanders against its white noise, by maximum likelihood of the local-level model with
 * all columns fitted anew at every trial. Fitting them once would not do: inside a closed loop 'a still level and
 * corrections that do nothing' is a false optimum of its own. A coarse scan, then golden section; trials rest on
 * at most 2048 frames.
 *
 * @param series NaN only where the frame is not used.
 * @returns `walkPerSecond` of `LevelWhitening`.
 * @see A. C. Harvey, Forecasting, Structural Time Series Models and the Kalman Filter (1989), sec. 4.1 and 4.2.
 */
export function likeliestWalk(
  frames: LevelFrames,
  columns: readonly Float64Array[],
  series: Float64Array,
): number {
  const first = Math.max(0, Math.floor((series.length - ENOUGH_FRAMES) / 2));
  const last = Math.min(series.length, first + ENOUGH_FRAMES);
  const part = (values: Float64Array) => values.subarray(first, last);
  const window: LevelFrames = {
    timeSeconds: part(frames.timeSeconds),
    cadenceSeconds: frames.cadenceSeconds,
    used: frames.used.subarray(first, last),
    restartFrames: frames.restartFrames.filter((n) => n >= first).map((n) => n - first),
  };
  const windowColumns = columns.map(part);
  const windowSeries = part(series);
  const walk = (logarithm: number) => Math.exp(logarithm) / frames.cadenceSeconds;
  const cost = (logarithm: number) =>
    whitenedCost(window, walk(logarithm), windowColumns, windowSeries);
  let best = LOWEST;
  let bestCost = cost(LOWEST);
  for (let trial = 1; trial <= COARSE_TRIALS; trial++) {
    const trialCost = cost(LOWEST + trial * COARSE_STEP);
    if (trialCost < bestCost) [best, bestCost] = [LOWEST + trial * COARSE_STEP, trialCost];
  }
  return walk(goldenSection(cost, best - COARSE_STEP, best + COARSE_STEP, FINE_STEP));
}
