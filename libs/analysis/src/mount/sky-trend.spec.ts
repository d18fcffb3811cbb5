import { describe, expect, it } from 'vitest';
import { type RigDescription } from '../rig-description';
import { cutRuns } from '../series/cut-runs';
import { prepareRun } from '../series/prepare-run';
import { type NightScenario, PLAIN_NIGHT } from '../simulation/night-scenario';
import { simulateNight } from '../simulation/simulate-night';
import { measureMountMotion } from './measure-mount-motion';
import { skyTrend } from './sky-trend';

const everyMinute = (minutes: number) =>
  Float64Array.from({ length: minutes + 1 }, (_, i) => 60 * i);

describe('the drift of a run', () => {
  it('is straight up to two and a half hours', () => {
    expect(skyTrend(everyMinute(149))).toHaveLength(1);
  });

  it('bends beyond, each bend beginning and ending at one height', () => {
    const [, ...bends] = skyTrend(everyMinute(400));
    expect(bends).toHaveLength(2);
    for (const bend of bends) expect(Math.abs(bend[0]! - bend.at(-1)!)).toBeLessThan(1e-12);
  });

  it('takes in the bend of a polar error, which then passes for no slow line of the mount', () => {
    const rig: RigDescription = { mount: { wormPeriodSeconds: 480, guideRateSidereal: 0.5 } };
    const night: NightScenario = {
      ...PLAIN_NIGHT,
      runs: PLAIN_NIGHT.runs.map((run) => ({
        ...run,
        durationSeconds: 21_600,
        hourAngleHours: -3,
      })),
      polar: { azimuthArcmin: 6, altitudeArcmin: -4 },
    };
    const { frames } = simulateNight(night, 11);
    const [whole] = cutRuns(frames);
    const { dec, uncorrected } = measureMountMotion(prepareRun(frames, whole!, 1, []), rig);
    expect(dec.lines).toEqual([]);
    // −0.2625 · (alt · sin H + az · cos H) (checks.json 4.3a, derived), in the mean over H from −45° to 45°.
    const meanCosine = Math.sin(Math.PI / 4) / (Math.PI / 4);
    const off = uncorrected!.dec.driftArcsecPerMinute + 0.2625 * 6 * meanCosine;
    // SCIENCE 7's own tolerance.
    expect(Math.abs(off)).toBeLessThan(0.05);
  });
});
