import * as z from 'zod';
import {
  findingSchema,
  opticsSchema,
  readingSchema,
  runSchema,
  SEVERITIES,
} from './analysis-document';

const nullableNumber = z.number().nullable();

/** One line of the nights table. A measure is the frame-weighted median over the night's runs. */
export const nightSummarySchema = z
  .strictObject({
    date: z.iso.date().describe('Of the evening: a night lasts from noon to noon at the site'),
    startsAt: z.iso.datetime(),
    endsAt: z.iso.datetime(),
    targets: z.array(z.string()),
    runCount: z.int(),
    guidedHours: z.number(),
    frames: z.int(),
    used: z.int(),
    raRmsArcsec: nullableNumber,
    decRmsArcsec: nullableNumber,
    totalRmsArcsec: nullableNumber,
    aspect: nullableNumber,
    positionAngleDegrees: nullableNumber.describe('Of the predicted star, north through east'),
    keptShare: nullableNumber.describe('Subs within the keep limit, 0 to 1'),
    mainLimit: z
      .strictObject({ code: findingSchema.shape.code, severity: z.enum(SEVERITIES) })
      .nullable(),
  })
  .meta({ id: 'NightSummary' });
export type NightSummary = z.infer<typeof nightSummarySchema>;

/** A run of a night: the document's run with what it hangs on. */
export const nightRunSchema = z
  .strictObject({
    id: z.uuid(),
    importId: z.uuid(),
    setupId: z.uuid().nullable(),
    setupName: z.string().nullable(),
    seeingFwhmArcsec: nullableNumber.describe('As it was when the run was analysed'),
    optics: opticsSchema,
    run: runSchema,
  })
  .meta({ id: 'NightRun' });
export type NightRun = z.infer<typeof nightRunSchema>;

/** What one log file gave to the night. */
export const nightLogSchema = z.strictObject({
  importId: z.uuid(),
  fileName: z.string(),
  analysisVersion: z.string(),
  reading: readingSchema,
});

export const nightSchema = z
  .strictObject({
    rigId: z.uuid(),
    rigName: z.string(),
    timeZone: z.string(),
    summary: nightSummarySchema,
    sentence: z
      .array(z.strictObject({ text: z.string(), strong: z.boolean() }))
      .describe('What limited the night, in parts; strong parts are its numbers'),
    previous: z.iso.date().nullable(),
    next: z.iso.date().nullable(),
    runs: z.array(nightRunSchema),
    logs: z.array(nightLogSchema),
  })
  .meta({ id: 'Night' });
export type Night = z.infer<typeof nightSchema>;

/** Rigs page: one line a rig. */
export const rigStateSchema = z
  .strictObject({
    rigId: z.uuid(),
    nightCount: z.int(),
    lastNight: nightSummarySchema.nullable(),
    sentence: z.array(z.strictObject({ text: z.string(), strong: z.boolean() })),
    footprint: runSchema.shape.footprint.describe('Of the longest run of the last night'),
    seeingFwhmArcsec: nullableNumber,
    imagingScaleArcsecPerPx: nullableNumber,
    totalRmsTrend: z
      .array(z.strictObject({ date: z.iso.date(), totalRmsArcsec: z.number() }))
      .describe('The last 12 nights, oldest first'),
  })
  .meta({ id: 'RigState' });
export type RigState = z.infer<typeof rigStateSchema>;

/** Amplitude of the guided error by period, both axes on one grid of periods. */
export const spectrumCurveSchema = z
  .strictObject({
    periodSeconds: z.array(z.number()),
    raAmplitudeArcsec: z.array(z.number()),
    decAmplitudeArcsec: z.array(z.number()),
  })
  .meta({ id: 'SpectrumCurve' });
export type SpectrumCurve = z.infer<typeof spectrumCurveSchema>;

export const SERIES_CHANNELS = [
  'raError',
  'decError',
  'raCorrection',
  'decCorrection',
  'raUncorrected',
  'decUncorrected',
  'setAside',
] as const;
export type SeriesChannel = (typeof SERIES_CHANNELS)[number];

const numberOf = (schema: z.ZodNumber) =>
  z.preprocess((text) => (typeof text === 'string' ? Number(text) : text), schema);

/**
 * A stretch of a run's series, as application/octet-stream, little-endian:
 *
 *     uint32 n · uint32 thinned · float32 time[n] · then for each channel asked for, in that order,
 *     float32 value[n] (thinned = 0)  or  float32 least[n], float32 greatest[n] (thinned = 1)
 *
 * Times are seconds since `fromSeconds`; gaps are NaN. A stretch with more frames than `points` is thinned:
 * least and greatest of the frames that fall on each of `points` equal steps of time. `setAside` holds the codes of
 * the analysis (0 kept, 1 dither, 2 settling, 3 star lost, 4 by hand).
 */
export const seriesQuerySchema = z.strictObject({
  channels: z
    .string()
    .transform((list) => list.split(','))
    .pipe(z.array(z.enum(SERIES_CHANNELS)).min(1).max(SERIES_CHANNELS.length)),
  fromSeconds: numberOf(z.number().min(0)).optional(),
  toSeconds: numberOf(z.number().min(0)).optional(),
  points: numberOf(z.number().int().min(10).max(10_000)).default(2000),
});
export type SeriesQuery = z.output<typeof seriesQuerySchema>;

export const nightPaths = {
  all: (rigId: string) => `/api/v1/rigs/${rigId}/nights`,
  one: (rigId: string, date: string) => `/api/v1/rigs/${rigId}/nights/${date}`,
  rigStates: '/api/v1/rig-states',
  series: (rigId: string, runId: string) => `/api/v1/rigs/${rigId}/runs/${runId}/series`,
  spectrum: (rigId: string, runId: string) => `/api/v1/rigs/${rigId}/runs/${runId}/spectrum`,
} as const;
