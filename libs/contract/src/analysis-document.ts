import * as z from 'zod';

/** The analysis document, as REPORT names it. A null has its sentence in `whyMissing` of the same object. */
const whyMissingSchema = z.record(z.string(), z.string());
const nullableNumber = z.number().nullable();

export const readingSchema = z.strictObject({
  lines: z.int(),
  frames: z.int(),
  refusedCount: z.int(),
  refused: z.array(z.strictObject({ line: z.int(), reason: z.string() })),
  delimiter: z.string(),
  decimal: z.string(),
  encoding: z.string(),
  headerLine: z.int().nullable(),
  columns: z.record(z.string(), z.string()),
  warnings: z.array(z.string()),
});
export type Reading = z.infer<typeof readingSchema>;

export const opticsSchema = z.strictObject({
  imagingScaleArcsecPerPx: nullableNumber,
  guideScaleArcsecPerPx: nullableNumber,
  scaleRatio: nullableNumber,
  focalLengthRatio: nullableNumber,
  dawesArcsec: nullableNumber,
  rayleighArcsec: nullableNumber,
  seeingSamplingPx: nullableNumber,
  whyMissing: whyMissingSchema,
});
export type Optics = z.infer<typeof opticsSchema>;

const axisSchema = z.strictObject({
  meanArcsec: z.number(),
  rmsArcsec: z.number(),
  rmsAboutLockArcsec: z.number(),
  peakToPeakArcsec: z.number(),
  p95Arcsec: z.number(),
  driftArcsecPerMinute: z.number(),
  driftStandardError: z.number(),
  lag1: nullableNumber,
});

const peakSchema = z.strictObject({
  periodSeconds: z.number(),
  amplitudeArcsec: z.number(),
  share: z.number(),
  falseAlarmProbability: z.number(),
  label: z.string().nullable(),
});

const spectrumSchema = z.strictObject({
  peaks: z.array(peakSchema).max(12),
  method: z.enum(['fft', 'lomb-scargle']),
});

const uncorrectedSchema = z.strictObject({
  rmsArcsec: z.number(),
  peakToPeakArcsec: z.number(),
  driftArcsecPerMinute: z.number(),
  driftStandardError: z.number(),
  roughnessArcsec: nullableNumber,
});

const periodicErrorSchema = z.strictObject({
  periodSeconds: z.number(),
  periodFrom: z.enum(['rig', 'spectrum']),
  peakToPeakArcsec: z.number(),
  rmsArcsec: z.number(),
  steepestArcsecPerSecond: z.number(),
  turns: z.number(),
  atAxis: z.boolean(),
  harmonics: z.array(
    z.strictObject({
      order: z.int(),
      periodSeconds: z.number(),
      amplitudeArcsec: z.number(),
      phaseDegrees: z.number(),
      standardError: z.number(),
    }),
  ),
  curve: z.array(
    z.strictObject({
      phase: z.number(),
      medianArcsec: nullableNumber,
      q1Arcsec: nullableNumber,
      q3Arcsec: nullableNumber,
    }),
  ),
});

const polarAlignmentSchema = z.strictObject({
  atLeastArcmin: z.number(),
  solved: z
    .strictObject({
      azimuthArcmin: z.number(),
      altitudeArcmin: z.number(),
      totalArcmin: z.number(),
      standardErrorArcmin: z.number(),
      azimuthKnobArcmin: nullableNumber,
    })
    .nullable(),
});

const backlashSchema = z.strictObject({
  arcsec: z.number(),
  ms: nullableNumber,
  low: z.number(),
  high: z.number(),
  determined: z.boolean(),
  reversals: z.int(),
});

const responseSchema = z.strictObject({
  positiveArcsecPerSecond: nullableNumber,
  negativeArcsecPerSecond: nullableNumber,
  standardError: nullableNumber,
  expectedArcsecPerSecond: nullableNumber,
  asymmetry: nullableNumber,
  from: z.enum(['rig', 'log']),
});

const loopSchema = z.strictObject({
  gain: nullableNumber,
  gainStandardError: nullableNumber,
  bestGain: nullableNumber,
  lag1: nullableNumber,
  noiseGain: nullableNumber,
  overCorrecting: z.boolean().nullable(),
});

