import { type RunSeries, SET_ASIDE_CODES } from '../series/run-series';
import { bumpsOf } from './bumps';
import { guideAgain } from './guide-again';
import { loopLaw, type LoopLaw } from './loop-law';
import { summedBefore } from './motion-frames';
import { type MountMotion } from './mount-motion';

/** What a replay takes as given; shown wherever its figures are. */
export const REPLAY_ASSUMPTIONS: readonly string[] = [
  'The seeing, the gusts and the motion of the mount are those of the night.',
  'The star moves by what a correction commands, in proportion, once a gap is taken up.',
  'Exposures stay as long as they were: a longer guide interval leaves frames unanswered.',
];

export const CURES = ['periodic error', 'drift', 'backlash', 'gusts and bumps'] as const;
export type Cure = (typeof CURES)[number];

/** What is done otherwise on one axis; what is left out stays as it was. */
export interface ReplayChange {
  readonly gain?: number;
  readonly minimumMoveArcsec?: number;
  /** Corrects after every so many frames, a whole number from 1. */
  readonly everyFrames?: number;
  readonly cured?: readonly Cure[];
}

/** One axis of a night, ready to be guided again. */
export interface ReplayableAxis {
  /** The law that the night was guided by. */
  readonly law: LoopLaw;
  /** As for `GuideAgainInput`. */
  readonly starArcsec: Float64Array;
  readonly gapArcsec: number;
  /** `starArcsec` with drift, lines and dither jumps alone. */
  readonly smoothStarArcsec: Float64Array;
  /** Parts of `starArcsec` that a cure takes away. */
  readonly parts: Readonly<Record<Exclude<Cure, 'backlash'>, Float64Array>>;
}

export interface ReplayableAxes {
  readonly ra: ReplayableAxis;
  readonly dec: ReplayableAxis;
}

/** A loop of this gain or more does not settle (REFERENCE 11): the corrections of a night that held are not what they say. */
const RUNS_AWAY_GAIN = 2;

/** Both axes of a run, or null where one of them cannot be replayed. O(n). */
export function replayableAxes(run: RunSeries, motion: MountMotion): ReplayableAxes | null {
  const ra = replayableAxis(run, motion, 'ra');
  const dec = replayableAxis(run, motion, 'dec');
  return ra && dec && { ra, dec };
}

/**
 * One axis of a run, or null where the log does not tell what its corrections moved, or the gain that they were given with, or
 * tells a gain at which no loop holds.
 * O(n).
 */
export function replayableAxis(
  run: RunSeries,
  motion: MountMotion,
  axis: 'ra' | 'dec',
): ReplayableAxis | null {
  const { commandArcsec, displacementArcsec, uncorrectedArcsec } = motion[axis];
  const { smoothArcsec, driftArcsec } = motion[axis];
  if (commandArcsec === null || displacementArcsec === null) return null;
  if (uncorrectedArcsec === null || smoothArcsec === null || driftArcsec === null) return null;
  const guided = commandArcsec.some((command) => command !== 0);
  const gain = guided ? motion.loop[axis]?.gain : 0;
  if (gain === null || gain === undefined || gain >= RUNS_AWAY_GAIN) return null;

  const error = axis === 'ra' ? run.raErrorArcsec : run.decErrorArcsec;
  const moved = summedBefore(displacementArcsec);
  const starArcsec = error.map((value, n) => value - (moved[n] ?? 0));
  const rest = uncorrectedArcsec.map((value, n) => value - (smoothArcsec[n] ?? NaN));
  const { decPlay } = motion;
  const gapKnown = axis === 'dec' && 'determined' in decPlay && decPlay.determined;
  return {
    law: loopLaw(error, commandArcsec, gain),
    starArcsec,
    smoothStarArcsec: starArcsec.map((star, n) => star - (rest[n] ?? NaN)),
    gapArcsec: gapKnown ? decPlay.arcsec : 0,
    parts: {
      drift: driftArcsec,
      'periodic error': smoothArcsec.map((smooth, n) => smooth - (driftArcsec[n] ?? 0)),
      'gusts and bumps': bumpsOf(rest, run.cadenceSeconds),
    },
  };
}

/** The error that one axis would have shown, a value a frame; NaN where no star was measured. O(n). */
export function replayAxis(axis: ReplayableAxis, change: ReplayChange): Float64Array {
  const cured = change.cured ?? [];
  const star = cured.length > 0 ? axis.starArcsec.slice() : axis.starArcsec;
  for (const cure of cured) {
    if (cure === 'backlash') continue;
    const parts = axis.parts[cure];
    // The guider takes the star where it stands: what is cured must not start with a jump.
    const start = parts[0] ?? 0;
    for (let n = 0; n < star.length; n++) {
      star[n] = (star[n] ?? NaN) - ((parts[n] ?? NaN) - start);
    }
  }
  return guideAgain({
    starArcsec: star,
    law: {
      ...axis.law,
      gain: change.gain ?? axis.law.gain,
      minimumMoveArcsec: change.minimumMoveArcsec ?? axis.law.minimumMoveArcsec,
    },
    gapArcsec: cured.includes('backlash') ? 0 : axis.gapArcsec,
    everyFrames: change.everyFrames ?? 1,
  });
}

const SETTLED_SIGMAS = 2;
const SETTLED_FRAMES = 3;
const SETTLING = SET_ASIDE_CODES.indexOf('settling');

/**
 * The run as it would have been, ready for every measure that takes a run: its errors replaced, and what settles more
 * slowly after a dither set aside for longer (SCIENCE 1: until three frames lie within two sigmas). O(n).
 */
export function replayedRun(
  run: RunSeries,
  axes: ReplayableAxes,
  change: { readonly ra: ReplayChange; readonly dec: ReplayChange },
): RunSeries {
  const raErrorArcsec = replayAxis(axes.ra, change.ra);
  const decErrorArcsec = replayAxis(axes.dec, change.dec);
  const setAside = run.setAside.slice();
  const within = {
    ra: SETTLED_SIGMAS * keptRms(raErrorArcsec, run.setAside),
    dec: SETTLED_SIGMAS * keptRms(decErrorArcsec, run.setAside),
  };
  for (const dither of run.ditherFrames) {
    let quiet = 0;
    for (let n = dither; n < run.count && quiet < SETTLED_FRAMES; n++) {
      if (setAside[n] === 0) setAside[n] = SETTLING;
      const settled =
        Math.abs(raErrorArcsec[n] ?? NaN) <= within.ra &&
        Math.abs(decErrorArcsec[n] ?? NaN) <= within.dec;
      quiet = settled ? quiet + 1 : 0;
    }
  }
  return { ...run, raErrorArcsec, decErrorArcsec, setAside };
}

/** RMS about the mean over the frames that count. */
export function keptRms(errorArcsec: Float64Array, setAside: Uint8Array): number {
  let [count, sum, squares] = [0, 0, 0];
  for (let n = 0; n < errorArcsec.length; n++) {
    if (setAside[n] !== 0) continue;
    count++;
    sum += errorArcsec[n] ?? NaN;
  }
  const mean = sum / count;
  for (let n = 0; n < errorArcsec.length; n++) {
    if (setAside[n] === 0) squares += ((errorArcsec[n] ?? NaN) - mean) ** 2;
  }
  return Math.sqrt(squares / count);
}
