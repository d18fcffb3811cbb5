import { describe, expect, it } from 'vitest';
import { type RigDescription } from '../rig-description';
import { prepareRun } from '../series/prepare-run';
import { type RunSeries } from '../series/run-series';
import { type GuiderAxis, type NightScenario, PLAIN_NIGHT } from '../simulation/night-scenario';
import { simulateNight } from '../simulation/simulate-night';
import { gainCurve } from './gain-curve';
import { measureMountMotion } from './measure-mount-motion';
import { type Cure, keptRms, replayableAxes, type ReplayChange, replayedRun } from './replay';
import { replayNight } from './replay-night';

const rig: RigDescription = { mount: { wormPeriodSeconds: 480, guideRateSidereal: 0.5 } };
const SEEDS = [1, 2];

const guidedBy = (scenario: NightScenario, axis: Partial<GuiderAxis>): NightScenario => ({
  ...scenario,
  guider: {
    ...scenario.guider,
    ra: { ...scenario.guider.ra, ...axis },
    dec: { ...scenario.guider.dec, ...axis },
  },
});
const runOf = (scenario: NightScenario, seed: number): RunSeries => {
  const { frames } = simulateNight(scenario, seed);
  return prepareRun(frames, { from: 0, to: frames.count }, 1, []);
};
const axesOf = (run: RunSeries) => replayableAxes(run, measureMountMotion(run, rig))!;
const rms = (run: RunSeries) => ({
  ra: keptRms(run.raErrorArcsec, run.setAside),
  dec: keptRms(run.decErrorArcsec, run.setAside),
});
const withDrive = (drive: Partial<NightScenario['drive']>): NightScenario => ({
  ...PLAIN_NIGHT,
  drive: { ...PLAIN_NIGHT.drive, ...drive },
});

const wandering = { sigmaArcsec: 0.8, memorySeconds: 120 };
const nights: [string, NightScenario][] = [
  ['a plain night', PLAIN_NIGHT],
  ['a rough drive', withDrive({ raWandering: wandering, decWandering: wandering })],
  ['a Dec gap of 2 arcsec', withDrive({ decBacklashArcsec: 2 })],
  ['gusts', { ...PLAIN_NIGHT, gusts: { perHour: 30, sizeArcsec: 5, fadeSeconds: 3 } }],
  [
    'dithers and a polar error',
    {
      ...PLAIN_NIGHT,
      dithers: { everySeconds: 300, sizeArcsec: 4, settledArcsec: 1.5 },
      polar: { azimuthArcmin: 4, altitudeArcmin: 3 },
    },
  ],
];

