import { describe, expect, it } from 'vitest';
import { PLAIN_NIGHT } from '../simulation/night-scenario';
import { diagnosed, guidedBy, WHOLE_RIG, withDrive } from './night-fixture';

/** SCIENCE 7: pure noise, guided or not, has no peak, no backlash and no finding above 'fine' in 95 of 100 nights. */
const SEEDS = Array.from({ length: 100 }, (_, i) => 5000 + i);
const noise = {
  ...withDrive({ worm: { ...PLAIN_NIGHT.drive.worm, harmonics: [] } }),
  runs: [{ ...PLAIN_NIGHT.runs[0]!, durationSeconds: 3600 }],
};

describe('a hundred nights of nothing but seeing', () => {
  it.each([
    ['guided, with a minimum move', guidedBy(noise, { gain: 0.7, minimumMoveArcsec: 0.2 })],
    ['not guided', guidedBy(noise, { gain: 0 })],
  ])(
    'have no peak, no gap and no finding above fine in 95: %s',
    (_, scenario) => {
      const loud: string[] = [];
      for (const seed of SEEDS) {
        const run = diagnosed(scenario, seed, WHOLE_RIG).runs[0]!;
        const above = run.findings.filter(({ severity }) => severity !== 'fine');
        const peaks = [...run.spectrum!.ra.peaks, ...run.spectrum!.dec.peaks];
        const gap = run.backlash?.determined ?? false;
        if (above.length > 0 || peaks.length > 0 || gap) {
          loud.push(`${seed}: ${above.map(({ code }) => code).join(' ')} ${peaks.length} ${gap}`);
        }
      }
      expect(loud.length, loud.join('; ')).toBeLessThanOrEqual(5);
    },
    180_000,
  );
});
