import { linearTrend, type NightScenario, type SimulatedNight } from '@stillpier/analysis';
import type { Claim } from './sample';

const GUIDING = 0;
const DITHER = 1;
const SETTLING = 2;
const STAR_LOST = 3;

/** Frames of a run of the simulated night, 0 for the first. */
function framesOf({ frames }: SimulatedNight, run: number): number[] {
  return [...(frames.run ?? [])].flatMap((code, frame) => (code === run ? [frame] : []));
}

function countState(night: SimulatedNight, run: number, ...states: number[]): number {
  const of = night.frames.state ?? [];
  return framesOf(night, run).filter((frame) => states.includes(of[frame] ?? GUIDING)).length;
}

/** Population RMS about the mean over the frames that are guided, straight from the simulated errors. */
function guidedRms(night: SimulatedNight, run: number, errors: Float64Array): number {
  const used = framesOf(night, run)
    .filter((frame) => night.frames.state?.[frame] === GUIDING)
    .map((frame) => errors[frame] ?? NaN);
  const mean = used.reduce((sum, error) => sum + error, 0) / used.length;
  return Math.sqrt(used.reduce((sum, error) => sum + (error - mean) ** 2, 0) / used.length);
}

/** For logs whose times tell the instant. */
export function startClaim({ frames }: SimulatedNight): Claim {
  const start = new Date((frames.startEpochSeconds ?? NaN) * 1000).toISOString();
  return textClaim('runs[0].start', 'start', start.replace('.000Z', 'Z'));
}

export function countClaims(night: SimulatedNight, run: number): Claim[] {
  const at = `runs[${run}]`;
  const count = (key: string, says: string, value: number): Claim => ({
    path: `${at}.${key}`,
    says,
    unit: '',
    value,
    within: 0,
  });
  return [
    count('frames', 'frames', framesOf(night, run).length),
    count('used', 'frames that count', countState(night, run, GUIDING)),
  ];
}

/** How many frames are set aside as a dither or its settling, and for want of a star. */
export function setAsideClaims(night: SimulatedNight, run: number): Claim[] {
  return [
    setAsideClaim(run, 'dither', countState(night, run, DITHER)),
    setAsideClaim(run, 'settling', countState(night, run, SETTLING)),
    setAsideClaim(run, 'star lost', countState(night, run, STAR_LOST)),
  ];
}

function setAsideClaim(run: number, reason: string, frames: number): Claim {
  return {
    path: `runs[${run}].setAside[${reason}].frames`,
    says: `frames set aside as ${reason}`,
    unit: '',
    value: frames,
    within: 0,
  };
}

/**
 * The same where no column tells of dithers. Every one is found; but the star has settled for the analysis only when it
 * has stayed at rest for three frames, so that many for each may be set aside beside those that were simulated.
 */
export function ditherClaims(night: SimulatedNight, run: number): Claim[] {
  const dithers = countState(night, run, DITHER);
  return [
    setAsideClaim(run, 'dither', dithers),
    {
      path: `runs[${run}].used`,
      says: 'frames that count',
      unit: '',
      value: countState(night, run, GUIDING),
      within: 3 * dithers,
    },
  ];
}

/** @param within What writing the errors with few decimals may do to the RMS. */
export function rmsClaims(night: SimulatedNight, run: number, within = 0.001): Claim[] {
  const ra = guidedRms(night, run, night.frames.raError);
  const dec = guidedRms(night, run, night.frames.decError);
  const claim = (key: string, says: string, value: number): Claim => ({
    path: `runs[${run}].${key}.rmsArcsec`,
    says,
    unit: '″',
    value: rounded(value, 4),
    within,
  });
  return [
    claim('ra', 'RMS of the RA error', ra),
    claim('dec', 'RMS of the Dec error', dec),
    claim('total', 'RMS of both', Math.hypot(ra, dec)),
  ];
}

/** The worm's own error, at the axis: period, first harmonic and peak to peak. */
export function wormClaims({ drive }: NightScenario, run: number): Claim[] {
  const { periodSeconds, harmonics } = drive.worm;
  const first = harmonics.find(({ order }) => order === 1)?.amplitudeArcsec ?? 0;
  const curve = Array.from({ length: 3600 }, (_, step) =>
    harmonics.reduce((sum, { order, amplitudeArcsec, phaseDegrees }) => {
      const degrees = (order * step) / 10 + phaseDegrees;
      return sum + amplitudeArcsec * Math.cos((degrees * Math.PI) / 180);
    }, 0),
  );
  const peakToPeak = Math.max(...curve) - Math.min(...curve);
  const at = `runs[${run}].periodicError`;
  return [
    {
      path: `${at}.periodSeconds`,
      says: 'period of the worm',
      unit: 's',
      value: rounded(periodSeconds, 2),
      within: 0.02,
    },
    {
      path: `${at}.harmonics[0].amplitudeArcsec`,
      says: 'amplitude of its first harmonic',
      unit: '″',
      value: first,
      within: rounded(0.04 * first, 2),
    },
    {
      path: `${at}.peakToPeakArcsec`,
      says: 'periodic error, peak to peak',
      unit: '″',
      value: rounded(peakToPeak, 2),
      within: rounded(0.06 * peakToPeak, 2),
    },
  ];
}

/** Dec drift without a guider: the slope of the simulated motion. */
export function decDriftClaim(night: SimulatedNight, run: number): Claim {
  const frames = framesOf(night, run);
  const pick = (values: Float64Array) => Float64Array.from(frames, (frame) => values[frame] ?? NaN);
  const trend = linearTrend(pick(night.frames.timeSeconds), pick(night.truth.dec.openLoopArcsec));
  const perMinute = trend.slope * 60;
  return {
    path: `runs[${run}].uncorrected.dec.driftArcsecPerMinute`,
    says: 'Dec drift without corrections',
    unit: '″/min',
    value: rounded(perMinute, 3),
    within: rounded(Math.abs(perMinute) * 0.05, 3),
  };
}

export function seeingClaim({ seeing }: NightScenario, run: number, within: number): Claim {
  return {
    path: `runs[${run}].seeingFloor.decArcsec`,
    says: 'seeing floor in Dec',
    unit: '″',
    value: seeing.whiteSigmaArcsec,
    within,
  };
}

export function textClaim(path: string, says: string, value: string | null): Claim {
  return { path, says, unit: '', value, within: 0 };
}

export function numberClaim(
  path: string,
  says: string,
  unit: string,
  value: number,
  within: number,
): Claim {
  return { path, says, unit, value, within };
}

function rounded(value: number, decimals: number): number {
  return Number(value.toFixed(decimals));
}
