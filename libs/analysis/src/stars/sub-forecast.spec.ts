import { expect, it } from 'vitest';
import { plainFrames } from '../series/frames-fixture';
import { FRAME_STATES } from '../series/log-frames';
import { prepareRun } from '../series/prepare-run';
import { RandomSource } from '../simulation/random-source';
import { median } from '../statistics/quantile';
import { subForecast } from './sub-forecast';

const run = (count: number, states: (i: number) => number, seed = 1) => {
  const random = new RandomSource(seed);
  const t = Float64Array.from({ length: count }, (_, i) => 2 * i);
  const frames = plainFrames(
    t,
    t.map(() => 0.6 * random.normal()),
    t.map(() => 0.6 * random.normal()),
  );
  const state = Uint8Array.from({ length: count }, (_, i) => states(i));
  return prepareRun({ ...frames, state }, { from: 0, to: count }, 1, []);
};
const dither = FRAME_STATES.indexOf('dither');
const settling = FRAME_STATES.indexOf('settling');
const lost = FRAME_STATES.indexOf('star lost');

it('consecutive subs fill the run, a frame counting for the cadence that follows it', () => {
  const subs = subForecast(
    run(500, () => 0),
    300,
    2,
    1.15,
  );
  expect(subs.startsSeconds).toEqual([0, 300, 600]);
  expect(subs.count).toBe(3);
  expect(subs.within).toBe(3);
  expect(subs.aspects).toHaveLength(3);
});

it('dithers and settling fall between subs', () => {
  // 150 frames, a dither and 9 frames of settling, and so on: one sub of 300 s fits into each stretch.
  const state = (i: number) => (i % 160 === 150 ? dither : i % 160 > 150 ? settling : 0);
  expect(subForecast(run(480, state), 300, 2, 1.15).startsSeconds).toEqual([0, 320, 640]);
  expect(subForecast(run(480, state), 310, 2, 1.15).count).toBe(0);
});

it('a star that is lost for over a minute ends the sub, for less it does not', () => {
  const cloud = (frames: number) => (i: number) => (i >= 50 && i < 50 + frames ? lost : 0);
  expect(subForecast(run(200, cloud(10)), 300, 2, 1.15).startsSeconds).toEqual([0]);
  expect(subForecast(run(250, cloud(40)), 300, 2, 1.15).startsSeconds).toEqual([180]);
});

it('a short sub of round noise is not called long for its few frames', () => {
  // Ten frames of 0.6 ″ on a 1 ″ disc: chance alone makes the plain covariance over 1.15 in most of them.
  const aspects = Array.from(
    { length: 20 },
    (_, seed) =>
      subForecast(
        run(1000, () => 0, seed),
        20,
        1,
        1.15,
      ).aspects,
  ).flat();
  expect(median(aspects)).toBeLessThan(1.1);
});
