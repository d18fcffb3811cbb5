import { RADIANS_PER_DEGREE } from './earth-rotation';

const JULIAN_DAY_OF_2000 = 2451545;
const DAYS_PER_CENTURY = 36525;

export interface SunPosition {
  /** 0 up to but not 24. */
  readonly rightAscensionHours: number;
  readonly declinationDegrees: number;
}

/**
 * Apparent place of the sun to 0.01°: mean longitude L and mean anomaly M give the true longitude by the equation of the
 * centre C; nutation and aberration enter by the moon's node Ω.
 *
 *     L = 280.46646° + 36000.76983° T + 0.0003032° T²,   M = 357.52911° + 35999.05029° T − 0.0001537° T²
 *     λ = L + C − 0.00569° − 0.00478° sin Ω,   ε = 23.4392911° − 0.0130042° T + 0.00256° cos Ω
 *     tan α = cos ε tan λ,   sin δ = sin ε sin λ
 *
 * T in Julian centuries since 2000. Universal time serves for dynamical time: in a minute the sun moves 0.0007°. O(1).
 *
 * @see Meeus, Astronomical Algorithms, 2nd ed., ch. 25, "low accuracy".
 */
export function sunPosition(julianDay: number): SunPosition {
  const t = (julianDay - JULIAN_DAY_OF_2000) / DAYS_PER_CENTURY;
  const sine = (degrees: number) => Math.sin(degrees * RADIANS_PER_DEGREE);
  const meanLongitude = 280.46646 + 36000.76983 * t + 0.0003032 * t ** 2;
  const anomaly = 357.52911 + 35999.05029 * t - 0.0001537 * t ** 2;
  const centre =
    (1.914602 - 0.004817 * t - 0.000014 * t ** 2) * sine(anomaly) +
    (0.019993 - 0.000101 * t) * sine(2 * anomaly) +
    0.000289 * sine(3 * anomaly);
  const node = 125.04 - 1934.136 * t;
  const longitude = (meanLongitude + centre - 0.00569 - 0.00478 * sine(node)) * RADIANS_PER_DEGREE;
  const obliquity =
    (23.4392911 - 0.0130042 * t + 0.00256 * Math.cos(node * RADIANS_PER_DEGREE)) *
    RADIANS_PER_DEGREE;
  const rightAscension = Math.atan2(Math.cos(obliquity) * Math.sin(longitude), Math.cos(longitude));
  const hours = rightAscension / RADIANS_PER_DEGREE / 15;
  return {
    rightAscensionHours: (hours + 24) % 24,
    declinationDegrees: Math.asin(Math.sin(obliquity) * Math.sin(longitude)) / RADIANS_PER_DEGREE,
  };
}
