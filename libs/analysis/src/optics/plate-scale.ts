/** 648000 / π. */
export const ARCSEC_PER_RADIAN = 206264.80624709636;

/**
 * What one pixel covers on the sky, in arcseconds: 206.264806 · pixel[µm] · binning / focal length[mm].
 * Plane geometry; the exact angle of a pixel on the axis differs by 3e-11.
 */
export function plateScaleArcsecPerPx(
  pixelUm: number,
  binning: number,
  focalLengthMm: number,
): number {
  return (ARCSEC_PER_RADIAN / 1000) * ((pixelUm * binning) / focalLengthMm);
}

/** How many imaging pixels one guide pixel covers. */
export function scaleRatio(guideScaleArcsecPerPx: number, imagingScaleArcsecPerPx: number): number {
  return guideScaleArcsecPerPx / imagingScaleArcsecPerPx;
}

/** Guide focal length over imaging focal length. */
export function focalLengthRatio(guideFocalMm: number, imagingFocalMm: number): number {
  return guideFocalMm / imagingFocalMm;
}

/** How many imaging pixels lie across the seeing disc (full width at half maximum). */
export function seeingSamplingPx(
  seeingFwhmArcsec: number,
  imagingScaleArcsecPerPx: number,
): number {
  return seeingFwhmArcsec / imagingScaleArcsecPerPx;
}
