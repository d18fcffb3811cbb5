/** What a frame's state column said; the order is the code stored in `LogFrames.state`. */
export const FRAME_STATES = ['guiding', 'dither', 'settling', 'star lost', 'ignore'] as const;
export type FrameState = (typeof FRAME_STATES)[number];

/** Side of the pier as a code in `LogFrames.pierSide`: 0 unknown, 1 east, 2 west. */
export const PIER_SIDES = ['unknown', 'east', 'west'] as const;

/**
 * One guide log as columns, a value a frame in the order of the file. Every array has `count` entries; a column
 * that the file does not have is null; a missing number is NaN. The reader of logs (libs/guide-log) makes this
 * shape, the analysis takes it: neither imports the other.
 */
export interface LogFrames {
  readonly count: number;
  /** Seconds since the first frame of the log. */
  readonly timeSeconds: Float64Array;
  /** Instant of `timeSeconds = 0` as seconds since 1970-01-01T00:00Z, or null when the log tells no date. */
  readonly startEpochSeconds: number | null;
  /** Displacement of the guide star from the lock position; NaN where no star was measured. */
  readonly raError: Float64Array;
  readonly decError: Float64Array;
  readonly errorUnit: 'arcsec' | 'guide px';
  /** Signed correction given after the frame; NaN or 0 for none. */
  readonly raCorrection: Float64Array | null;
  readonly decCorrection: Float64Array | null;
  readonly correctionUnit: 'ms' | 'arcsec';
  /** The map's word on the sign: does a correction of +1 move the star towards +error? null: not said. */
  readonly correctionSign: 'same' | 'opposite' | null;
  readonly snr: Float64Array | null;
  readonly brightness: Float64Array | null;
  /** Index into FRAME_STATES. */
  readonly state: Uint8Array | null;
  /** Index into `runNames` and `targetNames`. */
  readonly run: Int32Array | null;
  readonly runNames: readonly string[];
  readonly target: Int32Array | null;
  readonly targetNames: readonly string[];
  readonly declinationDegrees: Float64Array | null;
  readonly hourAngleHours: Float64Array | null;
  /** Index into PIER_SIDES. */
  readonly pierSide: Uint8Array | null;
}
