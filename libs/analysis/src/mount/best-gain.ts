import { goldenSection } from './golden-section';

/** What a loop has to follow and what it must not follow, by frames; all in arcsec. */
export interface LoopDisturbance {
  /** White noise of one measurement. */
  readonly noise: number;
  /** Standard deviation of the drive's random step a frame. */
  readonly step: number;
  readonly driftPerFrame: number;
  readonly lines: readonly { readonly amplitude: number; readonly periodFrames: number }[];
}

const LOWEST_GAIN = 0.02;
const HIGHEST_GAIN = 1.5;
/** A minimum is flat: closer than the square root of a double's last digit it cannot be told. */
const GAIN_WIDTH = 1e-8;

/**
 * Variance of the true pointing of an integrator of gain k, e[n+1] = e[n] − k·m[n] + disturbance:
 *
 *     k/(2−k)·r + q/(k(2−k)) + Σ A²/2·|S|² + (drift/k)²,   |S| = |(z−1)/(z−1+k)|, z = exp(2πi/N)
 *
 * @param gain Between 0 and 2, both left out.
 * @see REFERENCE 11; checks.json 11.3, 11.4, 11.8 (derived).
 */
export function pointingVariance(gain: number, disturbance: LoopDisturbance): number {
  const { noise, step, driftPerFrame, lines } = disturbance;
  let variance = (gain / (2 - gain)) * noise ** 2 + step ** 2 / (gain * (2 - gain));
  variance += (driftPerFrame / gain) ** 2;
  for (const { amplitude, periodFrames } of lines) {
    variance += (amplitude ** 2 / 2) * sensitivity(gain, periodFrames) ** 2;
  }
  return variance;
}

/** Part of a sine of so many frames that an integrator of gain k leaves (checks.json 11.8, derived). */
export function sensitivity(gain: number, periodFrames: number): number {
  const angle = (2 * Math.PI) / periodFrames;
  const [real, imaginary] = [Math.cos(angle) - 1, Math.sin(angle)];
  return Math.hypot(real, imaginary) / Math.hypot(real + gain, imaginary);
}

/**
 * The gain between 0.02 and 1.5 that points best for this noise and this mount. With random steps alone
 * it is (−s + √(s² + 4s))/2, s = q/r (checks.json 11.5).
 */
export function bestGain(disturbance: LoopDisturbance): number {
  const variance = (gain: number) => pointingVariance(gain, disturbance);
  return goldenSection(variance, LOWEST_GAIN, HIGHEST_GAIN, GAIN_WIDTH);
}
