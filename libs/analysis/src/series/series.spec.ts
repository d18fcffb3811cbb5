import { describe, expect, it } from 'vitest';
import { RandomSource } from '../simulation/random-source';
import { cutRuns } from './cut-runs';
import { plainFrames } from './frames-fixture';
import { FRAME_STATES, type LogFrames } from './log-frames';
import { prepareRun } from './prepare-run';
import { setAsideStretches } from './set-aside';

const still = (timeSeconds: number[]): LogFrames =>
  plainFrames(
    Float64Array.from(timeSeconds),
    new Float64Array(timeSeconds.length),
    new Float64Array(timeSeconds.length),
  );

describe('cutting a log into runs', () => {
  it('ends a run at a gap over 60 s, and over ten cadences where those are longer', () => {
    expect(cutRuns(still([0, 2, 4, 64, 66, 127]))).toEqual([
      { from: 0, to: 5 },
      { from: 5, to: 6 },
    ]);
    expect(cutRuns(still([0, 10, 20, 30, 120, 130, 240, 250]))).toEqual([
      { from: 0, to: 6 },
      { from: 6, to: 8 },
    ]);
  });

  it('ends a run where its target or run column changes, not where one is blank', () => {
    const frames = {
      ...still([0, 2, 4, 6, 8]),
      target: Int32Array.of(0, -1, 0, 1, 1),
      targetNames: ['Field A', 'Field B'],
    };
    const runs = cutRuns(frames);
    expect(runs).toEqual([
      { from: 0, to: 3 },
      { from: 3, to: 5 },
    ]);
    expect(runs.map((range) => prepareRun(frames, range, 1, []).target)).toEqual([
      'Field A',
      'Field B',
    ]);
  });

  it('has no run in an empty log and one frame in a run of one', () => {
    expect(cutRuns(still([]))).toEqual([]);
    expect(prepareRun(still([5]), { from: 0, to: 1 }, 1, []).cadenceSeconds).toBe(0);
  });
});

it('a number that no sky and no guider has is no star and no correction', () => {
  const frames = {
    ...still([0, 2, 4]),
    raError: Float64Array.of(0.1, 1e150, 0.2),
    raCorrection: Float64Array.of(-50, 1e12, Infinity),
  };
  const run = prepareRun(frames, { from: 0, to: 3 }, 1, []);
  expect(setAsideStretches(run)).toEqual([
    { fromSeconds: 2, toSeconds: 4, frames: 1, reason: 'star lost' },
  ]);
  expect([...run.raCorrection!]).toEqual([-50, 0, 0]);
});

/** 400 frames of seeing at 0.5 ″ with whatever is added. */
const night = (add: (i: number, axis: 'ra' | 'dec') => number, guided: boolean): LogFrames => {
  const random = new RandomSource(5);
  const t = Float64Array.from({ length: 400 }, (_, i) => 2 * i);
  const ra = t.map((_, i) => 0.5 * random.normal() + add(i, 'ra'));
  const dec = t.map((_, i) => 0.5 * random.normal() + add(i, 'dec'));
  const none = new Float64Array(400);
  return { ...plainFrames(t, ra, dec), raCorrection: guided ? none : null };
};
const prepared = (frames: LogFrames) => prepareRun(frames, { from: 0, to: frames.count }, 1, []);

describe('dithers by their shape', () => {
  const dithered = (i: number, axis: 'ra' | 'dec') =>
    i < 200 ? 0 : (axis === 'ra' ? 6 : -4) * 0.5 ** (i - 200);

  it('are a jump of both axes that the guider pulls back', () => {
    const run = prepared(night(dithered, true));
    expect(run.ditherFrames).toEqual([200]);
    const stretches = setAsideStretches(run);
    expect(stretches.map(({ reason }) => reason)).toEqual(['dither', 'settling']);
    expect(stretches[0]!.fromSeconds).toBe(400);
    // 6 ″ halved each frame is under a sigma after 4 frames, and 3 quiet frames follow.
    expect(stretches[1]!.frames).toBeGreaterThanOrEqual(5);
    expect(stretches[1]!.frames).toBeLessThan(20);
  });

  it('are not a lone spike, guided or not', () => {
    const spike = (i: number) => (i === 200 ? 8 : 0);
    expect(prepared(night(spike, false)).ditherFrames).toEqual([]);
    // A guider of gain 0.7 answers the spike, and the star stands at −0.7 of it one frame later.
    const answered = (i: number) => (i < 200 ? 0 : i === 200 ? 8 : -5.6 * 0.3 ** (i - 201));
    expect(prepared(night(answered, true)).ditherFrames).toEqual([]);
  });

  it('are not a gust that lets go again', () => {
    const gust = (i: number) => (i >= 200 && i < 204 ? 7 : 0);
    expect(prepared(night(gust, false)).ditherFrames).toEqual([]);
  });

  it('are not looked for where the log has a state column', () => {
    const frames = { ...night(dithered, true), state: new Uint8Array(400) };
    expect(prepared(frames).ditherFrames).toEqual([]);
  });

  it('are none in 100 starts of plain seeing', () => {
    let found = 0;
    for (let seed = 0; seed < 100; seed++) {
      const random = new RandomSource(seed);
      const t = Float64Array.from({ length: 1800 }, (_, i) => 2 * i);
      const frames = plainFrames(
        t,
        t.map(() => random.normal()),
        t.map(() => random.normal()),
      );
      found += prepared(frames).ditherFrames.length;
    }
    // A jump of 8 sigma of two axes comes once in e^16 frames.
    expect(found).toBe(0);
  });
});

describe('frames that are set aside', () => {
  const state = Uint8Array.from({ length: 400 }, (_, i) => {
    if (i >= 100 && i < 103) return FRAME_STATES.indexOf('dither');
    if (i >= 103 && i < 110) return FRAME_STATES.indexOf('settling');
    return i === 300 ? FRAME_STATES.indexOf('ignore') : 0;
  });
  // The first frame called a dither is still at the old place.
  const jumped = (i: number) => (i >= 101 ? 6 * 0.5 ** (i - 101) : 0);

  it('follow the state column, and the dither arrives where the star jumps', () => {
    const frames = { ...night(jumped, true), state };
    frames.raError[350] = NaN;
    const run = prepared(frames);
    expect(run.ditherFrames).toEqual([101]);
    expect(setAsideStretches(run)).toEqual([
      { fromSeconds: 200, toSeconds: 206, frames: 3, reason: 'dither' },
      { fromSeconds: 206, toSeconds: 220, frames: 7, reason: 'settling' },
      { fromSeconds: 600, toSeconds: 602, frames: 1, reason: 'by hand' },
      { fromSeconds: 700, toSeconds: 702, frames: 1, reason: 'star lost' },
    ]);
  });

  it('are the user’s own before all others', () => {
    const byHand = [{ fromSeconds: 204, toSeconds: 210 }];
    const run = prepareRun({ ...night(jumped, true), state }, { from: 0, to: 400 }, 1, byHand);
    expect(setAsideStretches(run).map(({ reason, frames }) => [reason, frames])).toEqual([
      ['dither', 2],
      ['by hand', 3],
      ['settling', 5],
      ['by hand', 1],
    ]);
  });
});
