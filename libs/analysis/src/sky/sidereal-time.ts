const JULIAN_DAY_OF_1970 = 2440587.5;
const JULIAN_DAY_OF_2000 = 2451545;
const SECONDS_PER_DAY = 86400;
const DAYS_PER_CENTURY = 36525;

/** Julian day of an instant in seconds since 1970-01-01T00:00Z (by definition: checks.json 10.1e). */
export function julianDay(epochSeconds: number): number {
  return epochSeconds / SECONDS_PER_DAY + JULIAN_DAY_OF_1970;
}

/**
 * Mean sidereal time at Greenwich,
 *
 *     θ = 280.46061837° + 360.98564736629° (JD − 2451545) + 0.000387933° T² − T³ / 38710000,
 *
 * T in Julian centuries since 2000. Universal time is taken for UTC: they differ by less than 0.9 s.
 *
 * @returns Hours, 0 up to but not 24.
 * @see Meeus, Astronomical Algorithms, 2nd ed., (12.4); IAU 1982.
 */
export function greenwichSiderealHours(julianDay: number): number {
  const days = julianDay - JULIAN_DAY_OF_2000;
  const centuries = days / DAYS_PER_CENTURY;
  const degrees =
    280.46061837 +
    360.98564736629 * days +
    0.000387933 * centuries ** 2 -
    centuries ** 3 / 38710000;
  return (((degrees % 360) + 360) % 360) / 15;
}
