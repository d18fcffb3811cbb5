import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { analyseLog } from './analyse';
import { type Run } from './analysis-document';
import { NO_READING, unexplainedNulls, unwritableNumbers } from './document-fixture';
import { type RigDescription } from './rig-description';
import { type LogFrames } from './series/log-frames';
import { type NightScenario, PLAIN_NIGHT } from './simulation/night-scenario';
import { simulateNight } from './simulation/simulate-night';

const RIG: RigDescription = {
  mount: { wormPeriodSeconds: 240, guideRateSidereal: 0.5 },
  imaging: { focalLengthMm: 530, apertureMm: 106, pixelUm: 3.76 },
  guiding: { focalLengthMm: 240, apertureMm: 50, pixelUm: 3.75 },
  seeingFwhmArcsec: 2,
};
/** Twenty minutes with something of everything. */
const NIGHT: NightScenario = {
  ...PLAIN_NIGHT,
  runs: PLAIN_NIGHT.runs.map((run) => ({ ...run, durationSeconds: 1200 })),
  drive: { ...PLAIN_NIGHT.drive, decBacklashArcsec: 1 },
  polar: { azimuthArcmin: 4, altitudeArcmin: 2 },
  gusts: { perHour: 12, sizeArcsec: 3, fadeSeconds: 3 },
};
const ofNight = (seed: number) => simulateNight(NIGHT, seed).frames;
const analysed = (frames: LogFrames) => analyseLog(frames, NO_READING, RIG, {}).runs;
const only = (frames: LogFrames): Run => analysed(frames)[0]!;
const seeds = fc.integer({ min: 1, max: 10_000 });
const settings = { numRuns: 12 };

/** Relative to the larger of the two and a thousandth of an arcsecond; sums of 600 frames lose no more. */
const alike = (a: number, b: number, relative = 1e-9) =>
  Math.abs(a - b) <= relative * Math.max(Math.abs(a), Math.abs(b), 1e-3);
const expectAlike = (a: number, b: number, relative?: number) => {
  expect(alike(a, b, relative), `${a} and ${b}`).toBe(true);
};

/** The same frames in axes turned by an angle, the corrections left out: a guider does not know turned axes. */
function turned(frames: LogFrames, angle: number): LogFrames {
  const [c, s] = [Math.cos(angle), Math.sin(angle)];
  const { raError: ra, decError: dec } = frames;
  return {
    ...frames,
    raError: ra.map((east, i) => c * east + s * dec[i]!),
    decError: dec.map((north, i) => c * north - s * ra[i]!),
    raCorrection: null,
    decCorrection: null,
  };
}

