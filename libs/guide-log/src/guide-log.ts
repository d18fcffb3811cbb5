/** Side of the pier as a code in `LogFrames.pierSide`: 0 unknown, 1 east, 2 west. */
export const PIER_SIDES = ['unknown', 'east', 'west'] as const;

/**
 * One guide log as columns, a value a frame in the order of the file. Every array has `count` entries; a column
 * that the file does not have is null; a missing number is NaN. This is the shape that libs/analysis takes;
 * neither library imports the other.
 */
export interface LogFrames {
  readonly count: number;
  /** Seconds since the first frame of the log. */
  readonly timeSeconds: Float64Array;
  /** Instant of `timeSeconds = 0` as seconds since 1970-01-01T00:00Z, or null when the log tells no instant. */
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
  /** Index into `runNames` and `targetNames`; -1 where the cell is blank. */
  readonly run: Int32Array | null;
  readonly runNames: readonly string[];
  readonly target: Int32Array | null;
  readonly targetNames: readonly string[];
  readonly declinationDegrees: Float64Array | null;
  readonly hourAngleHours: Float64Array | null;
  /** Index into PIER_SIDES. */
  readonly pierSide: Uint8Array | null;
}

/** What was read and what was not: the `reading` part of the analysis document. */
export interface Reading {
  /** Physical lines; an empty last one is not counted. */
  lines: number;
  frames: number;
  refusedCount: number;
  /** The first 200. */
  refused: { line: number; reason: string }[];
  delimiter: string;
  decimal: string;
  encoding: string;
  /** 1-based; null for a file without a header. */
  headerLine: number | null;
  /** Header text by role; with no header the column's 1-based number as text. */
  columns: Record<string, string>;
  warnings: string[];
}

/** Where every physical line went: `lines` is the sum of the other five, always. */
export interface LineCounts {
  readonly lines: number;
  /** The header, what stands above it, and the same header again further down. */
  readonly header: number;
  /** Comments, and the further lines of a quoted cell that runs over several. */
  readonly comment: number;
  readonly frames: number;
  readonly refused: number;
  readonly blank: number;
}

export interface GuideLog {
  readonly frames: LogFrames;
  readonly reading: Reading;
  readonly lineCounts: LineCounts;
}
