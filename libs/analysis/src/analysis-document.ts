/**
 * The analysis document of REPORT: everything found in one guide log. The zod twin of these types is
 * `analysisDocumentSchema` in libs/contract; the server's types hold the two together.
 * A number that could not be told is null, and `whyMissing` of the same object says why under its key
 * (dotted for a nested one, as in `total.rmsImagingPx`).
 */
export type WhyMissing = Record<string, string>;

export interface AnalysisDocument {
  schema: 'stillpier-analysis/1';
  reading: Reading;
  optics: Optics;
  runs: Run[];
}

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

export interface Optics {
  imagingScaleArcsecPerPx: number | null;
  guideScaleArcsecPerPx: number | null;
  scaleRatio: number | null;
  focalLengthRatio: number | null;
  dawesArcsec: number | null;
  rayleighArcsec: number | null;
  seeingSamplingPx: number | null;
  whyMissing: WhyMissing;
}

export type SetAsideReason = 'dither' | 'settling' | 'star lost' | 'by hand';

export interface SetAside {
  fromSeconds: number;
  toSeconds: number;
  frames: number;
  reason: SetAsideReason;
}

export interface Run {
  index: number;
  target: string | null;
  /** ISO instant, or null when the log tells no date. */
  start: string | null;
  durationSeconds: number;
  cadenceSeconds: number | null;
  frames: number;
  used: number;
  setAside: SetAside[];
  ra: Axis | null;
  dec: Axis | null;
  total: Total | null;
  /** Pearson, RA against Dec error. */
  correlation: number | null;
  footprint: Footprint | null;
  spectrum: { ra: Spectrum; dec: Spectrum } | null;
  uncorrected: { ra: Uncorrected; dec: Uncorrected } | null;
  periodicError: PeriodicError | null;
  polarAlignment: PolarAlignment | null;
  backlash: Backlash | null;
  response: { ra: Response; dec: Response } | null;
  loop: { ra: Loop | null; dec: Loop | null };
  seeingFloor: { raArcsec: number | null; decArcsec: number | null } | null;
  budget: { ra: Part[]; dec: Part[] } | null;
  subs: Subs | null;
  findings: Finding[];
  whyMissing: WhyMissing;
}

export interface Axis {
  meanArcsec: number;
  /** About the mean, population (divide by N). */
  rmsArcsec: number;
  rmsAboutLockArcsec: number;
  peakToPeakArcsec: number;
  /** 95th percentile of |error about the lock position|. */
  p95Arcsec: number;
  driftArcsecPerMinute: number;
  driftStandardError: number;
  lag1: number | null;
}

export interface Total {
  rmsArcsec: number;
  rmsImagingPx: number | null;
  p95Arcsec: number;
  peakArcsec: number;
}

export interface Footprint {
  fwhmMajorArcsec: number;
  fwhmMinorArcsec: number;
  aspect: number;
  eccentricity: number;
  /** Of the major axis, from north (+Dec) through east (+RA), in [0, 180). */
  positionAngleDegrees: number;
}

export interface Spectrum {
  /** Strongest first, at most 12, false-alarm probability below 0.001. */
  peaks: Peak[];
  method: 'fft' | 'lomb-scargle';
}

export interface Peak {
  periodSeconds: number;
  /** Half the peak-to-peak of the sine. */
  amplitudeArcsec: number;
  /** Part of the axis' variance. */
  share: number;
  falseAlarmProbability: number;
  label: string | null;
}

export interface Uncorrected {
  rmsArcsec: number;
  peakToPeakArcsec: number;
  driftArcsecPerMinute: number;
  driftStandardError: number;
  roughnessArcsec: number | null;
}

export interface PeriodicError {
  periodSeconds: number;
  periodFrom: 'rig' | 'spectrum';
  peakToPeakArcsec: number;
  rmsArcsec: number;
  steepestArcsecPerSecond: number;
  turns: number;
  atAxis: boolean;
  harmonics: {
    order: number;
    periodSeconds: number;
    amplitudeArcsec: number;
    /** Of A·cos(2π·order·t/T + phase), t from the run's first frame. */
    phaseDegrees: number;
    standardError: number;
  }[];
  /** 72 bins of one turn. */
  curve: {
    phase: number;
    medianArcsec: number | null;
    q1Arcsec: number | null;
    q3Arcsec: number | null;
  }[];
}

export interface PolarAlignment {
  atLeastArcmin: number;
  solved: {
    azimuthArcmin: number;
    altitudeArcmin: number;
    totalArcmin: number;
    standardErrorArcmin: number;
    /** What the azimuth knob must turn: azimuth / cos(latitude); null without a latitude. */
    azimuthKnobArcmin: number | null;
  } | null;
}

export interface Backlash {
  arcsec: number;
  ms: number | null;
  /** 95 % interval, arcsec. */
  low: number;
  high: number;
  determined: boolean;
  reversals: number;
}

/** Magnitudes; 'positive' moves the star towards +error. */
export interface Response {
  positiveArcsecPerSecond: number | null;
  negativeArcsecPerSecond: number | null;
  standardError: number | null;
  expectedArcsecPerSecond: number | null;
  asymmetry: number | null;
  from: 'rig' | 'log';
}

export interface Loop {
  gain: number | null;
  gainStandardError: number | null;
  bestGain: number | null;
  lag1: number | null;
  noiseGain: number | null;
  overCorrecting: boolean | null;
}

export const BUDGET_PARTS = [
  'periodic error',
  'drift',
  'backlash',
  'over-correction',
  'gusts and bumps',
  'seeing floor',
  'unexplained',
] as const;
export type BudgetPart = (typeof BUDGET_PARTS)[number];

export interface Part {
  part: BudgetPart;
  share: number;
  rmsArcsec: number;
  rmsIfCuredArcsec: number;
}

export interface Subs {
  lengthSeconds: number;
  keepAspect: number;
  count: number;
  within: number;
  aspects: number[];
  startsSeconds: number[];
}

export const FINDING_CODES = [
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
] as const;
export type FindingCode = (typeof FINDING_CODES)[number];

export interface Finding {
  code: FindingCode;
  severity: 'fine' | 'watch' | 'act';
  sentence: string;
  evidence: string[];
  nextStep: string;
  gain: {
    rmsIfCuredArcsec: number | null;
    aspectIfCured: number | null;
    /** How many of the run's subs would be within the aspect that the owner keeps; as many as `subs.count` at most. */
    subsKeptIfCured: number | null;
  } | null;
  caution: string | null;
}
