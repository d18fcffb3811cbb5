import { type Peak } from '../analysis-document';
import {
  type AxisName,
  type Draft,
  type FindingContext,
  gainIfCured,
  gravest,
  mildest,
  type MeasuredRun,
  partSeverity,
  rmsThreshold,
  severityOf,
} from './finding-context';
import { guidedLines, isWorms } from './guided-lines';
import { arcsec, AXIS_NAMES, percent, ratio, roundArcsec, seconds } from './numbers-in-words';
import { THRESHOLDS } from './thresholds';

/** Of the best harmonic of eight: a night without periodic error reaches three too often. */
const SEEN_SIGMAS = 4;

const GEARS =
  'Switch the power off before hands go near gears. Opening a gearbox can void a warranty: follow the maker’s manual.';

/** Periodic error of the worm: smooth, steep or growing. */
export function periodicErrorFindings(run: MeasuredRun, context: FindingContext): Draft[] {
  const { periodicError } = run;
  const part = guidedLines(run, 'ra')?.worm;
  if (periodicError === null || part === undefined) return [];
  const { peakToPeakArcsec, steepestArcsecPerSecond, harmonics } = periodicError;
  const { periodSeconds, periodFrom } = periodicError;
  if (!harmonics.some((line) => line.amplitudeArcsec > SEEN_SIGMAS * line.standardError)) return [];
  const usual = context.usualPeriodicErrorArcsec;
  const growth = usual === null ? 0 : peakToPeakArcsec / usual;
  const growing = growth >= THRESHOLDS.growth.watch;
  const slopeAFrame = steepestArcsecPerSecond * (run.cadenceSeconds ?? 0);
  const steep = slopeAFrame >= THRESHOLDS.steepSlope.watch * rmsThreshold(context).watch;
  const harm = partSeverity(part, context);
  const size = roundArcsec(peakToPeakArcsec);
  return [
    {
      axis: 'ra',
      onMount: true,
      code: 'periodic-error',
      severity: gravest(harm, severityOf(growth, THRESHOLDS.growth)),
      sentence: growing
        ? `RA periodic error has grown to ${size}, ${percent(growth - 1)} above what is usual.`
        : harm === 'fine'
          ? `RA periodic error of ${size} is guided out: ${arcsec(part.rmsArcsec)} RMS is left.`
          : `RA periodic error of ${size} leaves ${arcsec(part.rmsArcsec)} RMS after guiding.`,
      evidence: [
        `${periodFrom === 'rig' ? 'Worm' : 'Period from the spectrum'} ${seconds(periodSeconds)}; ${percent(part.share)} of the RA error.`,
        `Steepest ${ratio(steepestArcsecPerSecond)}″ a second.`,
      ],
      nextStep: nextStepFor(growing, steep, harm),
      gain: gainIfCured(run, context, { ra: part.rmsArcsec ** 2 }),
      caution: growing ? GEARS : null,
    },
  ];
}

function nextStepFor(growing: boolean, steep: boolean, harm: Draft['severity']): string {
  if (growing) return 'Clean and regrease the worm, then compare three nights.';
  if (harm === 'fine') return 'Leave it as it is.';
  return steep
    ? 'Shorten the guide exposures: the drive outruns the corrections.'
    : 'Train a periodic error correction over two worm turns.';
}

/** Lines that the guided error still shows: of a named gear stage, or of none. */
export function lineFindings(run: MeasuredRun, context: FindingContext): Draft[] {
  return (['ra', 'dec'] as const).flatMap((axis) =>
    (run.spectrum?.[axis].peaks ?? [])
      .filter((peak) => !isWorms(peak, run))
      .map((peak) => lineFinding(run, context, axis, peak))
      .filter(({ severity }) => severity !== 'fine'),
  );
}

function lineFinding(run: MeasuredRun, context: FindingContext, axis: AxisName, peak: Peak): Draft {
  const rms = peak.amplitudeArcsec / Math.SQRT2;
  const name = AXIS_NAMES[axis];
  const period = seconds(peak.periodSeconds);
  const size = arcsec(peak.amplitudeArcsec);
  return {
    axis,
    onMount: true,
    code: peak.label === null ? 'unnamed-line' : 'gear-line',
    severity: mildest(
      severityOf(peak.share, THRESHOLDS.share),
      severityOf(rms, rmsThreshold(context)),
    ),
    sentence:
      peak.label === null
        ? `${name} swings by ${size} every ${period}, which no gear of the rig does.`
        : `The ${peak.label} swings ${name} by ${size} every ${period}.`,
    evidence: [
      peak.label === null
        ? `${percent(peak.share)} of the ${name} error.`
        : `${percent(peak.share)} of the ${name} error; a period that fits is a hint, no proof.`,
    ],
    nextStep:
      peak.label === null
        ? 'Compare the period with pulleys, bearings and fans, and enter what fits in the rig.'
        : `Inspect the ${peak.label}.`,
    gain: gainIfCured(run, context, { [axis]: rms ** 2 }),
    caution: GEARS,
  };
}