describe('the figures change as physics says', () => {
  it('a lock position elsewhere moves the means alone', () => {
    const offsets = fc.double({ min: -20, max: 20, noNaN: true });
    fc.assert(
      fc.property(seeds, offsets, offsets, (seed, east, north) => {
        const frames = turned(ofNight(seed), 0);
        const [before, after] = [
          only(frames),
          only({
            ...frames,
            raError: frames.raError.map((error) => error + east),
            decError: frames.decError.map((error) => error + north),
          }),
        ];
        expectAlike(after.ra!.meanArcsec - before.ra!.meanArcsec, east, 1e-8);
        expectAlike(after.dec!.meanArcsec - before.dec!.meanArcsec, north, 1e-8);
        for (const axis of ['ra', 'dec'] as const) {
          expectAlike(after[axis]!.rmsArcsec, before[axis]!.rmsArcsec);
          expectAlike(after[axis]!.peakToPeakArcsec, before[axis]!.peakToPeakArcsec);
          expectAlike(after[axis]!.driftArcsecPerMinute, before[axis]!.driftArcsecPerMinute, 1e-7);
        }
        expectAlike(after.footprint!.aspect, before.footprint!.aspect);
        expectAlike(after.correlation!, before.correlation!, 1e-8);
      }),
      settings,
    );
  });

  it('a log that starts at another second has the same figures', () => {
    fc.assert(
      fc.property(seeds, fc.integer({ min: 1, max: 500_000 }), (seed, later) => {
        const frames = ofNight(seed);
        const timeSeconds = frames.timeSeconds.map((time) => time + later);
        const [before, after] = [only(frames), only({ ...frames, timeSeconds })];
        expectAlike(after.total!.rmsArcsec, before.total!.rmsArcsec);
        expectAlike(
          after.periodicError!.peakToPeakArcsec,
          before.periodicError!.peakToPeakArcsec,
          1e-4,
        );
        expect(after.findings.map(({ code }) => code)).toEqual(
          before.findings.map(({ code }) => code),
        );
      }),
      settings,
    );
  });

  it('errors and corrections twice as large make every length twice as large and leave the loop alone', () => {
    const factors = fc.double({ min: 0.25, max: 4, noNaN: true });
    fc.assert(
      fc.property(seeds, factors, (seed, factor) => {
        const { guider } = NIGHT;
        const inArcsec: NightScenario = {
          ...NIGHT,
          guider: { ...guider, correctionUnit: 'arcsec' },
        };
        const { frames } = simulateNight(inArcsec, seed);
        const larger = (values: Float64Array | null) => values?.map((v) => factor * v) ?? null;
        const [before, after] = [
          only(frames),
          only({
            ...frames,
            raError: frames.raError.map((error) => factor * error),
            decError: frames.decError.map((error) => factor * error),
            raCorrection: larger(frames.raCorrection),
            decCorrection: larger(frames.decCorrection),
          }),
        ];
        for (const axis of ['ra', 'dec'] as const) {
          expectAlike(after[axis]!.rmsArcsec, factor * before[axis]!.rmsArcsec);
          expectAlike(after.loop[axis]!.gain!, before.loop[axis]!.gain!);
          before.budget![axis].forEach(({ share }, i) => {
            expect(Math.abs(after.budget![axis][i]!.share - share)).toBeLessThan(1e-3);
          });
        }
        // The trials of the walk stop at a step, not at a figure: a rounding may end them one step apart.
        const size = (run: Run) => run.periodicError!.peakToPeakArcsec;
        expectAlike(size(after), factor * size(before), 0.01);
      }),
      settings,
    );
  });

  it('turned axes turn the star and leave its shape and the total alone', () => {
    const angles = fc.double({ min: -Math.PI, max: Math.PI, noNaN: true });
    fc.assert(
      fc.property(seeds, angles, (seed, angle) => {
        const frames = ofNight(seed);
        const [before, after] = [only(turned(frames, 0)), only(turned(frames, angle))];
        expectAlike(after.total!.rmsArcsec, before.total!.rmsArcsec);
        expectAlike(after.total!.p95Arcsec, before.total!.p95Arcsec);
        expectAlike(after.footprint!.aspect, before.footprint!.aspect);
        expectAlike(after.footprint!.fwhmMajorArcsec, before.footprint!.fwhmMajorArcsec);
        // From north through east: new axes turned by +angle from east to north add it. Directions repeat at 180°.
        const wanted = before.footprint!.positionAngleDegrees + (180 / Math.PI) * angle;
        const off = after.footprint!.positionAngleDegrees - wanted;
        expect(Math.abs(off - 180 * Math.round(off / 180))).toBeLessThan(1e-6);
      }),
      settings,
    );
  });

  it('errors and corrections of the other sign have the same sizes', () => {
    const negative = (values: Float64Array | null) => values?.map((v) => -v) ?? null;
    fc.assert(
      fc.property(seeds, (seed) => {
        const frames = ofNight(seed);
        const [before, after] = [
          only(frames),
          only({
            ...frames,
            raError: frames.raError.map((error) => -error),
            decError: frames.decError.map((error) => -error),
            raCorrection: negative(frames.raCorrection),
            decCorrection: negative(frames.decCorrection),
          }),
        ];
        expectAlike(after.ra!.meanArcsec, -before.ra!.meanArcsec);
        expectAlike(after.ra!.driftArcsecPerMinute, -before.ra!.driftArcsecPerMinute);
        expectAlike(after.total!.rmsArcsec, before.total!.rmsArcsec);
        expectAlike(after.loop.ra!.gain!, before.loop.ra!.gain!);
        const size = (run: Run) => run.periodicError!.peakToPeakArcsec;
        expectAlike(size(after), size(before), 1e-3);
      }),
      settings,
    );
  });

  it('a log cut in two has the frames, the mean and the variance of the whole in its parts', () => {
    fc.assert(
      fc.property(seeds, fc.integer({ min: 60, max: 540 }), (seed, cut) => {
        const frames = turned(ofNight(seed), 0);
        const run = Int32Array.from({ length: frames.count }, (_, i) => (i < cut ? 0 : 1));
        const whole = only(frames);
        const parts = analysed({ ...frames, run, runNames: ['first', 'second'] });
        expect(parts.map((part) => part.frames)).toEqual([cut, frames.count - cut]);
        const used = parts.map((part) => part.used);
        const weighted = (value: (part: Run) => number) =>
          parts.reduce((sum, part, i) => sum + used[i]! * value(part), 0) / whole.used;
        expect(used[0]! + used[1]!).toBe(whole.used);
        for (const axis of ['ra', 'dec'] as const) {
          const mean = weighted((part) => part[axis]!.meanArcsec);
          const square = weighted((part) => part[axis]!.rmsAboutLockArcsec ** 2);
          expectAlike(mean, whole[axis]!.meanArcsec);
          expectAlike(Math.sqrt(square - mean ** 2), whole[axis]!.rmsArcsec);
        }
      }),
      settings,
    );
  });
});

