import { type Subs } from '../analysis-document';
import { type RunSeries, SET_ASIDE_CODES } from '../series/run-series';
import { at } from '../statistics/at';
import { covariance } from '../statistics/pearson';
import { pick } from '../statistics/pick';
import { type ErrorCovariance, starFootprint } from './footprint';

/** A sub without frames for so long is not a sub: nobody knows what the star did. */
const LONGEST_GAP_SECONDS = 60;
/** With fewer frames than this the chance of the frames themselves makes a star look long. */
const FEW_FRAMES = 40;
/** Fewer frames than this tell no shape. */
const FEWEST_FRAMES = 3;

const DITHER = SET_ASIDE_CODES.indexOf('dither');
const SETTLING = SET_ASIDE_CODES.indexOf('settling');

/** What a forecast needs of a run: all its frames, as in `RunSeries`. */
export type SubFrames = Pick<
  RunSeries,
  'count' | 'timeSeconds' | 'cadenceSeconds' | 'raErrorArcsec' | 'decErrorArcsec' | 'setAside'
>;

/**
 * The run cut into consecutive subs of one length, and the star's aspect in each. A sub starts at the first frame
 * that counts; a dither or settling frame, or a gap of over 60 s between frames that count, ends what has begun, and
 * a sub that has not reached its length by then is none. O(n).
 *
 * @param lengthSeconds Above 0.
 * @param keepAspect Largest aspect ratio that the owner keeps.
 */
export function subForecast(
  series: SubFrames,
  lengthSeconds: number,
  seeingFwhmArcsec: number,
  keepAspect: number,
): Subs {
  const aspects: number[] = [];
  const startsSeconds: number[] = [];
  for (const frames of cutSubs(series, lengthSeconds)) {
    if (frames.length < FEWEST_FRAMES) continue;
    const spread = errorCovariance(series, frames);
    aspects.push(starFootprint(spread, seeingFwhmArcsec).aspect);
    startsSeconds.push(at(series.timeSeconds, frames[0] ?? 0));
  }
  return {
    lengthSeconds,
    keepAspect,
    count: aspects.length,
    within: aspects.filter((aspect) => aspect <= keepAspect).length,
    aspects,
    startsSeconds,
  };
}

/** The frames that count of each whole sub. A frame stands for the cadence that follows it. */
function cutSubs(series: SubFrames, lengthSeconds: number): number[][] {
  const { timeSeconds, setAside, cadenceSeconds, count } = series;
  // Frames seldom fall on the very second on which a sub ends: half a cadence is granted.
  const wholeFrom = lengthSeconds - cadenceSeconds / 2;
  const subs: number[][] = [];
  let current: number[] = [];
  for (let i = 0; i < count; i++) {
    const code = at(setAside, i);
    const time = at(timeSeconds, i);
    if (code === DITHER || code === SETTLING) current = [];
    if (code !== 0) continue;
    const before = current.at(-1);
    if (before !== undefined && time - at(timeSeconds, before) > LONGEST_GAP_SECONDS) current = [];
    current.push(i);
    if (time + cadenceSeconds - at(timeSeconds, current[0] ?? i) < wholeFrom) continue;
    subs.push(current);
    current = [];
  }
  return subs;
}

/**
 * Covariance of a sub's errors. Few frames make any covariance look long by chance: below 40 of them the expected
 * square of that chance, (E² + N²)/(2m) + (E·N + EN²)/m with m = n − 1, is taken off the square of the elongation
 * (the sampling variances of a Gaussian's covariance).
 */
function errorCovariance(series: SubFrames, frames: readonly number[]): ErrorCovariance {
  const ra = pick(series.raErrorArcsec, frames);
  const dec = pick(series.decErrorArcsec, frames);
  const east = covariance(ra, ra);
  const north = covariance(dec, dec);
  const cross = covariance(ra, dec);
  if (frames.length >= FEW_FRAMES) return { east, north, cross };
  const m = frames.length - 1;
  const chance = (east ** 2 + north ** 2) / (2 * m) + (east * north + cross ** 2) / m;
  const squared = ((east - north) / 2) ** 2 + cross ** 2;
  const kept = squared > chance ? Math.sqrt(1 - chance / squared) : 0;
  const middle = (east + north) / 2;
  const half = (kept * (east - north)) / 2;
  return { east: middle + half, north: middle - half, cross: kept * cross };
}
