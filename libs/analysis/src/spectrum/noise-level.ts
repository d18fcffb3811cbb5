import { at } from '../statistics/at';

/** Noise around a frequency of a power spectrum. */
export interface LocalNoise {
  /** Mean noise power. */
  readonly level: number;
  /** How many independent bins the level is worth. */
  readonly bins: number;
}

/** The noise at any bin, whole or not, from the first one that was looked at. */
export type NoiseLevel = (bin: number) => LocalNoise;

/** The neighbourhood reaches from f / REACH to f · REACH, */
const REACH = 1.6;
/** and over at least so many independent bins. */
const FEWEST = 40;
/** Nodes between which the level is drawn as straight lines in log power against log frequency. */
const NODES_PER_OCTAVE = 3;
/** Mean and variance of the logarithm of an exponential variable of mean 1: −γ (Euler) and π²/6. */
const LOG_MEAN = -0.5772156649015329;
const LOG_VARIANCE = Math.PI ** 2 / 6;
/** A bin this far above or below the fit is a line or the hole that a line left: 1 in 100 of noise is. */
const ABOVE = Math.log(4.6);
const BELOW = Math.log(0.01);
/**
 * No noise of a mount or of the air is steeper than this in power (a random walk has −2): what is steeper is the skirt of a
 * strong line, which must not pass for noise.
 */
const STEEPEST = 3;

interface Node {
  readonly logLevel: number;
  readonly bins: number;
}

/** Logarithms of frequency (in bins) and power at independent bins. */
interface LogSpectrum {
  readonly x: Float64Array;
  readonly y: Float64Array;
}

/**
 * Level of the noise in a power spectrum, frequency by frequency: a straight line in log power against log frequency
 * through the neighbourhood, lines left out. A red spectrum, or one that a guider has bent, then gives no peaks of
 * its own, since each bin is held against its neighbours and not against the mean of all. O(bins).
 *
 * @param power Power at bins 0 … n − 1 of an even grid.
 * @param first First bin that is looked at, above 0.
 * @param stride Bins from one independent value to the next.
 * @param floor Power below which there is only the rounding of the arithmetic.
 */
export function noiseLevel(
  power: Float64Array,
  first: number,
  stride: number,
  floor: number,
): NoiseLevel {
  const last = power.length - 1;
  const count = Math.max(0, Math.floor((last - first) / stride) + 1);
  const x = new Float64Array(count);
  const y = new Float64Array(count);
  for (let j = 0; j < count; j++) {
    x[j] = Math.log(first + j * stride);
    y[j] = Math.log(Math.max(at(power, first + j * stride), floor));
  }
  const nodes: Node[] = [];
  const spacing = Math.LN2 / NODES_PER_OCTAVE;
  const start = Math.log(first);
  for (let n = 0; n === 0 || start + (n - 1) * spacing < Math.log(last); n++) {
    nodes.push(nodeAt({ x, y }, start + n * spacing, stride));
  }
  return (bin) => {
    const place = Math.max(0, (Math.log(bin) - start) / spacing);
    const segment = Math.min(Math.floor(place), nodes.length - 1);
    const left = nodes[segment] ?? NO_NOISE_SEEN;
    const right = nodes[segment + 1] ?? left;
    const part = Math.min(1, place - segment);
    return {
      level: Math.exp(left.logLevel + part * (right.logLevel - left.logLevel)),
      bins: left.bins + part * (right.bins - left.bins),
    };
  };
}

const NO_NOISE_SEEN: Node = { logLevel: Infinity, bins: 1 };

function nodeAt(spectrum: LogSpectrum, logBin: number, stride: number): Node {
  const { x } = spectrum;
  const firstBin = Math.exp(at(x, 0));
  const place = (reach: number): number => (Math.exp(logBin) * reach - firstBin) / stride;
  let from = Math.max(0, Math.ceil(place(1 / REACH)));
  let to = Math.min(x.length, Math.floor(place(REACH)) + 1);
  const missing = FEWEST - (to - from);
  if (missing > 0) {
    from = Math.max(0, from - Math.ceil(missing / 2));
    to = Math.min(x.length, from + FEWEST);
    from = Math.max(0, to - FEWEST);
  }
  // The first fit has the lines in it: those that follow leave out what stands apart from the one before.
  let fit = localLine(spectrum, from, to, logBin, null);
  if (fit === null) return NO_NOISE_SEEN;
  const { count, leverage } = fit;
  for (let round = 0; round < 3; round++) {
    const trimmed = localLine(spectrum, from, to, logBin, fit);
    // Where most bins stand apart there is no noise to see, only the skirts of strong lines.
    if (trimmed === null || trimmed.count < count / 2) break;
    fit = trimmed;
  }
  return { logLevel: fit.value - LOG_MEAN, bins: 1 / (LOG_VARIANCE * leverage) };
}

interface LocalLine {
  /** Of the line at x₀. */
  readonly value: number;
  readonly slope: number;
  /** Variance of `value` over the variance of one point. */
  readonly leverage: number;
  readonly count: number;
}

/** Least-squares line through the points from … to − 1 that lie near the fit before; null for fewer than 3. */
function localLine(
  { x, y }: LogSpectrum,
  from: number,
  to: number,
  x0: number,
  before: LocalLine | null,
): LocalLine | null {
  let n = 0;
  let sx = 0;
  let sy = 0;
  let sxx = 0;
  let sxy = 0;
  for (let j = from; j < to; j++) {
    const off = at(x, j) - x0;
    const height = at(y, j);
    if (before !== null) {
      const over = height - before.value - before.slope * off + LOG_MEAN;
      if (over > ABOVE || over < BELOW) continue;
    }
    n++;
    sx += off;
    sy += height;
    sxx += off * off;
    sxy += off * height;
  }
  const spread = n * sxx - sx * sx;
  if (n < 3 || spread <= 0 || !Number.isFinite(sy)) return null;
  const slope = Math.max(-STEEPEST, Math.min(STEEPEST, (n * sxy - sx * sy) / spread));
  return {
    value: (sy - slope * sx) / n,
    slope,
    leverage: 1 / n + sx ** 2 / (n * spread),
    count: n,
  };
}
