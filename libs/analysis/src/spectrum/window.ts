import { at } from '../statistics/at';

/**
 * Cosine-sum windows by their coefficients a₀, a₁, …: w[n] = Σ (−1)ᵏ aₖ cos(2πkn/N).
 *
 * @see F. J. Harris, Proc. IEEE 66 (1978) 51; G. Heinzel, A. Rüdiger, R. Schilling, Spectrum and spectral density
 *   estimation by the DFT (2002).
 */
export const WINDOW_COEFFICIENTS = {
  rectangular: [1],
  hann: [0.5, 0.5],
  hamming: [0.54, 0.46],
  blackmanHarris: [0.35875, 0.48829, 0.14128, 0.01168],
  flatTop: [1, 1.9383379, 1.3045202, 0.402827, 0.0350665],
} as const;
export type WindowName = keyof typeof WINDOW_COEFFICIENTS;

/**
 * A window of n values, periodic (one turn of the cosines takes n samples, as the transform sees it).
 */
export function spectralWindow(name: WindowName, n: number): Float64Array {
  const coefficients: readonly number[] = WINDOW_COEFFICIENTS[name];
  return Float64Array.from({ length: n }, (_, i) =>
    coefficients.reduce(
      (sum, a, k) => sum + (k % 2 === 0 ? a : -a) * Math.cos((2 * Math.PI * k * i) / n),
      0,
    ),
  );
}

/** Mean of a window's values: what is left of a line's amplitude. */
export function coherentGain(window: Float64Array): number {
  return window.reduce((sum, w) => sum + w, 0) / window.length;
}

/** Equivalent noise bandwidth in bins, N Σw² / (Σw)²: white noise counts so many times as in one bin. */
export function noiseBandwidthBins(window: Float64Array): number {
  const squares = window.reduce((sum, w) => sum + w * w, 0);
  return squares / window.length / coherentGain(window) ** 2;
}

/**
 * Height of a line that lies `offBins` from a bin, against one on the bin: |W(off)| / |W(0)|. At half a bin it is the
 * scalloping loss.
 */
export function lineResponse(window: Float64Array, offBins: number): number {
  let real = 0;
  let imaginary = 0;
  for (let i = 0; i < window.length; i++) {
    const angle = (2 * Math.PI * offBins * i) / window.length;
    real += at(window, i) * Math.cos(angle);
    imaginary += at(window, i) * Math.sin(angle);
  }
  return Math.hypot(real, imaginary) / (window.length * coherentGain(window));
}
