/** The part of a guide pixel that a guide camera tells a star's place to. Common practice, no source. */
export const USUAL_CENTROID_FRACTION_PX = 0.1;

/** The part of an imaging pixel that the guide error which the camera can see must stay under. Common practice. */
export const WANTED_ERROR_IMAGING_PX = 1 / 3;

export interface GuideScaleLimit {
  /** Largest guide / imaging scale ratio at which the error stays under `WANTED_ERROR_IMAGING_PX`. */
  readonly largestScaleRatio: number;
  /** The smallest error that the guide camera can see, in imaging pixels. */
  readonly seenErrorImagingPx: number;
  /** Whether this setup is there: its ratio is not above the largest. */
  readonly staysUnder: boolean;
}

/**
 * How coarse a guide scale may be. A guide camera tells a star's place to a fraction f of its own pixel; seen by
 * the imaging camera that is f · (guide scale / imaging scale) pixels, which stays under a third of a pixel up to a
 * scale ratio of 1 / (3 f).
 *
 * @param setupScaleRatio Guide scale / imaging scale.
 * @param centroidFractionPx f, in guide pixels; see `USUAL_CENTROID_FRACTION_PX`.
 */
export function guideScaleLimit(
  setupScaleRatio: number,
  centroidFractionPx: number,
): GuideScaleLimit {
  const largestScaleRatio = WANTED_ERROR_IMAGING_PX / centroidFractionPx;
  return {
    largestScaleRatio,
    seenErrorImagingPx: setupScaleRatio * centroidFractionPx,
    staysUnder: setupScaleRatio <= largestScaleRatio,
  };
}
