import { analyseLog } from '../analyse';
import { type AnalysisDocument, type Reading } from '../analysis-document';
import { type RigDescription } from '../rig-description';
import { type GuiderAxis, type NightScenario, PLAIN_NIGHT } from '../simulation/night-scenario';
import { simulateNight } from '../simulation/simulate-night';

/** A rig that tells everything; stars of 2 arcsec on 1.46 arcsec a pixel. */
export const WHOLE_RIG: RigDescription = {
  mount: {
    wormPeriodSeconds: 480,
    guideRateSidereal: 0.5,
    gearStages: [{ name: 'transfer gear', periodSeconds: 37 }],
  },
  imaging: { focalLengthMm: 530, apertureMm: 106, pixelUm: 3.76 },
  guiding: { focalLengthMm: 240, apertureMm: 50, pixelUm: 3.75 },
  seeingFwhmArcsec: 2,
  subSeconds: 300,
};

const NO_READING: Reading = {
  lines: 0,
  frames: 0,
  refusedCount: 0,
  refused: [],
  delimiter: ',',
  decimal: '.',
  encoding: 'utf-8',
  headerLine: 1,
  columns: {},
  warnings: [],
};

export const QUIET_AIR: NightScenario['seeing'] = {
  whiteSigmaArcsec: 0.3,
  correlated: { sigmaArcsec: 0, memorySeconds: 5 },
};

export function withDrive(drive: Partial<NightScenario['drive']>): NightScenario {
  return { ...PLAIN_NIGHT, drive: { ...PLAIN_NIGHT.drive, ...drive } };
}

export function guidedBy(scenario: NightScenario, axis: Partial<GuiderAxis>): NightScenario {
  const { guider } = scenario;
  return {
    ...scenario,
    guider: { ...guider, ra: { ...guider.ra, ...axis }, dec: { ...guider.dec, ...axis } },
  };
}

/** A simulated night, analysed. */
export function diagnosed(
  scenario: NightScenario,
  seed: number,
  rig: RigDescription,
): AnalysisDocument {
  const { frames } = simulateNight(scenario, seed);
  return analyseLog(frames, { ...NO_READING, frames: frames.count }, rig, {});
}
