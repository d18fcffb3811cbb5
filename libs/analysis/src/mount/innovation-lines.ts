import { powerOfTwoFrom, realSpectrum } from '../spectrum/real-spectrum';
import { robustSigma } from '../statistics/robust-sigma';
import { type LevelFrames } from './whitened-least-squares';

/** False-alarm probability over the whole spectrum below which a line counts (SCIENCE 3). */
const FALSE_ALARM = 0.001;
/** Zeros appended, so that a peak between two frequencies of the grid loses less than a fifth of its power. */
const LEAST_PADDING = 1.5;
/** Independent frequencies on such a grid. */
const TRIALS_PER_FRAME = 1.25;
/** Slower motions than so many turns a run cannot be told from drift. */
const FEWEST_TURNS = 1.5;
/** Sidelobes of the strongest line stay below this part of its power. */
const SIDELOBE_PART = 0.2;
const MOST_A_PASS = 4;

/**
 * Frequencies of sines that are left in the innovations of a fit: peaks of their periodogram. Innovations are white
 * but for what the fit has missed, so the power over their variance is exponential with mean 1, and a peak of power z
 * among M frequencies comes by chance with probability M·exp(−z). Frames go to the nearest place of an even grid, which
 * is enough to find a line; the caller refines it on the exact times. O(n log n).
 *
 * @returns Cycles per second, strongest first, at most 4: with strong lines gone, weaker ones show in a second pass.
 * @see J. D. Scargle, Astrophys. J. 263 (1982) 835.
 */
export function innovationLines(frames: LevelFrames, innovations: Float64Array): number[] {
  const { timeSeconds, cadenceSeconds } = frames;
  const span = (timeSeconds.at(-1) ?? 0) - (timeSeconds[0] ?? 0);
  const present = innovations.filter((value) => value !== 0);
  if (present.length < 30 || span <= 0) return [];
  const sigma = robustSigma(present);
  if (!(sigma > 0)) return [];
  const size = powerOfTwoFrom(LEAST_PADDING * (span / cadenceSeconds + 1));
  const power = periodogram(frames, innovations, size, sigma * sigma * present.length);
  const threshold = Math.log((TRIALS_PER_FRAME * present.length) / FALSE_ALARM);
  const first = Math.ceil((FEWEST_TURNS / span) * size * cadenceSeconds);
  const peaks: { bin: number; power: number }[] = [];
  for (let bin = Math.max(1, first); bin < power.length - 1; bin++) {
    const here = power[bin] ?? 0;
    if (here > threshold && here >= (power[bin - 1] ?? 0) && here > (power[bin + 1] ?? 0)) {
      peaks.push({ bin, power: here });
    }
  }
  peaks.sort((a, b) => b.power - a.power);
  const strongest = peaks[0]?.power ?? 0;
  return peaks
    .filter((peak) => peak.power > SIDELOBE_PART * strongest)
    .slice(0, MOST_A_PASS)
    .map((peak) => topOf(power, peak.bin) / (size * cadenceSeconds));
}

function periodogram(
  { timeSeconds, cadenceSeconds }: LevelFrames,
  innovations: Float64Array,
  size: number,
  unit: number,
): Float64Array {
  const grid = new Float64Array(size);
  const start = timeSeconds[0] ?? 0;
  for (let n = 0; n < innovations.length; n++) {
    const place = Math.round(((timeSeconds[n] ?? 0) - start) / cadenceSeconds);
    if (place < size) grid[place] = (grid[place] ?? 0) + (innovations[n] ?? 0);
  }
  const spectrum = realSpectrum(size)(grid);
  const power = new Float64Array(size / 2);
  for (let bin = 0; bin < power.length; bin++) {
    power[bin] = ((spectrum[2 * bin] ?? 0) ** 2 + (spectrum[2 * bin + 1] ?? 0) ** 2) / unit;
  }
  return power;
}

/** Top of the parabola through a peak and its neighbours: a start for the refinement, no more. */
function topOf(power: Float64Array, bin: number): number {
  const [before, here, after] = [power[bin - 1] ?? 0, power[bin] ?? 0, power[bin + 1] ?? 0];
  const curvature = before - 2 * here + after;
  return curvature < 0 ? bin + (0.5 * (before - after)) / curvature : bin;
}
