import { BUDGET_PARTS, type BudgetPart, type Part } from '../analysis-document';
import { type RunSeries } from '../series/run-series';
import { RandomSource } from '../simulation/random-source';
import { keptRms, replayAxis, type ReplayableAxis } from './replay';

export interface AxisBudget {
  /** One of each of `BUDGET_PARTS`, in their order. */
  readonly parts: Part[];
  /** Parts that could not be told and stand at 0, with the reason. */
  readonly whyMissing: Partial<Record<BudgetPart, string>>;
}

export interface BudgetInput {
  readonly axis: ReplayableAxis;
  readonly run: RunSeries;
  readonly errorArcsec: Float64Array;
  /** White noise of one frame; null where it is not known. */
  readonly noiseArcsec: number | null;
  /** Why the gap of this axis is not known; null where it is, or where it does no harm. */
  readonly whyNoGap: string | null;
}

/**
 * Error budget of one axis whose corrections are known: what of the variance of the error (over the frames that count,
 * about their mean) each cause brought into it, told by guiding the night again without the cause. In the order of
 * SCIENCE 4: drift, periodic error with the other lines, gusts and bumps, backlash; then
 *
 *     seeing floor    = variance that white noise brings into the loop at gain min(k, 1)
 *     over-correction = variance at the gain of the night less that at gain 1
 *
 * and the rest. White noise becomes noise² · 2 / (2 − k) in a plain loop (REFERENCE 11); a minimum move and a gap change
 * that, so the smooth motion is guided with noise of that size and without. A part is cut where less than it is left, so
 * that the shares add up to 1; a backlash that calms the loop has none. O(n).
 */
export function axisBudget(input: BudgetInput): AxisBudget {
  const { axis, run, noiseArcsec } = input;
  const total = keptRms(input.errorArcsec, run.setAside);
  const variance = (change: Parameters<typeof replayAxis>[1]) =>
    keptRms(replayAxis(axis, change), run.setAside) ** 2;
  const now = variance({});
  const without = (change: Parameters<typeof replayAxis>[1]) => now - variance(change);
  const sizes: Record<BudgetPart, number> = {
    drift: without({ cured: ['drift'] }),
    'periodic error': without({ cured: ['periodic error'] }),
    'gusts and bumps': without({ cured: ['gusts and bumps'] }),
    backlash: axis.gapArcsec > 0 ? without({ cured: ['backlash'] }) : 0,
    'over-correction': axis.law.gain > 1 ? without({ gain: 1 }) : 0,
    'seeing floor': noiseArcsec === null ? 0 : noiseVariance(axis, run, noiseArcsec),
    unexplained: 0,
  };
  const whyMissing: AxisBudget['whyMissing'] = {};
  if (input.whyNoGap !== null) whyMissing.backlash = input.whyNoGap;
  if (noiseArcsec === null) whyMissing['seeing floor'] = 'The seeing floor is not known.';
  return { parts: shared(sizes, total), whyMissing };
}

/** Any seed will do: the same log must give the same budget. */
const NOISE_SEED = 1;

/** Parts cut to what is left in the order in which they are taken off. */
const TAKEN_OFF: readonly BudgetPart[] = [
  'drift',
  'periodic error',
  'gusts and bumps',
  'backlash',
  'seeing floor',
  'over-correction',
];

/**
 * Shares out of sizes of variances: none negative, adding up to 1, the rest unexplained.
 *
 * @param totalArcsec RMS about the mean that they are parts of.
 */
export function shared(sizes: Readonly<Record<BudgetPart, number>>, totalArcsec: number): Part[] {
  const total = totalArcsec ** 2;
  const shares: Partial<Record<BudgetPart, number>> = {};
  let left = 1;
  for (const part of TAKEN_OFF) {
    const share = total > 0 ? Math.min(left, Math.max(0, sizes[part] / total)) : 0;
    shares[part] = share;
    left -= share;
  }
  shares.unexplained = Math.max(0, left);
  return BUDGET_PARTS.map((part) => {
    const share = shares[part] ?? 0;
    return {
      part,
      share,
      rmsArcsec: totalArcsec * Math.sqrt(share),
      rmsIfCuredArcsec: totalArcsec * Math.sqrt(Math.max(0, 1 - share)),
    };
  });
}

/** What white noise brings into the loop: the smooth motion guided with it, less the same without. */
function noiseVariance(axis: ReplayableAxis, run: RunSeries, noiseArcsec: number): number {
  const random = RandomSource.forCause(NOISE_SEED, 'seeing floor');
  const change = { gain: Math.min(1, axis.law.gain) };
  const calm = { ...axis, starArcsec: axis.smoothStarArcsec };
  const noisy = {
    ...axis,
    starArcsec: axis.smoothStarArcsec.map((star) => star + noiseArcsec * random.normal()),
  };
  const squared = (each: ReplayableAxis) => keptRms(replayAxis(each, change), run.setAside) ** 2;
  return squared(noisy) - squared(calm);
}
