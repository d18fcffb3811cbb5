/**
 * Hour angle of a star: local sidereal time less right ascension, west positive.
 *
 * @param longitudeDegrees East of Greenwich positive.
 * @returns Hours, above -12 up to 12.
 */
export function hourAngleHours(
  greenwichSiderealHours: number,
  longitudeDegrees: number,
  rightAscensionHours: number,
): number {
  const hours = greenwichSiderealHours + longitudeDegrees / 15 - rightAscensionHours;
  const turned = ((hours % 24) + 24) % 24;
  return turned > 12 ? turned - 24 : turned;
}
