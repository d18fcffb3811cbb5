/** What a column can be; the labels that people read are the client's. */
export const COLUMN_ROLES = [
  'time',
  'raError',
  'decError',
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

/** Without these three there is nothing to analyse. */
export const REQUIRED_ROLES = ['time', 'raError', 'decError'] as const satisfies ColumnRole[];

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
  raError: ['arcsec', 'guide px'],
  decError: ['arcsec', 'guide px'],
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
}

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
  readonly targetDeclinationDegrees?: number | undefined;
  /** At the first frame. */
  readonly targetHourAngleHours?: number | undefined;
  /** ISO instant of the first frame, for logs whose times tell no date or no zone. */
  readonly startTime?: string | undefined;
}