describe('a spoiled night', () => {
  type Column = 'timeSeconds' | 'raError' | 'decError' | 'raCorrection' | 'decCorrection';
  const errorsOrCorrections = fc.constantFrom<Column>(
    'raError',
    'decError',
    'raCorrection',
    'decCorrection',
  );
  const place = fc.integer({ min: 0, max: 599 });
  const overwritten = (
    frames: LogFrames,
    column: Column,
    from: number,
    count: number,
    value: (at: number) => number,
  ): LogFrames => {
    const values = frames[column]?.slice() ?? null;
    for (let i = from; values && i < Math.min(values.length, from + count); i++)
      values[i] = value(i);
    return { ...frames, [column]: values };
  };
  type Fault = (frames: LogFrames) => LogFrames;
  const faults: fc.Arbitrary<Fault> = fc.oneof(
    // Stars that were lost, columns that stand still, numbers that no sky has.
    fc
      .tuple(
        errorsOrCorrections,
        place,
        fc.integer({ min: 1, max: 600 }),
        fc.constantFrom(NaN, 0, 3, -0.001, 1e9, 1e150, -1e150),
      )
      .map(
        ([column, from, count, value]): Fault =>
          (frames) =>
            overwritten(frames, column, from, count, () => value),
      ),
    // Frames that carry one time, a few of them or all.
    fc.tuple(place, fc.constantFrom(2, 5, 40, 600)).map(
      ([from, count]): Fault =>
        (frames) =>
          overwritten(frames, 'timeSeconds', from, count, () => frames.timeSeconds[from]!),
    ),
    // Cadences from nothing to an hour.
    fc.constantFrom(0, 1e-6, 0.1, 60, 3600).map((factor): Fault => (frames) => ({
      ...frames,
      timeSeconds: frames.timeSeconds.map((time) => factor * time),
    })),
    fc.constantFrom<Fault>(
      (frames) => ({ ...frames, raCorrection: null }),
      (frames) => ({ ...frames, correctionUnit: 'arcsec' }),
      (frames) => ({ ...frames, errorUnit: 'guide px' }),
      (frames) => ({ ...frames, correctionSign: 'opposite' }),
      (frames) => ({ ...frames, declinationDegrees: frames.timeSeconds.map(() => 90) }),
      (frames) => ({ ...frames, hourAngleHours: frames.timeSeconds.map(() => NaN) }),
    ),
    // A log that stops after its first frames.
    fc.constantFrom(1, 2, 29, 30, 31, 45).map(
      (count): Fault =>
        (frames) =>
          shortened(frames, count),
    ),
  );

  function shortened(frames: LogFrames, most: number): LogFrames {
    const count = Math.min(most, frames.count);
    const cut = <T extends Float64Array | Int32Array | Uint8Array>(values: T | null) =>
      values && (values.slice(0, count) as T);
    return {
      ...frames,
      count,
      timeSeconds: frames.timeSeconds.slice(0, count),
      raError: frames.raError.slice(0, count),
      decError: frames.decError.slice(0, count),
      raCorrection: cut(frames.raCorrection),
      decCorrection: cut(frames.decCorrection),
      snr: cut(frames.snr),
      brightness: cut(frames.brightness),
      state: cut(frames.state),
      run: cut(frames.run),
      target: cut(frames.target),
      declinationDegrees: cut(frames.declinationDegrees),
      hourAngleHours: cut(frames.hourAngleHours),
      pierSide: cut(frames.pierSide),
    };
  }

  it('leaves no NaN and no null without its reason, and its shares add up', () => {
    fc.assert(
      fc.property(seeds, fc.array(faults, { minLength: 1, maxLength: 4 }), (seed, all) => {
        const frames = all.reduce((spoiled, fault) => fault(spoiled), ofNight(seed));
        const document = analyseLog(frames, NO_READING, RIG, {});
        expect(unwritableNumbers(document, '')).toEqual([]);
        for (const run of document.runs) {
          expect(unexplainedNulls(run, '', run.whyMissing)).toEqual([]);
          for (const parts of run.budget ? [run.budget.ra, run.budget.dec] : []) {
            const sum = parts.reduce((total, { share }) => total + share, 0);
            expect(Math.min(...parts.map(({ share }) => share))).toBeGreaterThanOrEqual(0);
            expect(Math.abs(sum - 1)).toBeLessThan(1e-9);
          }
        }
      }),
      { numRuns: 120 },
    );
  });
});
