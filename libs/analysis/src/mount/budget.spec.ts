import { describe, expect, it } from 'vitest';
import { BUDGET_PARTS, type BudgetPart, type Part } from '../analysis-document';
import { type RigDescription } from '../rig-description';
import { prepareRun } from '../series/prepare-run';
import { type RunSeries } from '../series/run-series';
import { type GuiderAxis, type NightScenario, PLAIN_NIGHT } from '../simulation/night-scenario';
import { simulateNight } from '../simulation/simulate-night';
import { measureMountMotion } from './measure-mount-motion';
import { keptRms, replayableAxis } from './replay';
import { runBudget } from './run-budget';

const rig: RigDescription = { mount: { wormPeriodSeconds: 480, guideRateSidereal: 0.5 } };
const SEEDS = [1, 2];
const CALM = { perHour: 0, sizeArcsec: 0, fadeSeconds: 3 };
const STILL = { whiteSigmaArcsec: 0, correlated: { sigmaArcsec: 0, memorySeconds: 5 } };

const runOf = (scenario: NightScenario, seed: number): RunSeries => {
  const { frames } = simulateNight(scenario, seed);
  return prepareRun(frames, { from: 0, to: frames.count }, 1, []);
};
const budgetOf = (run: RunSeries) => {
  const motion = measureMountMotion(run, rig);
  const axes = { ra: replayableAxis(run, motion, 'ra'), dec: replayableAxis(run, motion, 'dec') };
  return runBudget(run, motion, axes, null);
};
const guidedBy = (scenario: NightScenario, axis: Partial<GuiderAxis>): NightScenario => ({
  ...scenario,
  guider: {
    ...scenario.guider,
    ra: { ...scenario.guider.ra, ...axis },
    dec: { ...scenario.guider.dec, ...axis },
  },
});
const withDrive = (
  scenario: NightScenario,
  drive: Partial<NightScenario['drive']>,
): NightScenario => ({ ...scenario, drive: { ...scenario.drive, ...drive } });

/** The same night without one cause. */
function without(scenario: NightScenario, part: BudgetPart): NightScenario {
  switch (part) {
    case 'periodic error':
      return withDrive(scenario, { lines: [], worm: { ...scenario.drive.worm, harmonics: [] } });
    case 'drift':
      return { ...scenario, polar: { azimuthArcmin: 0, altitudeArcmin: 0 } };
    case 'backlash':
      return withDrive(scenario, { decBacklashArcsec: 0 });
    case 'over-correction':
      return guidedBy(scenario, { gain: Math.min(1, scenario.guider.ra.gain) });
    case 'gusts and bumps':
      return { ...scenario, gusts: CALM };
    case 'seeing floor':
      return { ...scenario, seeing: STILL };
    case 'unexplained':
      return scenario;
  }
}

const variance = (run: RunSeries, axis: 'ra' | 'dec') =>
  keptRms(axis === 'ra' ? run.raErrorArcsec : run.decErrorArcsec, run.setAside) ** 2;

const rough = { sigmaArcsec: 0.8, memorySeconds: 60 };
const nights: [string, NightScenario][] = [
  ['a plain night', PLAIN_NIGHT],
  ['too strong a loop', guidedBy(PLAIN_NIGHT, { gain: 1.5 })],
  ['too soft a loop', guidedBy(PLAIN_NIGHT, { gain: 0.2 })],
  ['a Dec gap', withDrive(PLAIN_NIGHT, { decBacklashArcsec: 3 })],
  ['a rough drive', withDrive(PLAIN_NIGHT, { raWandering: rough, decWandering: rough })],
  ['gusts', { ...PLAIN_NIGHT, gusts: { perHour: 30, sizeArcsec: 5, fadeSeconds: 3 } }],
  ['quiet air', { ...PLAIN_NIGHT, seeing: { ...STILL, whiteSigmaArcsec: 0.1 } }],
  ['no guiding', guidedBy(PLAIN_NIGHT, { gain: 0 })],
];

describe('error budget', () => {
  it.each(nights)(
    'each share is within 0.10 of what the night without its cause loses (SCIENCE 7): %s',
    (_, scenario) => {
      for (const seed of SEEDS) {
        const run = runOf(scenario, seed);
        const { budget } = budgetOf(run);
        for (const axis of ['ra', 'dec'] as const) {
          const total = variance(run, axis);
          for (const { part, share } of budget[axis]) {
            if (part === 'unexplained') continue;
            // The floor is what noise brings at a gain of 1 at most: what it brings beyond is over-correction.
            const from = part === 'seeing floor' ? without(scenario, 'over-correction') : scenario;
            const lost =
              variance(runOf(from, seed), axis) - variance(runOf(without(from, part), seed), axis);
            const truth = Math.max(0, lost / total);
            expect(Math.abs(share - truth), `${part} of ${axis}`).toBeLessThan(0.1);
          }
        }
      }
    },
  );

  it.each(nights)('shares add up to 1 and none is negative: %s', (_, scenario) => {
    const run = runOf(scenario, 5);
    const { budget } = budgetOf(run);
    for (const axis of ['ra', 'dec'] as const) {
      const parts: Part[] = budget[axis];
      expect(parts.map(({ part }) => part)).toEqual([...BUDGET_PARTS]);
      expect(parts.reduce((sum, { share }) => sum + share, 0)).toBeCloseTo(1, 12);
      const total = variance(run, axis);
      for (const { share, rmsArcsec, rmsIfCuredArcsec } of parts) {
        expect(share).toBeGreaterThanOrEqual(0);
        expect(rmsArcsec ** 2).toBeCloseTo(share * total, 12);
        expect(rmsIfCuredArcsec ** 2).toBeCloseTo(total - rmsArcsec ** 2, 12); // SCIENCE 4
      }
    }
  });

  it('a log without corrections tells lines, drift and bumps, and why not the rest', () => {
    const run = runOf(guidedBy(PLAIN_NIGHT, { gain: 0 }), 1);
    const bare = { ...run, raCorrection: null, decCorrection: null };
    const motion = measureMountMotion(bare, rig);
    const peak = {
      periodSeconds: 480,
      amplitudeArcsec: 4.7,
      share: 0.9,
      falseAlarmProbability: 1e-9,
      label: 'worm',
    };
    const none = { peaks: [], method: 'fft' as const };
    const { budget, whyMissing } = runBudget(
      bare,
      motion,
      { ra: null, dec: null },
      {
        ra: { ...none, peaks: [peak] },
        dec: none,
      },
    );
    const lines = budget.ra.find(({ part }) => part === 'periodic error')!;
    expect(lines.rmsArcsec).toBeCloseTo(4.7 / Math.SQRT2, 6); // half the square of the amplitude
    for (const part of ['backlash', 'over-correction', 'seeing floor']) {
      expect(whyMissing[`budget.ra.${part}`]).toContain('corrections');
    }
    expect(budget.dec.reduce((sum, { share }) => sum + share, 0)).toBeCloseTo(1, 12);
  });
});
