import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { analyseLog, analyseLogWithSeries } from './analyse';
import { NO_READING, unexplainedNulls } from './document-fixture';
import { type RigDescription } from './rig-description';
import { plainFrames } from './series/frames-fixture';
import { FRAME_STATES, type LogFrames } from './series/log-frames';
import { PLAIN_NIGHT } from './simulation/night-scenario';
import { RandomSource } from './simulation/random-source';
import { simulateNight } from './simulation/simulate-night';

const reading = NO_READING;
const rig: RigDescription = {
  mount: { wormPeriodSeconds: 480, guideRateSidereal: 0.5 },
  imaging: { focalLengthMm: 530, apertureMm: 106, pixelUm: 3.76 },
  guiding: { focalLengthMm: 200, pixelUm: 3.75 },
  seeingFwhmArcsec: 2,
};
const noise = (count: number, seed: number, spacing = 2): LogFrames => {
  const random = new RandomSource(seed);
  const t = Float64Array.from({ length: count }, (_, i) => spacing * i);
  return plainFrames(
    t,
    t.map(() => 0.5 * random.normal()),
    t.map(() => 0.5 * random.normal()),
  );
};

/** JSON writes NaN and infinities as null: a document without them comes back as it went. */
const survivesJson = (document: object) => {
  expect(JSON.parse(JSON.stringify(document))).toEqual(document);
};

describe('the document of a simulated night', () => {
  const night = simulateNight(
    { ...PLAIN_NIGHT, dithers: { everySeconds: 320, sizeArcsec: 5, settledArcsec: 1.5 } },
    3,
  );
  const shares: number[] = [];
  const { document, runs } = analyseLogWithSeries(night.frames, reading, rig, {
    onProgress: (share) => shares.push(share),
  });
  const run = document.runs[0]!;

  it('has its one run with the worm named, and every null explained', () => {
    expect(document.runs).toHaveLength(1);
    expect(run.target).toBe('Field A');
    expect(run.start).toBe('2026-03-15T01:40:00Z');
    expect(run.frames).toBe(3600);
    expect(run.spectrum!.ra.peaks[0]!.label).toBe('worm');
    expect(run.spectrum!.dec.peaks).toEqual([]);
    expect(unexplainedNulls(run, '', run.whyMissing)).toEqual([]);
    survivesJson(document);
    expect(shares.at(-1)).toBe(1);
  });

  it('has the RMS of the frames that count, exactly', () => {
    const { series } = runs[0]!;
    const kept = series!.raErrorArcsec.filter((_, i) => series!.setAside[i] === 0);
    const mean = kept.reduce((sum, e) => sum + e, 0) / kept.length;
    const rms = Math.sqrt(kept.reduce((sum, e) => sum + (e - mean) ** 2, 0) / kept.length);
    expect(run.used).toBe(kept.length);
    expect(run.ra!.rmsArcsec).toBeCloseTo(rms, 12);
    expect(run.used + run.setAside.reduce((sum, s) => sum + s.frames, 0)).toBe(run.frames);
  });

  it('finds most of its dithers by shape when the states are taken away', () => {
    const without = analyseLog({ ...night.frames, state: null }, reading, rig, {}).runs[0]!;
    expect(Math.abs(without.ra!.rmsArcsec / run.ra!.rmsArcsec - 1)).toBeLessThan(0.05);
  });

  it('takes the length of a sub from the caller, then the rig, then five minutes', () => {
    const length = (subSeconds: number | undefined, own: RigDescription) =>
      analyseLog(noise(400, 1), reading, own, { subSeconds }).runs[0]!.subs!.lengthSeconds;
    expect(length(120, { ...rig, subSeconds: 180 })).toBe(120);
    expect(length(undefined, { ...rig, subSeconds: 180 })).toBe(180);
    expect(length(undefined, rig)).toBe(300);
  });
});

