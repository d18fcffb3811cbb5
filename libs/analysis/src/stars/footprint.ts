import { type Footprint } from '../analysis-document';
import { eccentricityOf } from './eccentricity';

/** Full width at half maximum of a Gaussian over its standard deviation: sqrt(8 ln 2). */
export const FWHM_PER_SIGMA = Math.sqrt(8 * Math.LN2);

const DEGREES_PER_RADIAN = 180 / Math.PI;
const HALF_TURN_DEGREES = 180;

/** Spread of the guide error on the sky, in arcseconds². */
export interface ErrorCovariance {
  readonly east: number;
  readonly north: number;
  /** Of east with north. */
  readonly cross: number;
}

/**
 * The star that the imaging camera would see, predicted from guide data alone: a seeing disc blurred by the guide
 * error, both taken as Gaussian, so that their covariances add. The widths lie along the eigenvectors:
 *
 *     λ = (E + N)/2 ± hypot((E − N)/2, EN),   FWHM = sqrt(8 ln 2 · λ + seeing²),
 *     position angle = ½ atan2(2 EN, N − E)
 *
 * @param seeingFwhmArcsec Long-exposure star size without guide error, above 0.
 */
export function starFootprint(covariance: ErrorCovariance, seeingFwhmArcsec: number): Footprint {
  const { east, north, cross } = covariance;
  const middle = (east + north) / 2;
  const apart = Math.hypot((east - north) / 2, cross);
  const fwhm = (variance: number): number =>
    Math.hypot(FWHM_PER_SIGMA * Math.sqrt(Math.max(0, variance)), seeingFwhmArcsec);
  const fwhmMajorArcsec = fwhm(middle + apart);
  const fwhmMinorArcsec = fwhm(middle - apart);
  const aspect = fwhmMajorArcsec / fwhmMinorArcsec;
  const angle = (Math.atan2(2 * cross, north - east) / 2) * DEGREES_PER_RADIAN;
  return {
    fwhmMajorArcsec,
    fwhmMinorArcsec,
    aspect,
    eccentricity: eccentricityOf(aspect),
    positionAngleDegrees: angle < 0 ? angle + HALF_TURN_DEGREES : angle,
  };
}
