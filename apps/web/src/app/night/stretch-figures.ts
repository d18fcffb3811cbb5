import { populationDeviation } from '@stillpier/analysis';
import type { RunStretch } from '../api/run-stretch';
import type { SecondsRange } from '../figures/trace-chart/trace-stretch';

/** The guide error of a chosen stretch, over its frames that count. */
export interface StretchFigures {
  readonly frames: number;
  readonly used: number;
  /** About the mean of the stretch; null for both axes when no frame counts. */
  readonly raRmsArcsec: number | null;
  readonly decRmsArcsec: number | null;
  readonly totalRmsArcsec: number | null;
}

/** @param frames Every frame of the run; `toSeconds` is left out, as where frames are set aside by hand. */
export function stretchFigures(
  { timeSeconds, ra, dec, setAside }: RunStretch,
  { fromSeconds, toSeconds }: SecondsRange,
): StretchFigures {
  const within = [...timeSeconds.keys()].filter((index) => {
    const seconds = timeSeconds[index] ?? NaN;
    return seconds >= fromSeconds && seconds < toSeconds;
  });
  const kept = within.filter((index) => setAside[index] === 0);
  const counts = { frames: within.length, used: kept.length };
  if (kept.length === 0) {
    return { ...counts, raRmsArcsec: null, decRmsArcsec: null, totalRmsArcsec: null };
  }
  const rms = ({ leastArcsec }: RunStretch['ra']): number =>
    populationDeviation(kept.map((index) => leastArcsec[index] ?? NaN));
  const [raRmsArcsec, decRmsArcsec] = [rms(ra), rms(dec)];
  return {
    ...counts,
    raRmsArcsec,
    decRmsArcsec,
    totalRmsArcsec: Math.hypot(raRmsArcsec, decRmsArcsec),
  };
}
