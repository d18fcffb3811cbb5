export interface WhiteningInput {
  readonly timeSeconds: Float64Array;
  /** 1 where a frame counts, else 0. */
  readonly used: Uint8Array;
  /** Frames at which the level starts anew, ascending: what was there before tells nothing. */
  readonly restartFrames: readonly number[];
  /** Variance that the level's random walk gains per second, over the variance of the white noise. */
  readonly walkPerSecond: number;
}

/** Far below what a double holds, whatever the next factor. */
const LARGE_PRODUCT = 1e100;

/**
 * Turns series that ride on a wandering level into series with white noise, so that plain least squares on the
 * turned series is generalised least squares on the first ones. Model: value = level + white noise, the level a
 * random walk with a free start after every restart. The filter is Kalman's for this local level; its gains depend on
 * the times alone, so any number of columns is turned with the same weights. O(n) a series.
 *
 * @see A. C. Harvey, Forecasting, Structural Time Series Models and the Kalman Filter (1989), ch. 3 and 4.1.
 */
export class LevelWhitening {
  /** Frames that leave an innovation: those used, less one for each start. */
  readonly count: number;
  /** Σ ln F over them, F the innovation's variance over the noise's. */
  readonly logDeterminant: number;
  /** Part of the innovation that the level follows; NaN at a start, 0 in a frame left out. */
  private readonly gain: Float64Array;
  private readonly weight: Float64Array;

  constructor(input: WhiteningInput) {
    const { timeSeconds, used, restartFrames, walkPerSecond } = input;
    this.gain = new Float64Array(timeSeconds.length);
    this.weight = new Float64Array(timeSeconds.length);
    let count = 0;
    let logDeterminant = 0;
    // A logarithm a frame would cost more than all the rest: variances are multiplied up first.
    let product = 1;
    let levelVariance = NaN; // NaN: the level is not known at all
    let restart = 0;
    for (let n = 0; n < timeSeconds.length; n++) {
      if (restartFrames[restart] === n) {
        restart++;
        levelVariance = NaN;
      } else if (n > 0) {
        levelVariance += walkPerSecond * ((timeSeconds[n] ?? NaN) - (timeSeconds[n - 1] ?? NaN));
      }
      if (used[n] !== 1) continue;
      if (Number.isNaN(levelVariance)) {
        this.gain[n] = NaN;
        levelVariance = 1;
        continue;
      }
      const innovationVariance = levelVariance + 1;
      this.gain[n] = levelVariance / innovationVariance;
      this.weight[n] = 1 / Math.sqrt(innovationVariance);
      levelVariance /= innovationVariance;
      product *= innovationVariance;
      if (product > LARGE_PRODUCT) {
        logDeterminant += Math.log(product);
        product = 1;
      }
      count++;
    }
    this.count = count;
    this.logDeterminant = logDeterminant + Math.log(product);
  }

  /**
   * @param out As long as `series`, may be `series` itself; frames without an innovation get 0.
   * @returns `out`
   */
  whiten(series: ArrayLike<number>, out: Float64Array): Float64Array {
    let level = 0;
    for (let n = 0; n < out.length; n++) {
      const gain = this.gain[n] ?? NaN;
      const value = series[n] ?? NaN;
      if (gain > 0) {
        const innovation = value - level;
        out[n] = (this.weight[n] ?? NaN) * innovation;
        level += gain * innovation;
      } else {
        if (Number.isNaN(gain)) level = value;
        out[n] = 0;
      }
    }
    return out;
  }
}
