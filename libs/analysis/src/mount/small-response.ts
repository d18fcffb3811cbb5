import { type RunSeries } from '../series/run-series';
import { quantile } from '../statistics/quantile';
import { likeliestWalk } from './likeliest-walk';
import { motionFrames, summedBefore } from './motion-frames';
import { type MountMotion } from './mount-motion';
import { trendColumns } from './play-profile';
import { whitenedLeastSquares } from './whitened-least-squares';

export interface SmallResponse {
  /** Motion of the star per commanded arcsec by the smaller half of the corrections, over that by the larger half. */
  readonly ratio: number;
  readonly standardError: number;
}

const FEWEST_MOVES = 60;

/**
 * Whether small Dec corrections do as much for their size as large ones, behind the gap where one is known: friction that
 * holds an axis lets small ones through as nothing. Both responses are fitted over a wandering level. O(n).
 *
 * @returns null with fewer than 60 moves, or when the large ones do not show.
 */
export function smallResponse(run: RunSeries, { dec }: MountMotion): SmallResponse | null {
  const { displacementArcsec } = dec;
  if (displacementArcsec === null) return null;
  const sizes = displacementArcsec.filter((move) => move !== 0).map(Math.abs);
  if (sizes.length < FEWEST_MOVES) return null;
  const middle = quantile(sizes, 0.5);
  const small = displacementArcsec.map((move) => (Math.abs(move) <= middle ? move : 0));
  const large = displacementArcsec.map((move) => (Math.abs(move) > middle ? move : 0));
  const columns = [summedBefore(small), summedBefore(large), ...trendColumns(run.timeSeconds)];
  const frames = motionFrames(run, run.decErrorArcsec);
  const walk = likeliestWalk(frames, columns, run.decErrorArcsec);
  const { coefficients, covariance } = whitenedLeastSquares(
    frames,
    walk,
    columns,
    run.decErrorArcsec,
  );
  const [ofSmall = 0, ofLarge = 0] = coefficients;
  const errorOfSmall = Math.sqrt(covariance[0] ?? NaN);
  const errorOfLarge = Math.sqrt(covariance[columns.length + 1] ?? NaN);
  if (!(ofLarge > 3 * errorOfLarge) || !(errorOfSmall > 0)) return null;
  const ratio = ofSmall / ofLarge;
  return { ratio, standardError: Math.hypot(errorOfSmall, ratio * errorOfLarge) / ofLarge };
}
