import { turnInto } from '../spectrum/turning';
import { type WhitenedFit } from './whitened-least-squares';

/** A sine: cosine · cos(2π f t) + sine · sin(2π f t), t from the run's first frame. */
export interface FittedLine {
  /** Cycles per second. */
  readonly frequency: number;
  readonly cosine: number;
  readonly sine: number;
  /** 0 for a line that is not fitted yet. */
  readonly amplitude: number;
  /** Of the amplitude. */
  readonly standardError: number;
}

/** The largest move of a frequency in one refinement, as a part of the resolution 1/span. */
const LARGEST_STEP = 0.5;

export function newLine(frequency: number): FittedLine {
  return { frequency, cosine: 0, sine: 0, amplitude: 0, standardError: 0 };
}

/** Columns of one line: cosine, sine and, once its amplitude is known, the derivative by the frequency. */
export function lineColumns(timeSeconds: Float64Array, line: FittedLine): Float64Array[] {
  const cosine = new Float64Array(timeSeconds.length);
  const sine = new Float64Array(timeSeconds.length);
  turnInto(timeSeconds, 0, line.frequency, cosine, sine);
  if (line.amplitude === 0) return [cosine, sine];
  const byFrequency = new Float64Array(timeSeconds.length);
  for (let n = 0; n < timeSeconds.length; n++) {
    const turned = line.sine * (cosine[n] ?? 0) - line.cosine * (sine[n] ?? 0);
    byFrequency[n] = 2 * Math.PI * (timeSeconds[n] ?? 0) * turned;
  }
  return [cosine, sine, byFrequency];
}

/** The line as a fit left it: Gauss and Newton's step in the frequency. */
export function lineFrom(
  line: FittedLine,
  fit: WhitenedFit,
  place: number,
  spanSeconds: number,
): FittedLine {
  const cosine = fit.coefficients[place] ?? 0;
  const sine = fit.coefficients[place + 1] ?? 0;
  const amplitude = Math.hypot(cosine, sine);
  const wanted = line.amplitude === 0 ? 0 : (fit.coefficients[place + 2] ?? 0);
  const largest = LARGEST_STEP / spanSeconds;
  return {
    frequency: line.frequency + Math.min(largest, Math.max(-largest, wanted)),
    cosine,
    sine,
    amplitude,
    standardError: amplitudeError(fit, place, cosine, sine),
  };
}

/** First order: the variance along the amplitude's own direction. */
export function amplitudeError(
  fit: WhitenedFit,
  place: number,
  cosine: number,
  sine: number,
): number {
  const size = fit.coefficients.length;
  const entry = (i: number, j: number) => fit.covariance[(place + i) * size + place + j] ?? 0;
  const square = cosine * cosine + sine * sine;
  if (square === 0) return Math.sqrt(entry(0, 0));
  const variance =
    cosine * cosine * entry(0, 0) + 2 * cosine * sine * entry(0, 1) + sine * sine * entry(1, 1);
  return Math.sqrt(variance / square);
}

/** Adds a line's sine to `out`. */
export function sineInto(timeSeconds: Float64Array, line: FittedLine, out: Float64Array): void {
  const [cosine, sine] = [new Float64Array(out.length), new Float64Array(out.length)];
  turnInto(timeSeconds, 0, line.frequency, cosine, sine);
  for (let n = 0; n < out.length; n++) {
    out[n] = (out[n] ?? 0) + line.cosine * (cosine[n] ?? 0) + line.sine * (sine[n] ?? 0);
  }
}
