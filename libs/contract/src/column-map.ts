import * as z from 'zod';

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

export const COLUMN_UNITS = [
  'seconds',
  'milliseconds',
  'iso',
  'epoch seconds',
  'epoch milliseconds',
  'clock',
  'arcsec',
  'guide px',
  'ms',
  'degrees',
  'hours',
  'E/W',
  'N/S',
  '+/-',
] as const;

const columnSchema = z.strictObject({
  role: z.enum(COLUMN_ROLES),
  unit: z.enum(COLUMN_UNITS).optional(),
  sentinels: z
    .array(z.string().trim().min(1).max(40))
    .max(20)
    .optional()
    .describe('Cells of a column of numbers that mean "no value", as a blank does'),
});

/** MAP.json: how one kind of file is read. What is missing is found out from the file. */
export const columnMapSchema = z
  .strictObject({
    delimiter: z.enum([',', ';', '\t', '|', ' ']).optional(),
    decimal: z.enum(['.', ',']).optional(),
    headerLine: z.int().min(0).optional().describe('1-based; 0: the file has no header'),
    comment: z.string().min(1).max(10).optional(),
    columns: z
      .record(z.string(), columnSchema)
      .optional()
      .describe('By header text or 1-based number'),
    states: z
      .record(z.string(), z.enum(['guiding', 'dither', 'settling', 'star lost', 'ignore']))
      .optional()
      .describe('By text in the state column'),
    correctionSign: z
      .enum(['same', 'opposite'])
      .optional()
      .describe('Whether a correction of +1 moves the star towards +error'),
    dateOrder: z
      .enum(['day-month-year', 'month-day-year'])
      .optional()
      .describe('Of dates whose year stands last; asked for where both readings are possible'),
    cameraAngleDegrees: z
      .number()
      .min(-360)
      .max(360)
      .optional()
      .describe(
        'For xError and yError: from growing x to growing RA error (east), turning towards growing y; growing Dec error (north) lies a quarter turn further on',
      ),
    cameraMirrored: z
      .boolean()
      .optional()
      .describe('Growing Dec error lies a quarter turn back instead'),
    targetDeclinationDegrees: z.number().min(-90).max(90).optional(),
    targetHourAngleHours: z.number().min(-12).max(12).optional(),
    startTime: z.iso.datetime({ offset: true }).optional(),
  })
  .meta({ id: 'ColumnMap' });
export type ColumnMap = z.infer<typeof columnMapSchema>;
