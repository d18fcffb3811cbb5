import { at } from '../statistics/at';
import { mean } from '../statistics/mean';
import { explainedVariance } from './lomb-scargle';
import { powerOfTwoFrom, realSpectrum } from './real-spectrum';

export interface FastLombScargle {
  /** Frequency k is k · step, k = 0 … count − 1. */
  readonly step: number;
  readonly count: number;
  /** Highest power of a line of power 1 beyond its own resolution width: what the sampling makes of it elsewhere. */
  readonly sidelobes: number;
  /** Variance that a sine of free mean explains at each frequency, in the unit of y²; 0 at k = 0. */
  readonly explained: (y: Float64Array) => Float64Array;
}

/** Frequencies a resolution width (1 / duration): at least. */
const OVERSAMPLING = 2;
/** A sample is spread over this many grid cells to each side. */
const REACH = 6;
/** Grid cells in the shortest period. */
const CELLS_A_PERIOD = 4;
/** Sharpness of the Gaussian that spreads a sample, for cells of a quarter of the shortest period (Greengard & Lee). */
const SHARPNESS = (0.75 * Math.PI) / REACH;
const GAUSSIAN = Float64Array.from({ length: 2 * REACH }, (_, j) =>
  Math.exp(-SHARPNESS * (j + 1 - REACH) ** 2),
);

/**
 * Generalised Lomb-Scargle periodogram on an even grid of frequencies in O(n log n): the samples are spread onto an
 * even grid in time by a Gaussian, transformed, and the Gaussian's own transform is divided out. Built once for the
 * times; each series of values then costs one transform. Agrees with the exact sums within 1e-5 of the variance.
 *
 * @param t n ascending times that span more than 0.
 * @param highest Highest frequency, in cycles per unit of t.
 * @see M. Zechmeister, M. Kürster, Astron. Astrophys. 496 (2009) 577; W. H. Press, G. B. Rybicki, Astrophys. J. 338
 *   (1989) 277 for the idea; L. Greengard, J.-Y. Lee, SIAM Review 46 (2004) 443 for the spreading.
 */
export function fastLombScargle(t: Float64Array, highest: number): FastLombScargle {
  const start = at(t, 0);
  const duration = at(t, t.length - 1) - start;
  const cell = 1 / (CELLS_A_PERIOD * highest);
  const size = powerOfTwoFrom((OVERSAMPLING * duration) / cell + 2 * REACH);
  const step = 1 / (size * cell);
  const count = Math.floor(highest / step) + 1;
  const transform = gaussianTransform(t, start, cell, size);
  // The sums of cos² need twice the frequency, so half the cell.
  const phases = gaussianTransform(
    t,
    start,
    cell / 2,
    2 * size,
  )(new Float64Array(t.length).fill(1), 2 * count - 1);

  const explained = (y: Float64Array): Float64Array => {
    const yMean = mean(y);
    const values = transform(
      y.map((value) => value - yMean),
      count,
    );
    const variances = new Float64Array(count);
    for (let k = 1; k < count; k++) {
      variances[k] = explainedVariance({
        c: at(phases, 2 * k),
        s: -at(phases, 2 * k + 1),
        cc: (1 + at(phases, 4 * k)) / 2,
        cs: -at(phases, 4 * k + 1) / 2,
        yc: at(values, 2 * k),
        ys: -at(values, 2 * k + 1),
      });
    }
    return variances;
  };
  return { step, count, sidelobes: highestSidelobe(phases, duration * step), explained };
}

/** Of the sampling's own transform, beyond frequency 1 / duration; `cycles` is a grid step in that unit. */
function highestSidelobe(phases: Float64Array, cycles: number): number {
  let highest = 0;
  for (let k = Math.ceil(1 / cycles); 2 * k < phases.length; k++) {
    highest = Math.max(highest, at(phases, 2 * k) ** 2 + at(phases, 2 * k + 1) ** 2);
  }
  return highest;
}

/** Σ y exp(−2πi f (t − start)) / n at the first frequencies of the grid: real and imaginary parts in turn. */
function gaussianTransform(
  t: Float64Array,
  start: number,
  cell: number,
  size: number,
): (y: Float64Array, frequencies: number) => Float64Array {
  const transform = realSpectrum(size);
  const grid = new Float64Array(size);
  return (y, frequencies) => {
    grid.fill(0);
    for (let i = 0; i < t.length; i++) spread(grid, (at(t, i) - start) / cell, at(y, i) / t.length);
    const spectrum = transform(grid);
    const sums = new Float64Array(2 * frequencies);
    const width = Math.sqrt(SHARPNESS / Math.PI);
    for (let k = 0; k < frequencies; k++) {
      const undo = width * Math.exp(((Math.PI * k) / size) ** 2 / SHARPNESS);
      sums[2 * k] = undo * at(spectrum, 2 * k);
      sums[2 * k + 1] = undo * at(spectrum, 2 * k + 1);
    }
    return sums;
  };
}

/** Adds a Gaussian of the given weight at a place of the grid, which closes on itself. */
function spread(grid: Float64Array, place: number, weight: number): void {
  const below = Math.floor(place);
  const off = place - below;
  // exp(−a (j − off)²) = exp(−a off²) · exp(2a off)^j · exp(−a j²): two exponentials a sample.
  const ratio = Math.exp(2 * SHARPNESS * off);
  let factor = weight * Math.exp(-SHARPNESS * off * off) * ratio ** (1 - REACH);
  const mask = grid.length - 1;
  for (let j = 0; j < 2 * REACH; j++) {
    const cell = (below + j + 1 - REACH) & mask;
    grid[cell] = at(grid, cell) + factor * at(GAUSSIAN, j);
    factor *= ratio;
  }
}
