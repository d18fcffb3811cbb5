import { RADIANS_PER_DEGREE, RADIANS_PER_HOUR } from './earth-rotation';

/**
 * Angle at the star between the pole and the zenith,
 *
 *     tan q = sin H / (tan φ cos δ − sin δ cos H),
 *
 * positive west of the meridian: the direction in which refraction lifts a star.
 *
 * @returns Degrees, -180 to 180.
 * @see Meeus, Astronomical Algorithms, 2nd ed., (14.1).
 */
export function parallacticAngleDegrees(
  latitudeDegrees: number,
  declinationDegrees: number,
  hourAngleHours: number,
): number {
  const latitude = latitudeDegrees * RADIANS_PER_DEGREE;
  const declination = declinationDegrees * RADIANS_PER_DEGREE;
  const hourAngle = hourAngleHours * RADIANS_PER_HOUR;
  // Both terms times cos φ: the same quotient, finite at the poles too.
  const across = Math.cos(latitude) * Math.sin(hourAngle);
  const along =
    Math.sin(latitude) * Math.cos(declination) -
    Math.cos(latitude) * Math.sin(declination) * Math.cos(hourAngle);
  return Math.atan2(across, along) / RADIANS_PER_DEGREE;
}
