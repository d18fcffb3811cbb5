import { LARGEST_POLAR_DRIFT_PER_ARCMIN } from '../sky/earth-rotation';
import {
  type Draft,
  type FindingContext,
  gainIfCured,
  type MeasuredRun,
  partOf,
  partSeverity,
  severityOf,
} from './finding-context';
import { arcmin, arcsec, AXIS_NAMES, percent, ratio } from './numbers-in-words';
import { CLEAR_SIGMAS, THRESHOLDS } from './thresholds';

/** What drift leaves in the guided error. */
export function driftFindings(run: MeasuredRun, context: FindingContext): Draft[] {
  return (['ra', 'dec'] as const).flatMap((axis): Draft[] => {
    const part = partOf(run, axis, 'drift');
    const measured = run[axis];
    if (part === null || measured === null) return [];
    const severity = partSeverity(part, context);
    const rate = run.uncorrected?.[axis].driftArcsecPerMinute ?? measured.driftArcsecPerMinute;
    if (severity === 'fine') return [];
    const name = AXIS_NAMES[axis];
    return [
      {
        axis,
        onMount: true,
        code: 'drift',
        severity,
        sentence: `${name} drift leaves ${arcsec(part.rmsArcsec)} RMS: guiding does not keep up with it.`,
        evidence: [`The star drifts ${ratio(rate)}″ a minute; ${percent(part.share)} of ${name}.`],
        nextStep:
          axis === 'dec'
            ? 'Align the polar axis, and allow Dec corrections both ways.'
            : 'Check the tracking rate, and tighten what lets the tube sag.',
        gain: gainIfCured(run, context, { [axis]: part.rmsArcsec ** 2 }),
        caution: null,
      },
    ];
  });
}

/** Refraction alone passes for so much. */
const WORTH_SAYING_ARCMIN = 1;

/** The polar axis: how far off, and what that does to a sub. */
export function polarFindings(run: MeasuredRun, context: FindingContext): Draft[] {
  const { polarAlignment, uncorrected } = run;
  if (polarAlignment === null || uncorrected === null) return [];
  const { solved, atLeastArcmin } = polarAlignment;
  const error =
    solved?.standardErrorArcmin ??
    uncorrected.dec.driftStandardError / LARGEST_POLAR_DRIFT_PER_ARCMIN;
  const size = solved?.totalArcmin ?? atLeastArcmin;
  if (size < CLEAR_SIGMAS * error) return [];
  const severity = polarSeverity(size, solved !== null, run, context);
  if (severity === 'fine' && size < WORTH_SAYING_ARCMIN) return [];
  const drift = ratio(Math.abs(uncorrected.dec.driftArcsecPerMinute));
  const turn = (value: number, plus: string, minus: string) =>
    `${arcmin(Math.abs(value))} ${value > 0 ? minus : plus}`;
  return [
    {
      axis: null,
      onMount: true,
      code: 'polar-alignment',
      severity,
      sentence:
        solved === null
          ? `The polar axis is off by at least ${arcmin(size)}.`
          : `The polar axis is off by ${arcmin(size)} (± ${arcmin(error)}).`,
      evidence: [`Dec drifts ${drift}″ a minute without corrections.`],
      nextStep:
        solved === null
          ? 'Guide a second target hours away: two hour angles tell which knob to turn.'
          : `Move the axis ${turn(solved.azimuthKnobArcmin ?? solved.azimuthArcmin, 'east', 'west')} and ${turn(solved.altitudeArcmin, 'up', 'down')}.`,
      gain: null,
      caution: null,
    },
  ];
}

function polarSeverity(
  arcminutes: number,
  isSolved: boolean,
  run: MeasuredRun,
  { optics, rig }: FindingContext,
): Draft['severity'] {
  const scale = optics.imagingScaleArcsecPerPx;
  const sub = run.subs?.lengthSeconds ?? rig.subSeconds;
  // 'At least' may be far too little, but what is not known is no reason to act.
  const held = (severity: Draft['severity']) =>
    isSolved || severity === 'fine' ? severity : 'watch';
  if (scale === null || sub === undefined)
    return held(severityOf(arcminutes, THRESHOLDS.polarArcmin));
  // A degree off the guide star the field turns by drift · 1°: the largest rate, at the celestial equator.
  const rotationArcsec =
    ((arcminutes * LARGEST_POLAR_DRIFT_PER_ARCMIN * sub) / 60) * (Math.PI / 180);
  const byDrift = severityOf(arcminutes, THRESHOLDS.polarArcmin);
  const byRotation = severityOf(rotationArcsec / scale, THRESHOLDS.fieldRotationPx);
  return held(byRotation === 'fine' && byDrift !== 'fine' ? 'watch' : byRotation);
}
