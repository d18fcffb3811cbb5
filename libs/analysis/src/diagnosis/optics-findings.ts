import { guideScaleLimit, USUAL_CENTROID_FRACTION_PX } from '../optics/guide-scale-limit';
import { type Draft, type FindingContext, type MeasuredRun, severityOf } from './finding-context';
import { ratio } from './numbers-in-words';
import { THRESHOLDS } from './thresholds';

const OPTICS = { axis: null, onMount: false, gain: null, caution: null } as const;

/** A guide camera that cannot see what the imaging camera sees. */
export function guideScaleFindings({ optics }: FindingContext): Draft[] {
  const { scaleRatio } = optics;
  if (scaleRatio === null) return [];
  const limit = guideScaleLimit(scaleRatio, USUAL_CENTROID_FRACTION_PX);
  if (limit.staysUnder) return [];
  return [
    {
      ...OPTICS,
      code: 'guide-scale-coarse',
      severity: 'watch',
      sentence: `One guide pixel covers ${scaleRatio.toFixed(1)} imaging pixels: too coarse to see what the stars show.`,
      evidence: [
        `Up to ${limit.largestScaleRatio.toFixed(1)} an error of a third of a pixel is seen.`,
      ],
      nextStep: 'Use a longer guide scope, smaller guide pixels or no binning.',
    },
  ];
}

/** Pixels a star. */
export function samplingFindings({ optics }: FindingContext): Draft[] {
  const px = optics.seeingSamplingPx;
  if (px === null) return [];
  const coarse = px < THRESHOLDS.samplingPx.watch;
  const fine = px > THRESHOLDS.oversamplingPx.watch;
  if (!coarse && !fine) return [];
  return [
    {
      ...OPTICS,
      code: 'sampling',
      severity: 'watch',
      sentence: `A star covers ${px.toFixed(1)} imaging pixels: ${coarse ? 'too few to show its shape' : 'more than the seeing fills'}.`,
      evidence: ['Two to three are common practice.'],
      nextStep: coarse
        ? 'Judge star shapes with care, and use smaller pixels or a longer scope.'
        : 'Bin the imaging camera, or use a shorter scope.',
    },
  ];
}

/** RA and Dec errors that go together. */
export function correlationFindings(run: MeasuredRun): Draft[] {
  const { correlation, used } = run;
  if (correlation === null) return [];
  const clear = Math.abs(correlation) > CLEAR_CORRELATION / Math.sqrt(used);
  if (!clear || severityOf(Math.abs(correlation), THRESHOLDS.correlation) === 'fine') return [];
  return [
    {
      ...OPTICS,
      code: 'axes-correlated',
      severity: 'watch',
      sentence: `RA and Dec errors go together: their correlation is ${ratio(correlation)}.`,
      evidence: ['Axes that are calibrated well err independently.'],
      nextStep: 'Calibrate again near the celestial equator, with the camera as it stands.',
    },
  ];
}

/** Times 1/√n: chance alone does not reach it, neighbouring frames being correlated. */
const CLEAR_CORRELATION = 5;
