import { type BudgetPart, type Peak } from '../analysis-document';
import { type UsedFrames } from '../series/used-frames';
import { populationDeviation } from '../statistics/deviation';
import { linearTrend } from '../statistics/linear-trend';
import { type AxisBudget, shared } from './budget';
import { bumpsOf } from './bumps';

/**
 * Error budget of one axis whose corrections are not known, from the error alone: drift and significant lines as the stars
 * saw them, gusts and bumps; what the guider did about anything cannot be told. O(n).
 *
 * @param errorArcsec Of the frames that count.
 * @param peaks Significant lines of that error.
 * @param why Why the corrections are not known.
 */
export function budgetByError(
  used: UsedFrames,
  errorArcsec: Float64Array,
  cadenceSeconds: number,
  peaks: readonly Peak[],
  why: string,
): AxisBudget {
  const total = populationDeviation(errorArcsec);
  const { slope } = linearTrend(used.timeSeconds, errorArcsec);
  const drift = slope * populationDeviation(used.timeSeconds);
  const lines = peaks.reduce((sum, peak) => sum + peak.amplitudeArcsec ** 2 / 2, 0);
  const bumps = bumpsOf(errorArcsec, cadenceSeconds);
  const calm = errorArcsec.map((error, n) => error - (bumps[n] ?? 0));
  const sizes: Record<BudgetPart, number> = {
    drift: drift ** 2,
    'periodic error': lines,
    'gusts and bumps': total ** 2 - populationDeviation(calm) ** 2,
    backlash: 0,
    'over-correction': 0,
    'seeing floor': 0,
    unexplained: 0,
  };
  return {
    parts: shared(sizes, total),
    whyMissing: { backlash: why, 'over-correction': why, 'seeing floor': why },
  };
}
