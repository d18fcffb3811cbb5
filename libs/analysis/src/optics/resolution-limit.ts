import { ARCSEC_PER_RADIAN } from './plate-scale';

/** First zero of the Bessel function J₁, over π: the radius of the first dark ring in units of λ/D. */
const FIRST_DARK_RING = 1.2196698912665045;

/** The wavelength that resolution limits are stated for: the middle of visible light. */
export const VISIBLE_WAVELENGTH_NM = 550;

/**
 * Dawes' limit in arcseconds: the closest double star of two equal parts that an eye could part, 116 / D[mm].
 *
 * @see W. R. Dawes, Mem. R. Astron. Soc. 35 (1867) 137.
 */
export function dawesArcsec(apertureMm: number): number {
  return 116 / apertureMm;
}

/**
 * Rayleigh's limit in arcseconds: one star's centre on the other's first dark ring, 1.21967 λ / D. Fraunhofer
 * diffraction at a round opening.
 */
export function rayleighArcsec(apertureMm: number, wavelengthNm: number): number {
  return (FIRST_DARK_RING * wavelengthNm * 1e-6 * ARCSEC_PER_RADIAN) / apertureMm;
}
