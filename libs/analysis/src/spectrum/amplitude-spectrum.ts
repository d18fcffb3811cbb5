import { at } from '../statistics/at';
import { linearTrend } from '../statistics/linear-trend';
import { powerOfTwoFrom, realSpectrum } from './real-spectrum';
import { coherentGain, spectralWindow } from './window';

/** The transform is at least so many times as long as the series: a line then lies near a bin. */
const PADDING = 4;

/**
 * Amplitude spectrum of evenly sampled series of one length: trend taken off, Hann window, zeros up to a power of
 * two at least four times the length, A[k] = 2 |X[k]| / Σw. A sine shows half its peak-to-peak. O(n log n).
 *
 * @param count Samples of a series.
 * @returns the transform's size (bin k is k / (size · cadence) Hz) and a function from a series to its amplitudes,
 *   size/2 + 1 of them.
 * @see G. Heinzel, A. Rüdiger, R. Schilling, Spectrum and spectral density estimation by the DFT (2002), sec. 9.
 */
export function amplitudeSpectrum(count: number): {
  readonly size: number;
  readonly amplitudes: (values: Float64Array) => Float64Array;
} {
  const size = powerOfTwoFrom(PADDING * count);
  const window = spectralWindow('hann', count);
  const scale = 2 / (count * coherentGain(window));
  const transform = realSpectrum(size);
  const places = Float64Array.from(window.keys());
  const padded = new Float64Array(size);
  const amplitudes = (values: Float64Array): Float64Array => {
    const { intercept, slope } = linearTrend(places, values);
    for (let i = 0; i < count; i++) {
      padded[i] = at(window, i) * (at(values, i) - intercept - slope * i);
    }
    const spectrum = transform(padded);
    const heights = new Float64Array(size / 2 + 1);
    for (let k = 0; k < heights.length; k++) {
      const real = at(spectrum, 2 * k);
      const imaginary = at(spectrum, 2 * k + 1);
      heights[k] = scale * Math.sqrt(real * real + imaginary * imaginary);
    }
    return heights;
  };
  return { size, amplitudes };
}

/**
 * Where a line lies between the bins of a Hann-windowed spectrum without padding, by the two-bin rule: with r the
 * larger neighbour over the peak, δ = (2r − 1)/(r + 1) bins towards it, exact for one line far from bin 0.
 *
 * @param amplitudes Amplitudes at all bins.
 * @param peak A bin that neither neighbour exceeds.
 * @returns the line's place in bins and its amplitude: A · πδ(1 − δ²)/sin(πδ).
 * @see M. Grandke, IEEE Trans. Instrum. Meas. 32 (1983) 350 (from memory); checks.json 8.6.
 */
export function hannLine(
  amplitudes: Float64Array,
  peak: number,
): { readonly bin: number; readonly amplitude: number } {
  const before = at(amplitudes, peak - 1);
  const after = at(amplitudes, peak + 1);
  const height = at(amplitudes, peak);
  const ratio = Math.max(before, after) / height;
  const off = (2 * ratio - 1) / (ratio + 1);
  const hannResponse = Math.sin(Math.PI * off) / (Math.PI * off * (1 - off * off));
  return {
    bin: after >= before ? peak + off : peak - off,
    amplitude: Math.abs(off) < 1e-9 ? height : height / hannResponse,
  };
}
