import { type Footprint, type Subs } from '../analysis-document';
import { type RunSeries } from '../series/run-series';
import { usedFrames } from '../series/used-frames';
import { starFootprint } from '../stars/footprint';
import { subForecast } from '../stars/sub-forecast';
import { covariance } from '../statistics/pearson';
import { populationDeviation } from '../statistics/deviation';
import { REPLAY_ASSUMPTIONS, type ReplayableAxes, type ReplayChange, replayedRun } from './replay';

export interface ReplayedNight {
  readonly raRmsArcsec: number;
  readonly decRmsArcsec: number;
  readonly totalRmsArcsec: number;
  /** null where the seeing is not known. */
  readonly footprint: Footprint | null;
  readonly subs: Subs | null;
  readonly assumptions: readonly string[];
}

export interface ReplayStars {
  readonly seeingFwhmArcsec: number | undefined;
  readonly subSeconds: number;
  readonly keepAspect: number;
}

/** What a run would have been with other settings or a cured mount: RMS, star shape, subs. O(n). */
export function replayNight(
  run: RunSeries,
  axes: ReplayableAxes,
  change: { readonly ra: ReplayChange; readonly dec: ReplayChange },
  stars: ReplayStars,
): ReplayedNight {
  const replayed = replayedRun(run, axes, change);
  const { raErrorArcsec: ra, decErrorArcsec: dec } = usedFrames(replayed);
  const raRmsArcsec = populationDeviation(ra);
  const decRmsArcsec = populationDeviation(dec);
  const spread = {
    east: covariance(ra, ra),
    north: covariance(dec, dec),
    cross: covariance(ra, dec),
  };
  const { seeingFwhmArcsec: seeing, subSeconds, keepAspect } = stars;
  return {
    raRmsArcsec,
    decRmsArcsec,
    totalRmsArcsec: Math.hypot(raRmsArcsec, decRmsArcsec),
    footprint: seeing === undefined ? null : starFootprint(spread, seeing),
    subs: seeing === undefined ? null : subForecast(replayed, subSeconds, seeing, keepAspect),
    assumptions: REPLAY_ASSUMPTIONS,
  };
}
