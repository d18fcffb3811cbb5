import { at } from '../statistics/at';

/** Noise around each frequency of a power spectrum. */
export interface NoiseLevel {
  /** Mean noise power at each bin of the spectrum. */
  readonly level: Float64Array;
  /** How many independent bins the level at a bin is worth. */
  readonly bins: Float64Array;
}

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
  readonly logFrequency: number;
  readonly logLevel: number;
  readonly bins: number;
}

/**
 * Level of the noise in a power spectrum, frequency by frequency: a straight line in log power against log frequency
 * through the neighbourhood, lines left out. A red spectrum, or one that a guider has bent, then gives no peaks of
 * its own, since each bin is held against its neighbours and not against the mean of all. O(bins · log bins).
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
  const logPower = power.map((value) => Math.log(Math.max(value, floor)));
  const nodes: Node[] = [];
  const last = power.length - 1;
  const factor = 2 ** (1 / NODES_PER_OCTAVE);
  for (let bin = first; bin < last * factor; bin *= factor) {
    nodes.push(levelAt(logPower, Math.min(bin, last), first, stride));
  }
  const level = new Float64Array(power.length).fill(Infinity);
  const bins = new Float64Array(power.length).fill(1);
  let segment = 0;
  for (let k = first; k <= last; k++) {
    const logFrequency = Math.log(k);
    while (segment < nodes.length - 2 && logFrequency > (nodes[segment + 1]?.logFrequency ?? 0)) {
      segment++;
    }
    const left = nodes[segment];
    const right = nodes[segment + 1] ?? left;
    if (left === undefined || right === undefined) continue;
    const width = right.logFrequency - left.logFrequency;
    const part = width > 0 ? (logFrequency - left.logFrequency) / width : 0;
    level[k] = Math.exp(left.logLevel + part * (right.logLevel - left.logLevel));
    bins[k] = left.bins + part * (right.bins - left.bins);
  }
  return { level, bins };
}

function levelAt(logPower: Float64Array, bin: number, first: number, stride: number): Node {
  const last = logPower.length - 1;
  let from = Math.max(first, Math.ceil(bin / REACH));
  let to = Math.min(last, Math.floor(bin * REACH));
  const missing = FEWEST * stride - (to - from);
  if (missing > 0) {
    from = Math.max(first, from - Math.ceil(missing / 2));
    to = Math.min(last, from + FEWEST * stride);
    from = Math.max(first, Math.min(from, to - FEWEST * stride));
  }
  const logFrequency = Math.log(bin);
  // The first fit has the lines in it: a second and third leave out what stands apart from the one before.
  let fit = localLine(logPower, from, to, stride, logFrequency, () => true);
  const { count, leverage } = fit;
  for (let round = 0; round < 3; round++) {
    const before = fit;
    const trimmed = localLine(logPower, from, to, stride, logFrequency, (x, y) => {
      const over = y - (before.value + before.slope * (x - logFrequency)) + LOG_MEAN;
      return over < ABOVE && over > BELOW;
    });
    // Where most bins stand apart there is no noise to see, only the skirts of strong lines.
    if (trimmed.count < count / 2) break;
    fit = trimmed;
  }
  return {
    logFrequency,
    logLevel: fit.value - LOG_MEAN,
    bins: 1 / (LOG_VARIANCE * leverage),
  };
}

/** Least-squares line through kept (log k, log power), told at x₀: value, slope and leverage (variance / variance of one). */
function localLine(
  logPower: Float64Array,
  from: number,
  to: number,
  stride: number,
  x0: number,
  keeps: (x: number, y: number) => boolean,
): { value: number; slope: number; leverage: number; count: number } {
  let n = 0;
  let sx = 0;
  let sy = 0;
  let sxx = 0;
  let sxy = 0;
  for (let k = from; k <= to; k += stride) {
    const x = Math.log(k);
    const y = at(logPower, k);
    if (!Number.isFinite(y) || !keeps(x, y)) continue;
    const off = x - x0;
    n++;
    sx += off;
    sy += y;
    sxx += off * off;
    sxy += off * y;
  }
  const spread = n * sxx - sx * sx;
  if (n < 3 || spread <= 0) {
    return { value: n > 0 ? sy / n : Infinity, slope: 0, leverage: 1 / Math.max(n, 1), count: n };
  }
  const slope = Math.max(-STEEPEST, Math.min(STEEPEST, (n * sxy - sx * sy) / spread));
  return {
    value: (sy - slope * sx) / n,
    slope,
    leverage: 1 / n + sx ** 2 / (n * spread),
    count: n,
  };
}
