import { ARCSEC_PER_RADIAN } from '../optics/plate-scale';
import {
  RADIANS_PER_DEGREE,
  RADIANS_PER_HOUR,
  STAR_RATE_ARCSEC_PER_SECOND,
} from '../sky/earth-rotation';
import { type SkyPlace } from './polar-drift';

/** Refraction of R0 · tan z at 1010 hPa, 10 °C and 0.55 µm (ERFA refco run for checks.json 5.2). */
export const REFRACTION_CONSTANT_ARCSEC = 58.070483601357815;

/** sin 5°: lower down R0 · tan z no longer holds. */
const LOWEST_COS_ZENITH = 0.0871557427476582;

export interface RefractionDrift {
  /** By how much the hour angle of the lifted star runs faster than the sky, as a part of the rate. */
  readonly hourAngleRateFraction: number;
  /** On the sky, east positive: the star falls behind a sidereal drive. */
  readonly eastArcsecPerMinute: number;
  readonly northArcsecPerMinute: number;
}

/**
 * Drift of a star through refraction R0 tan z, for a mount that turns at the star rate about the pole.
 * With cos z = sin φ sin δ + cos φ cos δ cos H:
 *
 *     dH'/dH − 1 = −R0 (cos φ / cos δ) (cos φ cos δ + sin φ sin δ cos H) / cos² z
 *     north rate =  w R0 d/dH [ (sin φ cos δ − cos φ sin δ cos H) / cos z ]
 *
 * About the refracted pole, on which an axis stands that was aligned by drifting stars near it, the fraction gains
 * R0 cot φ tan δ cos H and the north rate loses w R0 cot φ sin H.
 *
 * @returns null at or below 5° of altitude, where R0 tan z no longer holds.
 * @see checks.json 5.3 to 5.5 (derived to first order in R0).
 */
export function refractionDrift(
  place: SkyPlace,
  axisOn: 'true pole' | 'refracted pole',
): RefractionDrift | null {
  const latitude = place.latitudeDegrees * RADIANS_PER_DEGREE;
  const declination = place.declinationDegrees * RADIANS_PER_DEGREE;
  const hourAngle = place.hourAngleHours * RADIANS_PER_HOUR;
  const sine = Math.sin(latitude);
  const cosine = Math.cos(latitude);
  const cosZenith =
    sine * Math.sin(declination) + cosine * Math.cos(declination) * Math.cos(hourAngle);
  if (cosZenith <= LOWEST_COS_ZENITH) return null;

  const bend = REFRACTION_CONSTANT_ARCSEC / ARCSEC_PER_RADIAN;
  const overPole =
    sine * Math.cos(declination) - cosine * Math.sin(declination) * Math.cos(hourAngle);
  let fraction =
    (-bend *
      (cosine / Math.cos(declination)) *
      (cosine * Math.cos(declination) + sine * Math.sin(declination) * Math.cos(hourAngle))) /
    cosZenith ** 2;
  // The quotient's derivative by H: numerator' = cos φ sin δ sin H, denominator' = −cos φ cos δ sin H.
  let north =
    bend *
    cosine *
    Math.sin(hourAngle) *
    (Math.sin(declination) / cosZenith + (overPole * Math.cos(declination)) / cosZenith ** 2);
  if (axisOn === 'refracted pole') {
    const lift = (bend * cosine) / sine;
    fraction += lift * Math.tan(declination) * Math.cos(hourAngle);
    north -= lift * Math.sin(hourAngle);
  }
  const ratePerMinute = 60 * STAR_RATE_ARCSEC_PER_SECOND;
  return {
    hourAngleRateFraction: fraction,
    eastArcsecPerMinute: -fraction * Math.cos(declination) * ratePerMinute,
    northArcsecPerMinute: north * ratePerMinute,
  };
}
