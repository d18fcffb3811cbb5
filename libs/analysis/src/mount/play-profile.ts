import { robustSigma } from '../statistics/robust-sigma';
import { ColourFilter } from './colour-filter';
import { type LevelWhitening } from './level-whitening';
import { orthonormal, product, squaresWithout, without } from './orthonormal';
import { playInto } from './play';
import { START_LAGS, wayOf } from './play-start';
import { skyAngle } from './sky-trend';

/** Best fit of one gap width. */
export interface ProfilePoint {
  readonly width: number;
  /** How far the driven side stood behind the driver at the start. */
  readonly lag: number;
  /** Motion of the star per commanded arcsec, not negative. */
  readonly response: number;
  readonly responseError: number;
  /** Of the whitened residuals, and what the prior of the response adds. */
  readonly squares: number;
}

export interface ProfileInput {
  readonly whitening: LevelWhitening;
  readonly colour: ColourFilter;
  /** Columns of a drift that may bend, see `trendColumns`. */
  readonly trend: readonly Float64Array[];
  readonly errorArcsec: Float64Array;
  /** Summed commands. */
  readonly driver: Float64Array;
  /** Standard deviation of the response about 1 as known beforehand. */
  readonly responsePrior: number;
  /** The start of a gap of some width where it is known already; null: all are tried. */
  readonly lagOf: (width: number) => number | null;
}

const COARSE_POINTS = 36;
/** Narrowest and widest gap that the coarse scan tries beside none, as parts of the driver's way. */
const NARROWEST = 1 / 2000;
const WIDEST = 0.97;
/** Innovations beyond so many robust sigmas are bumps that no gap explains. */
const BUMP_SIGMAS = 5;
const COLOUR_ORDER = 4;

/** Sum of squares over the width of the gap, with response and a bending drift fitted at every width. */
export class PlayProfile {
  /** By ascending width. */
  readonly points: ProfilePoint[] = [];
  private readonly count: number;
  private readonly error: Float64Array;
  private readonly driven: Float64Array;
  /** Whitened powers of the time, orthonormal. */
  private readonly trend: readonly Float64Array[];
  private readonly errorError: number;

  constructor(private readonly input: ProfileInput) {
    const { driver, errorArcsec } = input;
    this.count = input.whitening.count;
    this.driven = new Float64Array(driver.length);
    this.trend = orthonormal(
      input.trend.map((power) => this.white(power, new Float64Array(power.length))),
    );
    this.error = without(this.trend, this.white(errorArcsec, new Float64Array(driver.length)));
    this.errorError = product(this.error, this.error);
  }

  /** No gap, and widths in equal ratios up to the whole way of the driver. */
  scan(): void {
    const widest = wayOf(this.input.driver);
    const ratio = (WIDEST / NARROWEST) ** (1 / (COARSE_POINTS - 1));
    this.points.push(this.fit(0));
    for (let step = 0; step < COARSE_POINTS; step++) {
      this.points.push(this.fit(widest * NARROWEST * ratio ** step));
    }
  }

  /** Adds widths between two others, both left out. */
  add(from: number, to: number, points: number): void {
    for (let step = 1; step <= points; step++) {
      this.points.push(this.fit(from + ((to - from) * step) / (points + 1)));
    }
    this.points.sort((a, b) => a.width - b.width);
  }

  /** The point with the least sum of squares; needs a scan. */
  best(): ProfilePoint {
    return this.points.reduce((best, point) => (point.squares < best.squares ? point : best));
  }

  /** Twice the log likelihood that a point loses against the best. */
  loss(point: ProfilePoint, best: ProfilePoint): number {
    return this.count * Math.log(point.squares / best.squares);
  }

  /** Standard deviation of the white noise of one frame. */
  noise(point: ProfilePoint): number {
    return Math.sqrt(point.squares / this.count);
  }

  /** What a fit leaves, whitened; 0 in frames that do not count. */
  residual(point: ProfilePoint): Float64Array {
    const driven = without(this.trend, this.whitePlay(point.width, point.lag));
    return this.error.map((error, n) => error - point.response * (driven[n] ?? NaN));
  }

  /** The best start inside the gap counts. */
  fit(width: number): ProfilePoint {
    const known = this.input.lagOf(width);
    if (known !== null) return this.fitFrom(width, known);
    const [first = 0, ...others] = START_LAGS;
    let best = this.fitFrom(width, first * width);
    for (const part of width > 0 ? others : []) {
      const other = this.fitFrom(width, part * width);
      if (other.squares < best.squares) best = other;
    }
    return best;
  }

  private fitFrom(width: number, lag: number): ProfilePoint {
    const moved = this.whitePlay(width, lag);
    // The error is free of the trend already: only the squares of the motion need it taken off.
    const movedMoved = squaresWithout(this.trend, moved);
    const movedError = product(moved, this.error);
    // The prior is one more observation: response = 1, with the noise's own scale as unit.
    const noise = this.errorError / this.count;
    const prior = noise / this.input.responsePrior ** 2;
    const response = Math.max(0, (movedError + prior) / (movedMoved + prior));
    const squares =
      this.errorError -
      response * (2 * movedError - response * movedMoved) +
      prior * (response - 1) ** 2;
    return {
      width,
      lag,
      response,
      responseError: Math.sqrt(squares / this.count / (movedMoved + prior)),
      squares,
    };
  }

  private whitePlay(width: number, lag: number): Float64Array {
    playInto(this.input.driver, width, lag, this.driven);
    return this.white(this.driven, this.driven);
  }

  private white(series: ArrayLike<number>, out: Float64Array): Float64Array {
    return this.input.colour.apply(this.input.whitening.whiten(series, out));
  }
}

/**
 * A steady drift and the two ways in which a polar error bends it as the sky turns: c, 1 − cos wc and wc − sin wc, c the
 * time from the middle of the run and w the star rate. On a short run they are its first three powers.
 */
export function trendColumns(timeSeconds: Float64Array): readonly Float64Array[] {
  const angle = skyAngle(timeSeconds);
  return [
    angle,
    angle.map((each) => 1 - Math.cos(each)),
    angle.map((each) => each - Math.sin(each)),
  ];
}

/** Clears `used` where a residual is a bump. */
export function dropBumps(residual: Float64Array, used: Uint8Array): void {
  const limit = BUMP_SIGMAS * robustSigma(residual);
  residual.forEach((value, n) => {
    if (Math.abs(value) > limit) used[n] = 0;
  });
}

/** The filter that makes a residual white. */
export function colourOf(residual: Float64Array): ColourFilter {
  return ColourFilter.fittedTo(residual, COLOUR_ORDER);
}
