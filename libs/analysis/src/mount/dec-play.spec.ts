import { describe, expect, it } from 'vitest';
import { prepareRun } from '../series/prepare-run';
import { PLAIN_NIGHT } from '../simulation/night-scenario';
import { simulateNight } from '../simulation/simulate-night';
import { measureMountMotion } from './measure-mount-motion';

const scenario = {
  ...PLAIN_NIGHT,
  runs: PLAIN_NIGHT.runs.map((run) => ({ ...run, durationSeconds: 3600 })),
  drive: { ...PLAIN_NIGHT.drive, decBacklashArcsec: 2, decDriftArcsecPerMinute: 0.3 },
};

describe('a night with a gap in the Dec gears', () => {
  it.each([{ mount: { guideRateSidereal: 0.5 } }, {}])(
    'has the Dec motion of the sky, not that of the gap: rig %o',
    (rig) => {
      const { frames, truth } = simulateNight(scenario, 12);
      const run = prepareRun(frames, { from: 0, to: frames.count }, 1, []);
      const { decPlay, dec, uncorrected, loop } = measureMountMotion(run, rig);
      expect(decPlay).toMatchObject({ determined: true });
      const { driftArcsecPerMinute: drift, driftStandardError } = uncorrected!.dec;
      expect(Math.abs(drift - 0.3)).toBeLessThan(Math.max(0.05, 3 * driftStandardError)); // SCIENCE 7
      const moved = dec.displacementArcsec!.reduce((sum, move) => sum + move, 0);
      const truly = truth.dec.movedArcsec.at(-1)!;
      expect(Math.abs(moved / truly - 1)).toBeLessThan(0.15); // 18 ″ in all, of which the gap holds up to 1 ″ at the start
      expect(Math.abs(loop.dec!.gain! - 0.7)).toBeLessThan(0.1); // SCIENCE 7
    },
  );
});
