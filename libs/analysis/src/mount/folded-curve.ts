import { type PeriodicError } from '../analysis-document';
import { quantileInPlace } from '../statistics/quantile';

const BINS = 72;

/**
 * A motion folded by a period: median and quartiles of each of 72 bins of one turn, phase 0 at the run's first frame.
 * O(n) on average.
 *
 * @param motion n values, NaN where there is none; drift and other lines taken off.
 */
export function foldedCurve(
  timeSeconds: Float64Array,
  motion: Float64Array,
  periodSeconds: number,
): PeriodicError['curve'] {
  const bins = Array.from({ length: BINS }, (): number[] => []);
  motion.forEach((value, n) => {
    const turns = (timeSeconds[n] ?? 0) / periodSeconds;
    const bin = Math.min(BINS - 1, Math.floor((turns - Math.floor(turns)) * BINS));
    if (Number.isFinite(value)) bins[bin]?.push(value);
  });
  return bins.map((values, bin) => {
    const phase = (bin + 0.5) / BINS;
    if (values.length === 0) return { phase, medianArcsec: null, q1Arcsec: null, q3Arcsec: null };
    const work = new Float64Array(values);
    return {
      phase,
      medianArcsec: quantileInPlace(work, 0.5),
      q1Arcsec: quantileInPlace(work, 0.25),
      q3Arcsec: quantileInPlace(work, 0.75),
    };
  });
}
