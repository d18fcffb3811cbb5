/** How fast a star of fixed place crosses the sky: one turn in a stellar day of 86164.0989037 s (checks.json 3.4b). */
export const STAR_RATE_ARCSEC_PER_SECOND = 1296000 / 86164.0989036905;

export const RADIANS_PER_DEGREE = Math.PI / 180;
export const RADIANS_PER_HOUR = Math.PI / 12;
export const RADIANS_PER_ARCMIN = Math.PI / 10800;

/**
 * Drift of a star in arcsec per minute that one arcminute between the mount's axis and the pole causes at most:
 * star rate · 60 s · 1 arcmin in radians = 0.2625 (checks.json 4.3a).
 */
export const LARGEST_POLAR_DRIFT_PER_ARCMIN = STAR_RATE_ARCSEC_PER_SECOND * 60 * RADIANS_PER_ARCMIN;
