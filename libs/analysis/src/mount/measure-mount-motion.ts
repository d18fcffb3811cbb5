import { type RigDescription } from '../rig-description';
import { type RunSeries } from '../series/run-series';
import { rigWormPeriodSeconds } from '../spectrum/gear-periods';
import { type CorrectionSign, correctionSignFromLog } from './correction-sign';
import { foldedCurve } from './folded-curve';
import { describeLoop } from './loop';
import { boundSentence } from './axis-reasons';
import { measureAxis, type MeasuredAxis } from './measure-axis';
import { motionFrames } from './motion-frames';
import { type MountMotion, NO_MOTION } from './mount-motion';
import { findDecPlay } from './dec-play';
import { expectedPerUnit } from './response';
import { describePeriodicError } from './worm-curve';

const FEWEST_FRAMES = 30;
/** Beyond this declination 1/cos would make any error of it large. */
const LARGEST_DECLINATION_DEGREES = 89;

/**
 * Everything that the corrections of one run tell of the mount: response, uncorrected motion, periodic error, loop,
 * seeing floor (SCIENCE 2 to 4). What cannot be told is null, with a sentence under its key in `whyMissing`.
 * O(n log n).
 */
export function measureMountMotion(run: RunSeries, rig: RigDescription): MountMotion {
  const { raCorrection, decCorrection } = run;
  const frames = {
    ra: motionFrames(run, run.raErrorArcsec),
    dec: motionFrames(run, run.decErrorArcsec),
  };
  const count = (used: Uint8Array) => used.reduce((sum, each) => sum + each, 0);
  const fewest = Math.min(count(frames.ra.used), count(frames.dec.used));
  if (fewest < FEWEST_FRAMES) {
    return withoutCorrections(
      run,
      `Only ${fewest} frames of this run can be used; ${FEWEST_FRAMES} are needed.`,
    );
  }
  if (raCorrection === null && decCorrection === null) {
    return withoutCorrections(run, 'The log has no corrections.');
  }
  const signs = correctionSigns(run, {
    ra: raCorrection && correctionSignFromLog(frames.ra, run.raErrorArcsec, raCorrection),
    dec: decCorrection && correctionSignFromLog(frames.dec, run.decErrorArcsec, decCorrection),
  });
  const cosDeclination = cosineOf(run.declinationDegrees);
  const guideRateSidereal = rig.mount?.guideRateSidereal;
  const ra = measureAxis({
    run,
    correctionUnit: run.correctionUnit,
    guideRateSidereal,
    axis: 'ra',
    frames: frames.ra,
    errorArcsec: run.raErrorArcsec,
    correction: raCorrection,
    sign: signs.ra,
    skyPerAxisAngle: cosDeclination,
    playWidth: 0,
    worm: { periodSeconds: rigWormPeriodSeconds(rig) },
  });
  const decPlay = findDecPlay(run, decCorrection, {
    sign: signs.dec,
    ra: ra.motion.responseUsed,
    cosDeclination,
    expected: expectedPerUnit(run.correctionUnit, guideRateSidereal, 1),
  });
  const dec = measureAxis({
    run,
    correctionUnit: run.correctionUnit,
    guideRateSidereal,
    axis: 'dec',
    frames: frames.dec,
    errorArcsec: run.decErrorArcsec,
    correction: decCorrection,
    sign: signs.dec,
    skyPerAxisAngle: 1,
    playWidth: 'why' in decPlay.fit ? 0 : decPlay.fit.determined ? decPlay.widthUnits : 0,
    worm: null,
  });
  return gathered(run, ra, dec, cosDeclination, decPlay.fit);
}

/** The map's word, else the log's own, else that of the other axis. */
function correctionSigns(
  run: RunSeries,
  log: { readonly ra: 1 | -1 | null; readonly dec: 1 | -1 | null },
): { readonly ra: CorrectionSign | null; readonly dec: CorrectionSign | null } {
  if (run.correctionSign !== null) {
    const told: CorrectionSign = { sign: run.correctionSign === 'same' ? 1 : -1, from: 'map' };
    return { ra: told, dec: told };
  }
  const fromLog = (own: 1 | -1 | null, other: 1 | -1 | null): CorrectionSign | null => {
    const sign = own ?? other;
    return sign === null ? null : { sign, from: 'log' };
  };
  return { ra: fromLog(log.ra, log.dec), dec: fromLog(log.dec, log.ra) };
}

function cosineOf(declinationDegrees: number | null): number | null {
  if (declinationDegrees === null) return null;
  if (Math.abs(declinationDegrees) > LARGEST_DECLINATION_DEGREES) return null;
  return Math.cos((declinationDegrees * Math.PI) / 180);
}

function gathered(
  run: RunSeries,
  ra: MeasuredAxis,
  dec: MeasuredAxis,
  cosDeclination: number | null,
  decPlay: MountMotion['decPlay'],
): MountMotion {
  const { worm, wormMotion } = ra;
  const whyMissing = { ...dec.why, ...ra.why };
  let periodicError: MountMotion['periodicError'] = null;
  if (worm !== null && 'harmonics' in worm && wormMotion !== null) {
    const kept = wormMotion.map((value, n) => (run.setAside[n] === 0 ? value : NaN));
    const curve = foldedCurve(run.timeSeconds, kept, worm.periodSeconds);
    periodicError = describePeriodicError(worm, curve, cosDeclination);
  } else if (worm !== null && 'why' in worm) {
    whyMissing['periodicError'] = worm.why;
  }
  const { uncorrected: raMotion } = ra;
  const { uncorrected: decMotion } = dec;
  return {
    response: { ra: ra.response, dec: dec.response },
    uncorrected: raMotion && decMotion && { ra: raMotion, dec: decMotion },
    periodicError,
    loop: { ra: ra.loop, dec: dec.loop },
    seeingFloor: { raArcsec: ra.floorArcsec, decArcsec: dec.floorArcsec },
    whyMissing,
    ra: ra.motion,
    dec: dec.motion,
    decPlay,
  };
}

function withoutCorrections(run: RunSeries, why: string): MountMotion {
  const { setAside, timeSeconds, cadenceSeconds } = run;
  const loopOf = (errorArcsec: Float64Array) =>
    describeLoop({ errorArcsec, setAside, timeSeconds, cadenceSeconds }, null, null);
  const loop = { ra: loopOf(run.raErrorArcsec), dec: loopOf(run.decErrorArcsec) };
  const bound = (errorArcsec: Float64Array) =>
    boundSentence(errorArcsec, motionFrames(run, errorArcsec));
  return {
    response: null,
    uncorrected: null,
    periodicError: null,
    loop,
    seeingFloor: null,
    whyMissing: {
      response: why,
      uncorrected: why,
      periodicError: why,
      ...nullReasons('loop.ra', loop.ra, why),
      ...nullReasons('loop.dec', loop.dec, why),
      seeingFloor: `RA: ${bound(run.raErrorArcsec)} Dec: ${bound(run.decErrorArcsec)}`,
    },
    ra: NO_MOTION,
    dec: NO_MOTION,
    decPlay: { why },
  };
}

function nullReasons(path: string, part: object, why: string): Record<string, string> {
  const missing = Object.entries(part).filter(([, value]) => value === null);
  return Object.fromEntries(missing.map(([key]) => [`${path}.${key}`, why]));
}
