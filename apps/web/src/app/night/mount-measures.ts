import type { Finding, Run } from '@stillpier/contract';
import {
  arcminText,
  arcsecText,
  NO_VALUE,
  percentText,
  ratioText,
  smallText,
} from '../figures/measure-text';

/** A measure of the mount as a line of text; a value that is missing has its reason in its place. */
export interface MountMeasure {
  readonly name: string;
  readonly ra: string;
  readonly dec: string;
  readonly note: string;
  /** What findings may say of it. */
  readonly findings: readonly Finding['code'][];
}

/** What the run tells of the mount beside its periodic error. */
export function mountMeasures(run: Run): MountMeasure[] {
  return [
    { ...drift(run), findings: ['drift'] },
    { ...polarAlignment(run), findings: ['polar-alignment'] },
    { ...uncorrected(run), findings: [] },
    { ...backlash(run), findings: ['backlash', 'stiction'] },
    { ...response(run), findings: ['response-off'] },
    { ...asymmetry(run), findings: ['response-asymmetry'] },
    { ...gain(run), findings: [] },
    { ...seeingFloor(run), findings: [] },
  ];
}

type Told = Omit<MountMeasure, 'findings'>;

const missing = (run: Run, key: string): string =>
  run.whyMissing[key] ?? 'Cannot be told from this run.';

const either = <Axis>(axis: Axis | null | undefined, text: (axis: Axis) => string): string =>
  axis === null || axis === undefined ? NO_VALUE : text(axis);

function perMinute(arcsecPerMinute: number, error: number): string {
  return `${smallText(arcsecPerMinute)}″ ± ${smallText(error)}″ per min`;
}

function drift(run: Run): Told {
  const { uncorrected, ra, dec } = run;
  const left = (axis: typeof ra): string =>
    either(axis, (a) => perMinute(a.driftArcsecPerMinute, a.driftStandardError));
  const open = uncorrected
    ? `Corrections undone: RA ${smallText(uncorrected.ra.driftArcsecPerMinute)}″, Dec ${smallText(uncorrected.dec.driftArcsecPerMinute)}″ per min.`
    : missing(run, 'uncorrected');
  return { name: 'Drift left after guiding', ra: left(ra), dec: left(dec), note: open };
}

function polarAlignment(run: Run): Told {
  const found = run.polarAlignment;
  const name = 'Polar alignment error';
  if (!found) return { name, ra: NO_VALUE, dec: NO_VALUE, note: missing(run, 'polarAlignment') };
  const { solved } = found;
  const note = solved
    ? `${arcminText(solved.totalArcmin)} ± ${arcminText(solved.standardErrorArcmin)} in all: azimuth ${arcminText(solved.azimuthArcmin)} on the sky, altitude ${arcminText(solved.altitudeArcmin)}.`
    : 'Its two parts need runs at different hour angles.';
  return { name, ra: NO_VALUE, dec: `at least ${arcminText(found.atLeastArcmin)}`, note };
}

function uncorrected(run: Run): Told {
  const found = run.uncorrected;
  return {
    name: 'Motion with corrections undone',
    ra: either(found?.ra, (axis) => `${arcsecText(axis.rmsArcsec)} RMS`),
    dec: either(found?.dec, (axis) => `${arcsecText(axis.rmsArcsec)} RMS`),
    note: found
      ? `Peak to peak: RA ${arcsecText(found.ra.peakToPeakArcsec)}, Dec ${arcsecText(found.dec.peakToPeakArcsec)}.`
      : missing(run, 'uncorrected'),
  };
}

function backlash(run: Run): Told {
  const found = run.backlash;
  const name = 'Backlash';
  if (!found) return { name, ra: NO_VALUE, dec: NO_VALUE, note: missing(run, 'backlash') };
  const range = `95 % range ${arcsecText(found.low)} to ${arcsecText(found.high)}, ${found.reversals} reversals.`;
  return {
    name,
    ra: NO_VALUE,
    dec: found.determined ? arcsecText(found.arcsec) : `under ${arcsecText(found.high)}`,
    note: found.determined ? range : `Not determined: ${range}`,
  };
}

function response(run: Run): Told {
  const found = run.response;
  type Axis = NonNullable<typeof found>['ra'];
  const text = (axis: Axis): string =>
    `${arcsecText(axis.positiveArcsecPerSecond)} and ${arcsecText(axis.negativeArcsecPerSecond)} per s`;
  return {
    name: 'Response, + and −',
    ra: either(found?.ra, text),
    dec: either(found?.dec, text),
    note: found
      ? `Expected: RA ${arcsecText(found.ra.expectedArcsecPerSecond)}, Dec ${arcsecText(found.dec.expectedArcsecPerSecond)} per second; taken from the ${found.ra.from === 'rig' ? 'rig' : 'log'}.`
      : missing(run, 'response'),
  };
}

function asymmetry(run: Run): Told {
  const found = run.response;
  return {
    name: 'Unevenness of the response',
    ra: percentText(found?.ra.asymmetry ?? null),
    dec: percentText(found?.dec.asymmetry ?? null),
    note: found ? 'Difference of the two directions over their mean.' : missing(run, 'response'),
  };
}

function gain(run: Run): Told {
  const { ra, dec } = run.loop;
  type Axis = NonNullable<typeof ra>;
  const text = (axis: Axis): string =>
    axis.gain === null
      ? NO_VALUE
      : `${ratioText(axis.gain)} ± ${smallText(axis.gainStandardError)}`;
  const best = [ra, dec].map((axis) => ratioText(axis?.bestGain ?? null));
  return {
    name: 'Gain of the corrections',
    ra: either(ra, text),
    dec: either(dec, text),
    note:
      ra || dec
        ? `Best for this noise and this mount: RA ${best[0] ?? NO_VALUE}, Dec ${best[1] ?? NO_VALUE}.`
        : missing(run, 'loop'),
  };
}

function seeingFloor(run: Run): Told {
  const found = run.seeingFloor;
  return {
    name: 'Seeing floor',
    ra: arcsecText(found?.raArcsec ?? null),
    dec: arcsecText(found?.decArcsec ?? null),
    note: found
      ? 'What changes from frame to frame and no mount motion explains.'
      : missing(run, 'seeingFloor'),
  };
}
