import { at } from '../statistics/at';
import { leastSquares } from '../statistics/least-squares';
import { mean } from '../statistics/mean';

/** One sine of a fit: amplitude · cos(2π frequency t + phase), t as the caller counts it. */
export interface FittedLine {
  readonly frequency: number;
  readonly amplitude: number;
  readonly phaseRadians: number;
  /** For independent residuals. */
  readonly amplitudeError: number;
}

export interface LinesFit {
  /** Value of the polynomial at the mean time, then its slope there, then higher coefficients. */
  readonly polynomial: Float64Array;
  readonly lines: readonly FittedLine[];
  /** Standard deviation of what is left, for n − p degrees of freedom. */
  readonly residualDeviation: number;
}

/**
 * Sines of known frequencies and a polynomial fitted together by least squares:
 * y = Σ cⱼ (t − t̄)ʲ + Σ aᵢ cos(2π fᵢ t) + bᵢ sin(2π fᵢ t), with A = hypot(a, b) and phase = atan2(−b, a).
 * O(n p²).
 *
 * @param t n times.
 * @param y n values.
 * @param frequencies In cycles per unit of t, all different.
 * @param degree Of the polynomial: 0 for a mean, 1 for a trend.
 * @throws {SeriesError} as `leastSquares`.
 */
export function fitLines(
  t: Float64Array,
  y: Float64Array,
  frequencies: readonly number[],
  degree: number,
): LinesFit {
  const tMean = mean(t);
  // Times enter powers in units of the longest distance from the mean, so that the columns are of one size.
  const reach = t.reduce((longest, time) => Math.max(longest, Math.abs(time - tMean)), 0) || 1;
  const powers = Array.from({ length: degree + 1 }, (_, j) =>
    t.map((time) => ((time - tMean) / reach) ** j),
  );
  const waves = frequencies.flatMap((frequency) => [
    t.map((time) => Math.cos(2 * Math.PI * frequency * time)),
    t.map((time) => Math.sin(2 * Math.PI * frequency * time)),
  ]);
  const columns = [...powers, ...waves];
  const { coefficients, covariance, residualSquares, freedom } = leastSquares(columns, y);
  const width = columns.length;
  const lines = frequencies.map((frequency, i) => {
    const ia = powers.length + 2 * i;
    const a = at(coefficients, ia);
    const b = at(coefficients, ia + 1);
    const amplitude = Math.hypot(a, b);
    const variance =
      a * a * at(covariance, ia * width + ia) +
      b * b * at(covariance, (ia + 1) * width + ia + 1) +
      2 * a * b * at(covariance, ia * width + ia + 1);
    return {
      frequency,
      amplitude,
      phaseRadians: Math.atan2(-b, a),
      amplitudeError: amplitude > 0 ? Math.sqrt(Math.max(0, variance)) / amplitude : 0,
    };
  });
  return {
    polynomial: coefficients.slice(0, degree + 1).map((value, j) => value / reach ** j),
    lines,
    residualDeviation: freedom > 0 ? Math.sqrt(residualSquares / freedom) : 0,
  };
}
