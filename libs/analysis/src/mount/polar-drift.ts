import { ARCSEC_PER_RADIAN } from '../optics/plate-scale';
import {
  RADIANS_PER_ARCMIN,
  RADIANS_PER_DEGREE,
  RADIANS_PER_HOUR,
  STAR_RATE_ARCSEC_PER_SECOND,
} from '../sky/earth-rotation';

/** Where the mount's polar axis points, measured from the pole. */
export interface PolarMisalignment {
  /** By how much the azimuth knob is off, east positive; on the sky it is this · cos(latitude). */
  readonly azimuthKnobArcmin: number;
  /** Up positive. */
  readonly altitudeArcmin: number;
}

export interface SkyPlace {
  readonly latitudeDegrees: number;
  readonly declinationDegrees: number;
  /** West positive. */
  readonly hourAngleHours: number;
}

/** Motion of the star in the mount's axes. */
export interface PolarDrift {
  /** On the sky, east positive. */
  readonly eastArcsecPerMinute: number;
  readonly northArcsecPerMinute: number;
  /** Of the field about a guide star that is held still; position angle, north through east. */
  readonly fieldRotationArcsecPerSecond: number;
}

/**
 * Drift that a polar axis off the pole causes, to first order in the misalignment:
 *
 *     east  = w sin δ (dA cos φ sin H − dh cos H)
 *     north = −w (dh sin H + dA cos φ cos H)
 *     field rotation = w (dA cos φ sin H − dh cos H) / cos δ
 *
 * South of the equator the axis looks at the south pole and every drift changes its sign.
 *
 * @see checks.json 4.1 to 4.8 (derived by rotation of vectors); M. Covington, Astrophotography for the
 *   Amateur, 2nd ed. 1999, appendix B.
 */
export function polarDrift(misalignment: PolarMisalignment, place: SkyPlace): PolarDrift {
  const { azimuth, altitude, latitude, declination, hourAngle } = inRadians(misalignment, place);
  const azimuthOnSky = azimuth * Math.cos(latitude);
  const about = azimuthOnSky * Math.sin(hourAngle) - altitude * Math.cos(hourAngle);
  const towards = altitude * Math.sin(hourAngle) + azimuthOnSky * Math.cos(hourAngle);
  return {
    eastArcsecPerMinute: 60 * STAR_RATE_ARCSEC_PER_SECOND * Math.sin(declination) * about,
    northArcsecPerMinute: -60 * STAR_RATE_ARCSEC_PER_SECOND * towards,
    fieldRotationArcsecPerSecond: (STAR_RATE_ARCSEC_PER_SECOND * about) / Math.cos(declination),
  };
}

/**
 * Displacement of the star in the mount's axes after a time of perfect tracking, without approximation: the star's
 * vector at both hour angles is expressed in axes tilted by dh about the east axis and then turned by dA about the
 * vertical, and the mount's own turn is taken off.
 *
 * @returns Arcseconds on the sky, east and north positive.
 * @see checks.json 4.2 (derived).
 */
export function polarDisplacement(
  misalignment: PolarMisalignment,
  place: SkyPlace,
  afterSeconds: number,
): { readonly eastArcsec: number; readonly northArcsec: number } {
  const { azimuth, altitude, latitude, declination, hourAngle } = inRadians(misalignment, place);
  const turn = (STAR_RATE_ARCSEC_PER_SECOND * afterSeconds) / ARCSEC_PER_RADIAN;
  const before = inMountAxes(hourAngle, declination, latitude, azimuth, altitude);
  const after = inMountAxes(hourAngle + turn, declination, latitude, azimuth, altitude);
  const slip = wrapped(after.hourAngle - before.hourAngle - turn);
  return {
    eastArcsec: -slip * Math.cos(before.declination) * ARCSEC_PER_RADIAN,
    northArcsec: (after.declination - before.declination) * ARCSEC_PER_RADIAN,
  };
}

/** The misalignment is that of the axis' northern end: south of the equator the other end is the one that is seen. */
function inRadians(misalignment: PolarMisalignment, place: SkyPlace) {
  const sign = place.latitudeDegrees < 0 ? -1 : 1;
  return {
    azimuth: sign * misalignment.azimuthKnobArcmin * RADIANS_PER_ARCMIN,
    altitude: sign * misalignment.altitudeArcmin * RADIANS_PER_ARCMIN,
    latitude: place.latitudeDegrees * RADIANS_PER_DEGREE,
    declination: place.declinationDegrees * RADIANS_PER_DEGREE,
    hourAngle: place.hourAngleHours * RADIANS_PER_HOUR,
  };
}

/** Axes of the sky: x to the equator on the meridian, y to the east, z to the north pole. */
function inMountAxes(
  hourAngle: number,
  declination: number,
  latitude: number,
  azimuth: number,
  altitude: number,
): { readonly hourAngle: number; readonly declination: number } {
  const x = Math.cos(declination) * Math.cos(hourAngle);
  const y = -Math.cos(declination) * Math.sin(hourAngle);
  const z = Math.sin(declination);
  // Undo the turn about the vertical (cos φ, 0, sin φ): split into the part along it and the level part.
  const up = x * Math.cos(latitude) + z * Math.sin(latitude);
  const level = z * Math.cos(latitude) - x * Math.sin(latitude);
  const levelTurned = level * Math.cos(azimuth) + y * Math.sin(azimuth);
  const yTurned = y * Math.cos(azimuth) - level * Math.sin(azimuth);
  const xTurned = up * Math.cos(latitude) - levelTurned * Math.sin(latitude);
  const zTurned = up * Math.sin(latitude) + levelTurned * Math.cos(latitude);
  // Undo the tilt about the east axis.
  const xMount = xTurned * Math.cos(altitude) - zTurned * Math.sin(altitude);
  const zMount = zTurned * Math.cos(altitude) + xTurned * Math.sin(altitude);
  return { hourAngle: Math.atan2(-yTurned, xMount), declination: Math.asin(zMount) };
}

function wrapped(angle: number): number {
  return angle - 2 * Math.PI * Math.round(angle / (2 * Math.PI));
}