describe('a replay agrees with simulating the night anew within 10 % in RMS (SCIENCE 7)', () => {
  const changes: ReplayChange[] = [
    { gain: 0.7 },
    { gain: 0.3 },
    { gain: 1.1 },
    { gain: 0.7, minimumMoveArcsec: 0.6 },
  ];
  it.each(nights)('at other settings: %s', (_, scenario) => {
    const guided = guidedBy(scenario, { gain: 0.7, minimumMoveArcsec: 0.15 });
    for (const seed of SEEDS) {
      const run = runOf(guided, seed);
      const axes = axesOf(run);
      for (const change of changes) {
        const replayed = rms(replayedRun(run, axes, { ra: change, dec: change }));
        const anew = rms(runOf(guidedBy(guided, change), seed));
        expect(Math.abs(replayed.ra / anew.ra - 1)).toBeLessThan(0.1);
        expect(Math.abs(replayed.dec / anew.dec - 1)).toBeLessThan(0.1);
      }
    }
  });

  const noWorm = { worm: { ...PLAIN_NIGHT.drive.worm, harmonics: [] } };
  const cures: [Cure, NightScenario, NightScenario][] = [
    [
      'periodic error',
      guidedBy(PLAIN_NIGHT, { gain: 0.3 }),
      guidedBy(withDrive(noWorm), { gain: 0.3 }),
    ],
    ['backlash', withDrive({ decBacklashArcsec: 3 }), PLAIN_NIGHT],
    [
      'drift',
      guidedBy({ ...PLAIN_NIGHT, polar: { azimuthArcmin: 9, altitudeArcmin: 0 } }, { gain: 0.2 }),
      guidedBy(PLAIN_NIGHT, { gain: 0.2 }),
    ],
    [
      'gusts and bumps',
      { ...PLAIN_NIGHT, gusts: { perHour: 30, sizeArcsec: 5, fadeSeconds: 3 } },
      PLAIN_NIGHT,
    ],
  ];
  it.each(cures)('with a part cured: %s', (cure, scenario, without) => {
    for (const seed of SEEDS) {
      const run = runOf(scenario, seed);
      const change = { cured: [cure] };
      const replayed = rms(replayedRun(run, axesOf(run), { ra: change, dec: change }));
      const anew = rms(runOf(without, seed));
      expect(Math.abs(replayed.ra / anew.ra - 1)).toBeLessThan(0.1);
      expect(Math.abs(replayed.dec / anew.dec - 1)).toBeLessThan(0.1);
    }
  });

  it('at twice the guide interval', () => {
    const change = { everyFrames: 2 };
    for (const seed of SEEDS) {
      const run = runOf(PLAIN_NIGHT, seed);
      const replayed = rms(replayedRun(run, axesOf(run), { ra: change, dec: change }));
      const anew = rms(runOf({ ...PLAIN_NIGHT, cadenceSeconds: 4 }, seed));
      expect(Math.abs(replayed.ra / anew.ra - 1)).toBeLessThan(0.1);
      expect(Math.abs(replayed.dec / anew.dec - 1)).toBeLessThan(0.1);
    }
  });
});

describe('what a replay gives', () => {
  it('is the night itself when nothing is changed', () => {
    const run = runOf(PLAIN_NIGHT, 1);
    const same = rms(replayedRun(run, axesOf(run), { ra: {}, dec: {} }));
    expect(same.ra / rms(run).ra).toBeCloseTo(1, 3); // the log rounds corrections to milliseconds
    expect(same.dec / rms(run).dec).toBeCloseTo(1, 3);
  });

  it('has stars and subs where the seeing is known', () => {
    const run = runOf(PLAIN_NIGHT, 1);
    const stars = { seeingFwhmArcsec: 2, subSeconds: 300, keepAspect: 1.15 };
    const night = replayNight(run, axesOf(run), { ra: { gain: 0.5 }, dec: { gain: 0.5 } }, stars);
    expect(night.totalRmsArcsec).toBeCloseTo(Math.hypot(night.raRmsArcsec, night.decRmsArcsec), 12);
    expect(night.footprint!.aspect).toBeGreaterThanOrEqual(1);
    expect(night.subs!.count).toBe(24); // two hours of five minutes, no dithers
    expect(night.assumptions.join(' ')).toContain('seeing');
    const blind = { ...stars, seeingFwhmArcsec: undefined };
    expect(replayNight(run, axesOf(run), { ra: {}, dec: {} }, blind).footprint).toBeNull();
  });

  it('finds the gain at which noise and mount balance (REFERENCE 11: checks.json 11.5, derived)', () => {
    // White steps of variance q = s·r a frame: an AR(1) of very long memory. s = 0.1 has its best gain at 0.27.
    const [memorySeconds, cadence, noise, s] = [20000, 2, 0.5, 0.1];
    const kept = Math.exp(-cadence / memorySeconds);
    const sigmaArcsec = Math.sqrt((s * noise ** 2) / (1 - kept ** 2));
    const night = withDrive({ decWandering: { sigmaArcsec, memorySeconds } });
    const run = runOf(night, 3);
    const { bestGain, points } = gainCurve(axesOf(run).dec, run);
    expect(bestGain).toBeGreaterThanOrEqual(0.2); // the curve's step is 0.1 and its bottom flat
    expect(bestGain).toBeLessThanOrEqual(0.4);
    expect(points.map(({ gain }) => gain)).toHaveLength(15);
  });

  it('cannot be told without corrections', () => {
    const run = { ...runOf(PLAIN_NIGHT, 1), raCorrection: null, decCorrection: null };
    expect(replayableAxes(run, measureMountMotion(run, rig))).toBeNull();
  });
});
