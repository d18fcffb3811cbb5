import { type RunSeries } from '../series/run-series';
import { keptRms, replayAxis, type ReplayableAxis } from './replay';

export interface GainCurve {
  readonly points: readonly { readonly gain: number; readonly rmsArcsec: number }[];
  /** Of the lowest point. */
  readonly bestGain: number;
  readonly bestRmsArcsec: number;
}

const LOWEST_GAIN = 0.1;
const HIGHEST_GAIN = 1.5;
const STEP = 0.1;

/**
 * RMS of one axis against the gain, everything else as it was: the night guided again at gains from 0.1 to 1.5. The error
 * measured in a frame holds seeing that the correction has not seen yet, so the gain that is best for it is best for the
 * stars too. O(n) a point.
 */
export function gainCurve(axis: ReplayableAxis, run: RunSeries): GainCurve {
  const steps = Math.round((HIGHEST_GAIN - LOWEST_GAIN) / STEP);
  const points = Array.from({ length: steps + 1 }, (_, step) => {
    const gain = (Math.round(LOWEST_GAIN / STEP) + step) * STEP;
    return { gain, rmsArcsec: keptRms(replayAxis(axis, { gain }), run.setAside) };
  });
  const best = points.reduce((least, point) => (point.rmsArcsec < least.rmsArcsec ? point : least));
  return { points, bestGain: best.gain, bestRmsArcsec: best.rmsArcsec };
}
