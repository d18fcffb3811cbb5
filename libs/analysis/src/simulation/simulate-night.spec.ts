import { describe, expect, it } from 'vitest';
import { FRAME_STATES } from '../series/log-frames';
import { type NightScenario, PLAIN_NIGHT } from './night-scenario';
import { simulateNight } from './simulate-night';

const withGuider = (change: Partial<NightScenario['guider']['ra']>): NightScenario => {
  const axis = { ...PLAIN_NIGHT.guider.ra, ...change };
  return { ...PLAIN_NIGHT, guider: { ...PLAIN_NIGHT.guider, ra: axis, dec: axis } };
};
const variance = (values: ArrayLike<number>) => {
  const all = Array.from(values);
  const mean = all.reduce((sum, value) => sum + value, 0) / all.length;
  return all.reduce((sum, value) => sum + (value - mean) ** 2, 0) / all.length;
};

describe('a simulated night', () => {
  it('is the same for the same seed and another for another', () => {
    const errors = (seed: number) => [...simulateNight(PLAIN_NIGHT, seed).frames.raError];
    expect(errors(4)).toEqual(errors(4));
    expect(errors(4)).not.toEqual(errors(5));
  });

  it('adds up: error = open loop + gusts + moved − lock + seeing', () => {
    const scenario: NightScenario = {
      ...PLAIN_NIGHT,
      gusts: { perHour: 20, sizeArcsec: 3, fadeSeconds: 3 },
      dithers: { everySeconds: 300, sizeArcsec: 4, settledArcsec: 1.5 },
    };
    const { frames, truth } = simulateNight(scenario, 1);
    for (const [error, axis] of [
      [frames.raError, truth.ra],
      [frames.decError, truth.dec],
    ] as const) {
      error.forEach((value, n) => {
        const sum =
          axis.openLoopArcsec[n]! +
          axis.gustArcsec[n]! +
          axis.movedArcsec[n]! -
          axis.lockArcsec[n]! +
          axis.seeingArcsec[n]!;
        expect(value).toBeCloseTo(sum, 9); // sums of the same numbers, to rounding
      });
    }
  });

  it('moves the star by what the log says, between one frame and the next', () => {
    const { frames, truth } = simulateNight(PLAIN_NIGHT, 2);
    const perMs = truth.ra.response[0]!.positive / 1000;
    for (let n = 0; n + 1 < frames.count; n++) {
      const moved = truth.ra.movedArcsec[n + 1]! - truth.ra.movedArcsec[n]!;
      expect(moved).toBeCloseTo(frames.raCorrection![n]! * perMs, 9);
    }
  });

  it('points as an integrator under white noise must: variance k/(2−k)', () => {
    const still = { ...PLAIN_NIGHT.drive, worm: { periodSeconds: 480, harmonics: [] } };
    const { truth } = simulateNight({ ...withGuider({ gain: 0.7 }), drive: still }, 3);
    // checks.json 11.3a.0.7, derived; 3600 frames tell a variance to about 3 %.
    const ratio = variance(truth.dec.pointingArcsec) / 0.25 / 0.5384615384615384;
    expect(Math.abs(ratio - 1)).toBeLessThan(0.1);
  });

  it('keeps the draws of one cause when another is switched off', () => {
    const gusty = simulateNight(
      { ...PLAIN_NIGHT, gusts: { perHour: 20, sizeArcsec: 3, fadeSeconds: 3 } },
      6,
    );
    const calm = simulateNight(PLAIN_NIGHT, 6);
    expect(gusty.truth.ra.seeingArcsec).toEqual(calm.truth.ra.seeingArcsec);
    expect(gusty.frames.raError).not.toEqual(calm.frames.raError);
  });

  it('lets the star rest inside the gap of the Dec gears', () => {
    const drive = { ...PLAIN_NIGHT.drive, decBacklashArcsec: 2, decDriftArcsecPerMinute: 0.3 };
    const { frames, truth } = simulateNight({ ...PLAIN_NIGHT, drive }, 7);
    const perMs = truth.dec.response[0]!.positive / 1000;
    let driven = 0;
    for (let n = 0; n < frames.count; n++) {
      expect(Math.abs(truth.dec.movedArcsec[n]! - driven)).toBeLessThanOrEqual(1 + 1e-9);
      driven += frames.decCorrection![n]! * perMs;
    }
  });

  it('loses the star behind clouds, and turns to new targets with a gap and a lock of their own', () => {
    const [first] = PLAIN_NIGHT.runs;
    const scenario: NightScenario = {
      ...PLAIN_NIGHT,
      runs: [
        { ...first!, durationSeconds: 600 },
        {
          ...first!,
          durationSeconds: 600,
          pauseSeconds: 180,
          target: 'Field B',
          pierSide: 'east',
          declinationDegrees: 60,
        },
      ],
      clouds: [{ fromSeconds: 100, toSeconds: 140 }],
    };
    const { frames, truth } = simulateNight(scenario, 8);
    const lost = [...frames.raError].filter(Number.isNaN).length;
    expect(lost).toBe(20);
    expect([...frames.state!].filter((code) => FRAME_STATES[code] === 'star lost')).toHaveLength(
      20,
    );
    expect(frames.timeSeconds[300]! - frames.timeSeconds[299]!).toBe(182);
    expect(frames.targetNames).toEqual(['Field A', 'Field B']);
    expect(frames.declinationDegrees![300]).toBe(60);
    expect(truth.ra.response[1]!.positive / truth.ra.response[0]!.positive).toBeCloseTo(
      Math.cos(Math.PI / 3) / Math.cos(Math.PI / 9),
      12,
    );
  });
});
