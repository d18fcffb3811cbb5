import * as z from 'zod';

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
    targetDeclinationDegrees: z.number().min(-90).max(90).optional(),
    targetHourAngleHours: z.number().min(-12).max(12).optional(),
    startTime: z.iso.datetime({ offset: true }).optional(),
  })
  .meta({ id: 'ColumnMap' });
export type ColumnMap = z.infer<typeof columnMapSchema>;
