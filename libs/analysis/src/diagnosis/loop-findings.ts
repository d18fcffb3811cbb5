import {
  type AxisName,
  type Draft,
  type FindingContext,
  gainIfCured,
  type MeasuredRun,
  partOf,
  partSeverity,
  gravest,
  severityOf,
} from './finding-context';
import { arcsec, AXIS_NAMES, percent, ratio } from './numbers-in-words';
import { CLEAR_SIGMAS, THRESHOLDS } from './thresholds';

const BALANCE =
  'Hold the tube before releasing a clutch; take counterweights off last, with the safety stop in place.';
/** Common practice, no source. */
const HEALTHY_GAIN = 0.7;
const LOWEST_ADVISED_GAIN = 0.4;
/** Above it a loop answers more than the whole error: never advised. */
const HIGHEST_ADVISED_GAIN = 1;
const AXES = ['ra', 'dec'] as const;

/** A loop that answers more than the whole error. */
export function overCorrectionFindings(run: MeasuredRun, context: FindingContext): Draft[] {
  return AXES.flatMap((axis): Draft[] => {
    const loop = run.loop[axis];
    if (loop?.overCorrecting !== true) return [];
    const name = AXIS_NAMES[axis];
    const part = partOf(run, axis, 'over-correction');
    const told =
      loop.gain === null
        ? `${name} swings from frame to frame: its corrections are too strong.`
        : `${name} over-corrects: each correction takes away ${percent(loop.gain)} of the error.`;
    return [
      {
        axis,
        onMount: true,
        code: 'over-correction',
        severity: gravest('watch', part === null ? 'fine' : partSeverity(part, context)),
        sentence: told,
        evidence:
          loop.lag1 === null ? [] : [`Neighbouring frames correlate by ${ratio(loop.lag1)}.`],
        nextStep:
          loop.bestGain === null || loop.gain === null
            ? `Lower the ${name} aggressiveness by a third.`
            : `Lower the ${name} aggressiveness to ${percent(calmer(loop.bestGain) / loop.gain)} of what it is.`,
        gain: part === null ? null : gainIfCured(run, context, { [axis]: part.rmsArcsec ** 2 }),
        caution: null,
      },
    ];
  });
}

/** A gain to aim at: the best one, but never so low that a gust or a dither is left to itself, nor above a healthy one. */
function calmer(bestGain: number): number {
  return Math.min(HEALTHY_GAIN, Math.max(LOWEST_ADVISED_GAIN, bestGain));
}

/** A loop too soft for what the mount does, by replay. */
export function underCorrectionFindings(run: MeasuredRun, context: FindingContext): Draft[] {
  return AXES.flatMap((axis): Draft[] => {
    const curve = context.gainCurves[axis];
    const gain = run.loop[axis]?.gain ?? null;
    const measured = run[axis];
    if (curve === null || gain === null || measured === null) return [];
    const best = curve.points
      .filter((point) => point.gain <= HIGHEST_ADVISED_GAIN)
      .reduce((least, point) => (point.rmsArcsec < least.rmsArcsec ? point : least));
    if (gain >= best.gain) return [];
    const loss = 1 - best.rmsArcsec / measured.rmsArcsec;
    const severity = severityOf(loss, THRESHOLDS.gainLoss);
    if (severity === 'fine') return [];
    const name = AXIS_NAMES[axis];
    const off = measured.rmsArcsec ** 2 - best.rmsArcsec ** 2;
    return [
      {
        axis,
        onMount: true,
        code: 'under-correction',
        severity,
        sentence: `${name} guiding is too soft: at a gain of ${ratio(best.gain)} RMS would fall from ${arcsec(measured.rmsArcsec)} to ${arcsec(best.rmsArcsec)}.`,
        evidence: [`The gain was ${ratio(gain)}; predicted by replay of the night.`],
        nextStep: `Raise the ${name} aggressiveness step by step towards ${percent(best.gain / gain)} of what it is.`,
        gain: gainIfCured(run, context, { [axis]: off }),
        caution: null,
      },
    ];
  });
}

/** Corrections that do more in one direction than in the other. */
export function asymmetryFindings(run: MeasuredRun): Draft[] {
  return AXES.flatMap((axis): Draft[] => {
    const response = run.response?.[axis];
    const asymmetry = response?.asymmetry ?? null;
    if (asymmetry === null || severityOf(Math.abs(asymmetry), THRESHOLDS.asymmetry) === 'fine')
      return [];
    const mean = meanResponse(run, axis);
    const error = response?.standardError ?? null;
    // Of p − n over their mean, the errors of the two taken as alike.
    const relative = mean !== null && error !== null ? (Math.SQRT2 * error) / mean : 0;
    if (Math.abs(asymmetry) < CLEAR_SIGMAS * relative) return [];
    const name = AXIS_NAMES[axis];
    const stronger = asymmetry > 0 ? '+' : '−';
    return [
      {
        axis,
        onMount: true,
        code: 'response-asymmetry',
        severity: 'watch',
        sentence: `${name} answers ${percent(Math.abs(asymmetry))} more towards ${stronger} than the other way.`,
        evidence: ['A sign of imbalance where it follows the side of the pier, no proof.'],
        nextStep: `Balance ${name} on both sides of the pier, slightly heavy against the drive.`,
        gain: null,
        caution: BALANCE,
      },
    ];
  });
}

/** Corrections that do not do what the guide rate says. */
export function responseOffFindings(run: MeasuredRun): Draft[] {
  return AXES.flatMap((axis): Draft[] => {
    const response = run.response?.[axis];
    const mean = meanResponse(run, axis);
    const expected = response?.expectedArcsecPerSecond ?? null;
    if (mean === null || expected === null) return [];
    const off = Math.abs(mean / expected - 1);
    const severity = severityOf(off, THRESHOLDS.responseOff);
    const error = response?.standardError ?? 0;
    if (severity === 'fine' || Math.abs(mean - expected) < CLEAR_SIGMAS * error) return [];
    // The log reads low where seeing is correlated: then the guide rate is still what the motion rests on.
    if (response?.from === 'rig') return [];
    const name = AXIS_NAMES[axis];
    return [
      {
        axis,
        onMount: true,
        code: 'response-off',
        severity,
        sentence: `${name} corrections do ${percent(mean / expected)} of what the guide rate says.`,
        evidence: [`${ratio(mean)}″ a second of correction; ${ratio(expected)}″ expected.`],
        nextStep: 'Check guide rate and declination in the rig and the log, then calibrate again.',
        gain: null,
        caution: null,
      },
    ];
  });
}

function meanResponse(run: MeasuredRun, axis: AxisName): number | null {
  const response = run.response?.[axis];
  const positive = response?.positiveArcsecPerSecond ?? null;
  const negative = response?.negativeArcsecPerSecond ?? null;
  return positive === null || negative === null ? null : (positive + negative) / 2;
}
