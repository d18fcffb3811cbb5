import { at } from '../statistics/at';
import { median } from '../statistics/quantile';
import { type FrameRange, medianSpacing } from './cut-runs';
import { type LogFrames, PIER_SIDES } from './log-frames';
import { type RunSeries } from './run-series';
import { type ByHandRange, setAsideFrames } from './set-aside';

/** A whole turn of the sky: an error beyond it is no error of a star. */
const WHOLE_TURN_ARCSEC = 1_296_000;
/** No guider corrects for a day, or by a whole turn. */
const LARGEST_CORRECTION = { ms: 86_400_000, arcsec: WHOLE_TURN_ARCSEC };

/**
 * One run of a log in arcseconds on the sky, with the frames that do not count marked. A number
 * that no sky and no guider has (an overflow, a wrong column) tells nothing: the frame is then without a star, or without
 * a correction. O(n).
 *
 * @param range At least one frame; the cadence of a single one is 0.
 * @param arcsecPerUnit 1 for a log in arcseconds, the guide scale for one in guide pixels.
 * @param byHand Stretches that the user leaves out, seconds in the run.
 */
export function prepareRun(
  frames: LogFrames,
  range: FrameRange,
  arcsecPerUnit: number,
  byHand: readonly ByHandRange[],
): RunSeries {
  const { from, to } = range;
  const start = at(frames.timeSeconds, from);
  const timeSeconds = frames.timeSeconds.slice(from, to).map((time) => time - start);
  const inArcsec = (errors: Float64Array): Float64Array =>
    errors.slice(from, to).map((error) => {
      const arcsec = error * arcsecPerUnit;
      return Math.abs(arcsec) <= WHOLE_TURN_ARCSEC ? arcsec : NaN;
    });
  const raErrorArcsec = inArcsec(frames.raError);
  const decErrorArcsec = inArcsec(frames.decError);
  const largest = LARGEST_CORRECTION[frames.correctionUnit];
  const correction = (values: Float64Array | null): Float64Array | null =>
    values?.slice(from, to).map((value) => (Math.abs(value) <= largest ? value : 0)) ?? null;
  const { setAside, ditherFrames } = setAsideFrames(
    timeSeconds,
    raErrorArcsec,
    decErrorArcsec,
    frames.state?.subarray(from, to) ?? null,
    frames.raCorrection !== null || frames.decCorrection !== null,
    byHand,
  );
  return {
    count: to - from,
    timeSeconds,
    cadenceSeconds: to - from < 2 ? 0 : medianSpacing(timeSeconds),
    raErrorArcsec,
    decErrorArcsec,
    raCorrection: correction(frames.raCorrection),
    decCorrection: correction(frames.decCorrection),
    correctionUnit: frames.correctionUnit,
    correctionSign: frames.correctionSign,
    setAside,
    ditherFrames,
    declinationDegrees: usualDeclination(frames.declinationDegrees?.subarray(from, to) ?? null),
    hourAngleHours: frames.hourAngleHours?.slice(from, to) ?? null,
    pierSide: sideOfPier(frames.pierSide?.subarray(from, to) ?? null),
    startEpochSeconds: frames.startEpochSeconds === null ? null : frames.startEpochSeconds + start,
    target: targetName(frames, range),
  };
}

/** The target that the run's frames name; null when they name none. */
export function targetName(frames: LogFrames, { from, to }: FrameRange): string | null {
  const named = frames.target?.subarray(from, to).find((index) => index >= 0);
  return named === undefined ? null : (frames.targetNames[named] ?? null);
}

function usualDeclination(degrees: Float64Array | null): number | null {
  const told = degrees?.filter(Number.isFinite);
  return told === undefined || told.length === 0 ? null : median(told);
}

/** The side that the run's frames name; null when they name none or both. */
function sideOfPier(codes: Uint8Array | null): 'east' | 'west' | null {
  const sides = new Set(codes);
  const east = sides.has(PIER_SIDES.indexOf('east'));
  const west = sides.has(PIER_SIDES.indexOf('west'));
  if (east === west) return null;
  return east ? 'east' : 'west';
}
