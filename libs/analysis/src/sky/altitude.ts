import { RADIANS_PER_DEGREE, RADIANS_PER_HOUR } from './earth-rotation';

/**
 * Geometric altitude of a star, without refraction:
 *
 *     sin h = sin φ sin δ + cos φ cos δ cos H
 *
 * @param hourAngleHours West of the meridian positive.
 * @returns Degrees above the horizon, -90 to 90.
 * @see Meeus, Astronomical Algorithms, 2nd ed., (13.6).
 */
export function altitudeDegrees(
  latitudeDegrees: number,
  declinationDegrees: number,
  hourAngleHours: number,
): number {
  const latitude = latitudeDegrees * RADIANS_PER_DEGREE;
  const declination = declinationDegrees * RADIANS_PER_DEGREE;
  const sine =
    Math.sin(latitude) * Math.sin(declination) +
    Math.cos(latitude) * Math.cos(declination) * Math.cos(hourAngleHours * RADIANS_PER_HOUR);
  return Math.asin(Math.min(1, Math.max(-1, sine))) / RADIANS_PER_DEGREE;
}
