import { type RunSeries, SET_ASIDE_CODES } from '../series/run-series';
import { guideAgain } from './guide-again';
import { loopLaw, type LoopLaw } from './loop-law';
import { summedBefore } from './motion-frames';
import { type AxisMotion, type MountMotion } from './mount-motion';

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
  readonly parts: Readonly<Record<Exclude<Cure, 'backlash'>, Float64Array | null>>;
}

/** Both axes of a run, or null where the corrections do not tell the star's own motion. */
export function replayableAxes(
  run: RunSeries,
  motion: MountMotion,
  bumps: { readonly ra: Float64Array | null; readonly dec: Float64Array | null },
): { readonly ra: ReplayableAxis; readonly dec: ReplayableAxis } | null {
  const { uncorrected, loop, decPlay } = motion;
  const gap = 'determined' in decPlay && decPlay.determined ? decPlay.arcsec : 0;
  const ra = replayableAxis(
    run,
    { error: run.raErrorArcsec, motion: motion.ra, gain: loop.ra?.gain ?? 0, gap: 0 },
    (uncorrected?.ra.driftArcsecPerMinute ?? 0) / 60,
    bumps.ra,
  );
  const dec = replayableAxis(
    run,
    { error: run.decErrorArcsec, motion: motion.dec, gain: loop.dec?.gain ?? 0, gap },
    (uncorrected?.dec.driftArcsecPerMinute ?? 0) / 60,
    bumps.dec,
  );
  return ra && dec && { ra, dec };
}

function replayableAxis(
  run: RunSeries,
  axis: {
    readonly error: Float64Array;
    readonly motion: AxisMotion;
    readonly gain: number;
    readonly gap: number;
  },
  driftPerSecond: number,
  bumps: Float64Array | null,
): ReplayableAxis | null {
  const { commandArcsec, displacementArcsec, uncorrectedArcsec, smoothArcsec } = axis.motion;
  if (commandArcsec === null || displacementArcsec === null) return null;
  if (uncorrectedArcsec === null || smoothArcsec === null) return null;
  const moved = summedBefore(displacementArcsec);
  const drift = run.timeSeconds.map((time) => driftPerSecond * time);
  const starArcsec = axis.error.map((error, n) => error - (moved[n] ?? 0));
  const restAt = (n: number) => (uncorrectedArcsec[n] ?? NaN) - (smoothArcsec[n] ?? NaN);
  return {
    law: loopLaw(axis.error, commandArcsec, axis.gain),
    starArcsec,
    smoothStarArcsec: starArcsec.map((star, n) => star - restAt(n)),
    gapArcsec: axis.gap,
    parts: {
      drift,
      'periodic error': smoothArcsec.map((smooth, n) => smooth - (drift[n] ?? 0)),
      'gusts and bumps': bumps,
    },
  };
}

/** The error that one axis would have shown, a value a frame; NaN where no star was measured. O(n). */
export function replayAxis(axis: ReplayableAxis, change: ReplayChange): Float64Array {
  const cured = change.cured ?? [];
  const star = Float64Array.from(axis.starArcsec);
  for (const cure of cured) {
    if (cure === 'backlash') continue;
    const parts = axis.parts[cure];
    // The guider takes the star where it stands: what is cured must not start with a jump.
    const start = parts?.[0] ?? 0;
    parts?.forEach((part, n) => {
      star[n] = (star[n] ?? NaN) - (part - start);
    });
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
  axes: { readonly ra: ReplayableAxis; readonly dec: ReplayableAxis },
  change: { readonly ra: ReplayChange; readonly dec: ReplayChange },
): RunSeries {
  const raErrorArcsec = replayAxis(axes.ra, change.ra);
  const decErrorArcsec = replayAxis(axes.dec, change.dec);
  const setAside = Uint8Array.from(run.setAside);
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