const partSchema = z.strictObject({
  part: z.enum([
    'periodic error',
    'drift',
    'backlash',
    'over-correction',
    'gusts and bumps',
    'seeing floor',
    'unexplained',
  ]),
  share: z.number(),
  rmsArcsec: z.number(),
  rmsIfCuredArcsec: z.number(),
});

export const SEVERITIES = ['fine', 'watch', 'act'] as const;

export const findingSchema = z.strictObject({
  code: z.enum([
    'periodic-error',
    'gear-line',
    'unnamed-line',
    'drift',
    'polar-alignment',
    'backlash',
    'stiction',
    'over-correction',
    'under-correction',
    'response-asymmetry',
    'response-off',
    'gusts',
    'star-lost',
    'seeing-limited',
    'guide-scale-coarse',
    'sampling',
    'axes-correlated',
    'too-short',
    'nothing-found',
  ]),
  severity: z.enum(SEVERITIES),
  sentence: z.string(),
  evidence: z.array(z.string()),
  nextStep: z.string(),
  gain: z
    .strictObject({
      rmsIfCuredArcsec: nullableNumber,
      aspectIfCured: nullableNumber,
      // Documents of analysis version 1 do not tell it.
      subsKeptIfCured: nullableNumber.default(null),
    })
    .nullable(),
  caution: z.string().nullable(),
});
export type Finding = z.infer<typeof findingSchema>;

export const runSchema = z
  .strictObject({
    index: z.int(),
    target: z.string().nullable(),
    start: z.iso.datetime().nullable(),
    durationSeconds: z.number(),
    cadenceSeconds: nullableNumber,
    frames: z.int(),
    used: z.int(),
    setAside: z.array(
      z.strictObject({
        fromSeconds: z.number(),
        toSeconds: z.number(),
        frames: z.int(),
        reason: z.enum(['dither', 'settling', 'star lost', 'by hand']),
      }),
    ),
    ra: axisSchema.nullable(),
    dec: axisSchema.nullable(),
    total: z
      .strictObject({
        rmsArcsec: z.number(),
        rmsImagingPx: nullableNumber,
        p95Arcsec: z.number(),
        peakArcsec: z.number(),
      })
      .nullable(),
    correlation: nullableNumber,
    footprint: z
      .strictObject({
        fwhmMajorArcsec: z.number(),
        fwhmMinorArcsec: z.number(),
        aspect: z.number(),
        eccentricity: z.number(),
        positionAngleDegrees: z.number(),
      })
      .nullable(),
    spectrum: z.strictObject({ ra: spectrumSchema, dec: spectrumSchema }).nullable(),
    uncorrected: z.strictObject({ ra: uncorrectedSchema, dec: uncorrectedSchema }).nullable(),
    periodicError: periodicErrorSchema.nullable(),
    polarAlignment: polarAlignmentSchema.nullable(),
    backlash: backlashSchema.nullable(),
    response: z.strictObject({ ra: responseSchema, dec: responseSchema }).nullable(),
    loop: z.strictObject({ ra: loopSchema.nullable(), dec: loopSchema.nullable() }),
    seeingFloor: z.strictObject({ raArcsec: nullableNumber, decArcsec: nullableNumber }).nullable(),
    budget: z.strictObject({ ra: z.array(partSchema), dec: z.array(partSchema) }).nullable(),
    subs: z
      .strictObject({
        lengthSeconds: z.number(),
        keepAspect: z.number(),
        count: z.int(),
        within: z.int(),
        aspects: z.array(z.number()),
        startsSeconds: z.array(z.number()),
      })
      .nullable(),
    findings: z.array(findingSchema),
    whyMissing: whyMissingSchema,
  })
  .meta({ id: 'Run' });
export type Run = z.infer<typeof runSchema>;

export const analysisDocumentSchema = z
  .strictObject({
    schema: z.literal('stillpier-analysis/1'),
    reading: readingSchema,
    optics: opticsSchema,
    runs: z.array(runSchema),
  })
  .meta({ id: 'AnalysisDocument' });
export type AnalysisDocument = z.infer<typeof analysisDocumentSchema>;
