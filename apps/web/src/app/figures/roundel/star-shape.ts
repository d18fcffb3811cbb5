/** The predicted star, as the analysis gives it. */
export interface StarShape {
  readonly fwhmMajorArcsec: number;
  readonly fwhmMinorArcsec: number;
  readonly aspect: number;
  /** Of the long axis, from +Dec towards +RA. */
  readonly positionAngleDegrees: number;
}

/** Angle of the long axis from RA towards Dec, in (−90, 90]. */
export function angleFromRaDegrees(positionAngleDegrees: number): number {
  const turned = (((90 - positionAngleDegrees) % 180) + 180) % 180;
  return turned > 90 ? turned - 180 : turned;
}

const SMALLEST_HALF_WIDTH_ARCSEC = 2;

/** One half width for all roundels of a view: 2″, or enough for the largest star to leave a tenth free. */
export function roundelHalfWidthArcsec(stars: readonly StarShape[]): number {
  const longest = Math.max(0, ...stars.map((star) => star.fwhmMajorArcsec));
  return Math.max(SMALLEST_HALF_WIDTH_ARCSEC, Math.ceil(((1.1 * longest) / 2) * 10) / 10);
}