describe('what cannot be analysed is listed with the reason', () => {
  it('a run of fewer than 30 frames that count', () => {
    const { document, runs } = analyseLogWithSeries(noise(29, 1), reading, rig, {});
    const [run] = document.runs;
    expect(run!.frames).toBe(29);
    expect(run!.ra).toBeNull();
    expect(run!.whyMissing['ra']).toBe('Only 29 frames of this run count, and 30 are needed.');
    expect(unexplainedNulls(run, '', run!.whyMissing)).toEqual([]);
    expect(runs[0]!.series!.count).toBe(29);
  });

  it('a log in guide pixels without guide optics, which has a scale once they are told', () => {
    const frames: LogFrames = { ...noise(100, 1), errorUnit: 'guide px' };
    const { document, runs } = analyseLogWithSeries(frames, reading, { ...rig, guiding: {} }, {});
    expect(document.runs[0]!.whyMissing['ra']).toContain('guide scale');
    expect(runs[0]!.series).toBeNull();
    const arcsec = analyseLog(noise(100, 1), reading, rig, {}).runs[0]!.ra!.rmsArcsec;
    const scaled = analyseLog(frames, reading, rig, {}).runs[0]!.ra!.rmsArcsec;
    // Plate scale of 3.75 µm at 200 mm: checks.json 1.2a, derived.
    expect(scaled / arcsec).toBeCloseTo(3.867465117133057, 9);
  });

  it('an empty log has no runs, and one frame is a run that is listed', () => {
    expect(analyseLog(noise(0, 1), reading, rig, {}).runs).toEqual([]);
    const [run] = analyseLog(noise(1, 1), reading, rig, {}).runs;
    expect(run!.cadenceSeconds).toBeNull();
    expect(unexplainedNulls(run, '', run!.whyMissing)).toEqual([]);
  });

  it('a run whose frames carry one time, and one whose axis stands still', () => {
    const [same] = analyseLog(noise(100, 1, 0), reading, rig, {}).runs;
    expect(same!.whyMissing['ra']).toContain('same time');
    const still = { ...noise(100, 1), decError: new Float64Array(100) };
    const [run] = analyseLog(still, reading, rig, {}).runs;
    expect(run!.dec!.rmsArcsec).toBe(0);
    expect(run!.correlation).toBeNull();
    expect(unexplainedNulls(run, '', run!.whyMissing)).toEqual([]);
    survivesJson(run!);
  });
});

it('a stretch left out by hand does not count, in its own run only', () => {
  const frames = { ...noise(200, 1), run: Int32Array.from({ length: 200 }, (_, i) => +(i >= 100)) };
  const byHand = [{ run: 2, fromSeconds: 20, toSeconds: 40 }];
  const { runs } = analyseLog(frames, reading, rig, { byHand });
  expect(runs.map(({ used }) => used)).toEqual([100, 90]);
  expect(runs[1]!.setAside).toEqual([
    { fromSeconds: 20, toSeconds: 40, frames: 10, reason: 'by hand' },
  ]);
});

it('no NaN leaves, whatever the log is like', () => {
  const anyNumber = fc.oneof(
    fc.double({ min: -50, max: 50, noNaN: true }),
    fc.constantFrom(NaN, 0),
  );
  const frame = fc.record({
    step: fc.oneof(
      { weight: 30, arbitrary: fc.constant(2) },
      { weight: 1, arbitrary: fc.double({ min: 0, max: 90, noNaN: true }) },
    ),
    ra: anyNumber,
    dec: anyNumber,
    correction: anyNumber,
    state: fc.integer({ min: 0, max: FRAME_STATES.length - 1 }),
  });
  const log = fc.array(frame, { minLength: 0, maxLength: 200 });
  fc.assert(
    fc.property(log, fc.boolean(), fc.boolean(), (rows, hasState, isGuided) => {
      let time = 0;
      const frames = plainFrames(
        Float64Array.from(rows, ({ step }) => (time += step)),
        Float64Array.from(rows, ({ ra }) => ra),
        Float64Array.from(rows, ({ dec }) => dec),
      );
      const state = hasState ? Uint8Array.from(rows, (row) => row.state) : null;
      const given = isGuided ? Float64Array.from(rows, ({ correction }) => correction) : null;
      const guided = { ...frames, state, raCorrection: given, decCorrection: given };
      const document = analyseLog(guided, reading, rig, {});
      survivesJson(document);
      for (const run of document.runs) {
        expect(unexplainedNulls(run, '', run.whyMissing)).toEqual([]);
      }
    }),
    { numRuns: 60 },
  );
});
