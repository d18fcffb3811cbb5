import { at } from '../statistics/at';
import { mean } from '../statistics/mean';
import { requireSameLength, requireSeries, SeriesError } from '../statistics/series-error';

/**
 * Sums over the samples that the generalised periodogram of one frequency needs, each divided by n: of cos, sin,
 * cos², cos·sin, and of the centred values against cos and sin; τ is the time from the mean time.
 */
export interface PhaseSums {
  c: number;
  s: number;
  cc: number;
  cs: number;
  yc: number;
  ys: number;
}

/** Below this part of its largest value the determinant tells no amplitude: the samples meet one phase only. */
const NO_PHASES = 1e-12;

/**
 * Variance that a sine of free mean explains, in the unit of y²: YY − χ²/n of Zechmeister & Kürster, eq. 5; 0 where
 * the samples' phases leave the sine open. Twice this is the squared amplitude when the phases are spread evenly.
 */
export function explainedVariance({ c, s, cc, cs, yc, ys }: PhaseSums): number {
  const coscos = cc - c * c;
  const sinsin = 1 - cc - s * s;
  const cossin = cs - c * s;
  const determinant = coscos * sinsin - cossin * cossin;
  if (determinant <= NO_PHASES) return 0;
  return (sinsin * yc * yc + coscos * ys * ys - 2 * cossin * yc * ys) / determinant;
}

/**
 * Generalised Lomb-Scargle periodogram with floating mean, exact, at any frequencies:
 * p = (χ₀² − χ²) / χ₀², between 0 and 1. O(n) a frequency: for short series and for single frequencies.
 *
 * @param t n times, any order.
 * @param y n values.
 * @param frequencies In cycles per unit of t, above 0.
 * @throws {SeriesError} `length-mismatch`, `too-short` (n < 4), `not-finite`, `no-spread` (constant values).
 * @see M. Zechmeister, M. Kürster, Astron. Astrophys. 496 (2009) 577.
 */
export function lombScargle(
  t: Float64Array,
  y: Float64Array,
  frequencies: ArrayLike<number>,
): Float64Array {
  requireSameLength('lombScargle', t, y);
  requireSeries('lombScargle', t, 4);
  requireSeries('lombScargle', y, 4);
  const tMean = mean(t);
  const yMean = mean(y);
  let variance = 0;
  for (const value of y) variance += (value - yMean) ** 2 / y.length;
  if (variance === 0) throw new SeriesError('no-spread', 'lombScargle needs values that differ');
  const powers = new Float64Array(frequencies.length);
  for (let k = 0; k < powers.length; k++) {
    const sums = phaseSums(t, y, tMean, yMean, at(frequencies, k));
    powers[k] = explainedVariance(sums) / variance;
  }
  return powers;
}

function phaseSums(
  t: Float64Array,
  y: Float64Array,
  tMean: number,
  yMean: number,
  frequency: number,
): PhaseSums {
  const sums = { c: 0, s: 0, cc: 0, cs: 0, yc: 0, ys: 0 };
  const n = t.length;
  for (let i = 0; i < n; i++) {
    const angle = 2 * Math.PI * frequency * (at(t, i) - tMean);
    const cos = Math.cos(angle);
    const sin = Math.sin(angle);
    const value = at(y, i) - yMean;
    sums.c += cos / n;
    sums.s += sin / n;
    sums.cc += (cos * cos) / n;
    sums.cs += (cos * sin) / n;
    sums.yc += (value * cos) / n;
    sums.ys += (value * sin) / n;
  }
  return sums;
}
