import type { Run } from '@stillpier/contract';
import { mountMeasures } from './mount-measures';

const RUN = {
  ra: { driftArcsecPerMinute: -0.00015, driftStandardError: 0.00002 },
  dec: null,
  uncorrected: null,
  polarAlignment: { atLeastArcmin: 2.34, solved: null },
  backlash: { arcsec: 1.2, ms: null, low: 0, high: 1.9, determined: false, reversals: 12 },
  response: null,
  loop: { ra: { gain: 0.71, gainStandardError: 0.012, bestGain: 0.4 }, dec: null },
  seeingFloor: { raArcsec: 0.35, decArcsec: null },
  whyMissing: { uncorrected: 'The log has no corrections.', response: 'Too few pulses.' },
} as unknown as Run;

const measure = (name: string) => mountMeasures(RUN).find((each) => each.name === name);

// Expected texts: DESIGN, Units and Words; the values are the run's own.
describe('mountMeasures', () => {
  it('keeps two digits of a small drift', () => {
    expect(measure('Drift left after guiding')).toMatchObject({
      ra: '\u22120.0001″ ± <0.0001″ per min',
      dec: '–',
      note: 'The log has no corrections.',
    });
  });

  it('gives backlash that is not determined as a limit', () => {
    expect(measure('Backlash')).toMatchObject({
      dec: 'under 1.90″',
      note: 'Not determined: 95 % range 0.00″ to 1.90″, 12 reversals.',
    });
  });

  it('says the reason in the place of a measure', () => {
    expect(measure('Response, + and −')).toMatchObject({
      ra: '–',
      dec: '–',
      note: 'Too few pulses.',
    });
  });

  it('gives angles of the mount in arcminutes', () => {
    expect(measure('Polar alignment error')?.dec).toBe('at least 2.3′');
  });

  it('gives a gain with its error and the best one', () => {
    expect(measure('Gain of the corrections')).toMatchObject({ ra: '0.71 ± 0.012', dec: '–' });
  });
});
