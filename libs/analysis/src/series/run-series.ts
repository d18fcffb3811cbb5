/** Why a frame is set aside; the index is the code in `RunSeries.setAside` (0: kept). */
export const SET_ASIDE_CODES = ['kept', 'dither', 'settling', 'star lost', 'by hand'] as const;

/**
 * One run, ready for measuring: all its frames, set aside or not, in arcseconds on the sky.
 * Every array has `count` entries; all times are seconds since the run's first frame.
 */
export interface RunSeries {
  readonly count: number;
  readonly timeSeconds: Float64Array;
  /** Median spacing of the frames. */
  readonly cadenceSeconds: number;
  /** East / north positive as logged; NaN where no star was measured. */
  readonly raErrorArcsec: Float64Array;
  readonly decErrorArcsec: Float64Array;
  /** As logged, in `correctionUnit`, no NaN (0 for none); null when the log has none. */
  readonly raCorrection: Float64Array | null;
  readonly decCorrection: Float64Array | null;
  readonly correctionUnit: 'ms' | 'arcsec';
  readonly correctionSign: 'same' | 'opposite' | null;
  /** Index into SET_ASIDE_CODES; 0 = the frame counts in the figures. */
  readonly setAside: Uint8Array;
  /** Frames at which a dither jump arrives, ascending: the first frame at the new place. */
  readonly ditherFrames: readonly number[];
  readonly declinationDegrees: number | null;
  readonly hourAngleHours: Float64Array | null;
  readonly pierSide: 'east' | 'west' | null;
  readonly startEpochSeconds: number | null;
  readonly target: string | null;
}
