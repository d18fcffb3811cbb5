import { describe, expect, it } from 'vitest';
import { check, type Entry } from '../../../../test/reference/checks';
import { polarAlignment, type RunDrift } from './polar-alignment';
import { polarDrift } from './polar-drift';
import { refractionDrift } from './refraction';

const run = (drift: number, hours: number, more: Partial<RunDrift> = {}): RunDrift => ({
  decDriftArcsecPerMinute: drift,
  standardError: 0.01,
  hourAngleHours: Float64Array.of(hours),
  declinationDegrees: null,
  ...more,
});

describe('polar alignment', () => {
  it('says what one run tells at least: the drift over 0.2625 (checks.json 4.3a, derived)', () => {
    const { runs, whyMissing } = polarAlignment([run(-0.525, 1)], 50);
    expect(runs[0]!.atLeastArcmin).toBeCloseTo(2, 3); // 0.525 / 0.2625
    expect(runs[0]!.solved).toBeNull();
    expect(whyMissing['solved']).toContain('two or more runs');
  });

  it('solves both parts from two hour angles (checks.json 4.7, derived)', () => {
    const { inputs, expected } = check('4.7') as Entry<
      { latitude_deg: number; H_deg: number[]; dec_rate_arcsec_per_min: number[] },
      { dA_arcmin: number; dh_arcmin: number }
    >;
    const drifts = inputs.H_deg.map((degrees, i) =>
      run(inputs.dec_rate_arcsec_per_min[i]!, degrees / 15),
    );
    // Declinations are not told here, so no refraction is taken off.
    const { solved } = polarAlignment(drifts, inputs.latitude_deg).runs[0]!;
    expect(solved!.azimuthKnobArcmin).toBeCloseTo(expected.dA_arcmin, 8);
    expect(solved!.altitudeArcmin).toBeCloseTo(expected.dh_arcmin, 8);
    const onSky = expected.dA_arcmin * Math.cos((inputs.latitude_deg * Math.PI) / 180);
    expect(solved!.azimuthArcmin).toBeCloseTo(onSky, 8);
    expect(solved!.totalArcmin).toBeCloseTo(Math.hypot(onSky, expected.dh_arcmin), 8);
  });

  it.each([50, -35])(
    'takes refraction out where site and target are known (latitude %s)',
    (latitude) => {
      const misalignment = { azimuthKnobArcmin: 3, altitudeArcmin: -2 };
      const drifts = [-3, 0.5, 3].map((hourAngleHours) => {
        const declinationDegrees = Math.sign(latitude) * 15;
        const place = { latitudeDegrees: latitude, declinationDegrees, hourAngleHours };
        const drift =
          polarDrift(misalignment, place).northArcsecPerMinute +
          refractionDrift(place, 'true pole')!.northArcsecPerMinute;
        return run(drift, hourAngleHours, { declinationDegrees });
      });
      const { solved } = polarAlignment(drifts, latitude).runs[0]!;
      expect(solved!.azimuthKnobArcmin).toBeCloseTo(3, 8);
      expect(solved!.altitudeArcmin).toBeCloseTo(-2, 8);
    },
  );

  it('gives a standard error that follows the drifts', () => {
    // By hand: on the meridian az = drift / 0.2625 and six hours west alt = drift / 0.2625, each ± 0.01 / 0.2625.
    const { solved } = polarAlignment([run(-0.525, 0), run(0, 6)], null).runs[0]!;
    expect(solved!.azimuthArcmin).toBeCloseTo(2, 3);
    expect(solved!.standardErrorArcmin).toBeCloseTo(0.01 / 0.2625, 4);
    expect(solved!.azimuthKnobArcmin).toBeNull();
  });

  it('widens the error when three runs disagree', () => {
    // An azimuth error alone drifts as cos H: a half at four hours either side. The second set is a standard error off.
    const agreeing = polarAlignment([run(-0.25, -4), run(-0.5, 0), run(-0.25, 4)], null).runs[0]!;
    const odd = polarAlignment([run(-0.3, -4), run(-0.5, 0), run(-0.3, 4)], null).runs[0]!;
    const ratio = odd.solved!.standardErrorArcmin / agreeing.solved!.standardErrorArcmin;
    expect(ratio).toBeGreaterThan(3); // residuals of three to four standard errors
  });

  it('does not solve runs that lie close together, and says so', () => {
    const { runs, whyMissing } = polarAlignment([run(-0.5, 1), run(-0.5, 1.5)], 50);
    expect(runs.map(({ solved }) => solved)).toEqual([null, null]);
    expect(whyMissing['solved']).toContain('0.5 h');
  });

  it('does not show a solution that the drifts do not carry', () => {
    const loose = { standardError: 0.5 };
    const { whyMissing } = polarAlignment([run(-0.5, 0, loose), run(-0.5, 2, loose)], 50);
    expect(whyMissing['solved']).toContain('only within');
  });
});
