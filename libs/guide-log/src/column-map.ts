/** What a column can be; the labels that people read are the client's. */
export const COLUMN_ROLES = [
  'time',
  'date',
  'raError',
  'decError',
  'xError',
  'yError',
  'raCorrection',
  'decCorrection',
  'raDirection',
  'decDirection',
  'snr',
  'brightness',
  'state',
  'run',
  'target',
  'declination',
  'hourAngle',
  'pierSide',
  'ignore',
] as const;
export type ColumnRole = (typeof COLUMN_ROLES)[number];

export const TIME_UNITS = [
  'seconds',
  'milliseconds',
  'iso',
  'epoch seconds',
  'epoch milliseconds',
  'clock',
] as const;
export type TimeUnit = (typeof TIME_UNITS)[number];

export const COLUMN_UNITS = [
  ...TIME_UNITS,
  'arcsec',
  'guide px',
  'ms',
  'degrees',
  'hours',
  'E/W',
  'N/S',
  '+/-',
] as const;
export type ColumnUnit = (typeof COLUMN_UNITS)[number];

/** The units that a role can have; of two recognised columns for one role the earlier unit is read. */
export const UNITS_OF_ROLE: Readonly<Record<ColumnRole, readonly ColumnUnit[]>> = {
  time: TIME_UNITS,
  date: [],
  raError: ['arcsec', 'guide px'],
  decError: ['arcsec', 'guide px'],
  xError: ['arcsec', 'guide px'],
  yError: ['arcsec', 'guide px'],
  raCorrection: ['ms', 'arcsec'],
  decCorrection: ['ms', 'arcsec'],
  raDirection: ['E/W', '+/-'],
  decDirection: ['N/S', '+/-'],
  snr: [],
  brightness: [],
  state: [],
  run: [],
  target: [],
  declination: ['degrees'],
  hourAngle: ['hours'],
  pierSide: [],
  ignore: [],
};

/** Roles whose unit says nothing new: one unit only, or letters that explain themselves. */
export const UNIT_MAY_BE_LEFT_OUT: readonly ColumnRole[] = [
  'declination',
  'hourAngle',
  'raDirection',
  'decDirection',
];

export interface ColumnUse {
  readonly role: ColumnRole;
  readonly unit?: ColumnUnit | undefined;
  /**
   * Cells of a column of numbers that mean "no value", as a blank does: `["-1", "n/a"]`. A number stands for every way
   * of writing it. Nothing but blank and NaN is one unless the map says so: what is -1 here is a measurement there.
   */
  readonly sentinels?: readonly string[] | undefined;
}

/** Which part of a date stands first where the year stands last: `14/03/2026`, `03/14/2026`. */
export const DATE_ORDERS = ['day-month-year', 'month-day-year'] as const;
export type DateOrder = (typeof DATE_ORDERS)[number];

/** What a frame's state column said; the order is the code in `LogFrames.state`. */
export const FRAME_STATES = ['guiding', 'dither', 'settling', 'star lost', 'ignore'] as const;
export type FrameState = (typeof FRAME_STATES)[number];

/** MAP.json: how one kind of file is read. What is missing is found out from the file. */
export interface ColumnMap {
  /** `,` `;` tab `|`, or a blank for runs of blanks. */
  readonly delimiter?: string | undefined;
  readonly decimal?: '.' | ',' | undefined;
  /** 1-based; 0 says that the file has no header. */
  readonly headerLine?: number | undefined;
  readonly comment?: string | undefined;
  /** By header text, or by 1-based number. */
  readonly columns?: Readonly<Record<string, ColumnUse>> | undefined;
  readonly states?: Readonly<Record<string, FrameState>> | undefined;
  readonly correctionSign?: 'same' | 'opposite' | undefined;
  /** Asked for where the dates can be read both ways; of no account for dates whose year stands first. */
  readonly dateOrder?: DateOrder | undefined;
  /**
   * For errors along the camera's axes (`xError`, `yError`): the angle from the direction of growing x to that of growing
   * RA error (east), turning towards growing y. Growing Dec error (north) lies a quarter turn further on.
   */
  readonly cameraAngleDegrees?: number | undefined;
  /** Growing Dec error lies a quarter turn back instead: a mirrored picture, or one whose y is counted the other way. */
  readonly cameraMirrored?: boolean | undefined;
  readonly targetDeclinationDegrees?: number | undefined;
  /** At the first frame. */
  readonly targetHourAngleHours?: number | undefined;
  /** ISO instant of the first frame, for logs whose times tell no date or no zone. */
  readonly startTime?: string | undefined;
}
