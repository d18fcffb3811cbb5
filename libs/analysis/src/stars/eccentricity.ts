/** Eccentricity of an ellipse of an aspect ratio (major / minor, at least 1): sqrt(1 − 1/aspect²). */
export function eccentricityOf(aspect: number): number {
  return Math.sqrt(1 - 1 / aspect ** 2);
}

/** Aspect ratio of an ellipse of an eccentricity (0 to below 1): 1 / sqrt(1 − e²). */
export function aspectOf(eccentricity: number): number {
  return 1 / Math.sqrt(1 - eccentricity ** 2);
}
