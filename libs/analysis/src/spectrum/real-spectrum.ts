import FFT from 'fft.js';

/** Smallest power of two that is not below `length` (and at least 4, which fft.js needs). */
export function powerOfTwoFrom(length: number): number {
  return 2 ** Math.max(2, Math.ceil(Math.log2(length)));
}

/** Tables that were made last: one analysis asks for the same few sizes again and again. */
const made: FFT[] = [];
const MOST_MADE = 4;

function tablesOf(size: number): FFT {
  const known = made.find((each) => each.size === size);
  if (known !== undefined) return known;
  const fresh = new FFT(size);
  made.unshift(fresh);
  made.length = Math.min(made.length, MOST_MADE);
  return fresh;
}

/**
 * A transform of real series of one size, with its tables made once:
 *
 *     X[k] = Σ x[n] exp(−2πi k n / size),   k = 0 … size/2
 *
 * @param size A power of two.
 * @returns a function that gives real and imaginary parts in turn; its answer is overwritten by the next call.
 */
export function realSpectrum(size: number): (padded: Float64Array) => Float64Array {
  const fft = tablesOf(size);
  const spectrum = new Float64Array(2 * size);
  return (padded) => {
    fft.realTransform(spectrum, padded);
    return spectrum;
  };
}
