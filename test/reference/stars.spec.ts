import { aspectOf, eccentricityOf, FWHM_PER_SIGMA, starFootprint } from '@stillpier/analysis';
import { describe, expect, it } from 'vitest';
import { allowed, check, type Entry } from './checks';

const within = (got: number, expected: number, tolerance: { rel?: number; abs?: number }) => {
  expect(Math.abs(got - expected)).toBeLessThanOrEqual(allowed(tolerance, expected));
};
interface Spread {
  var_east: number;
  var_north: number;
  cov: number;
}

describe('star shape', () => {
  it('a Gaussian is 2.3548 sigma wide at half its height (7.1)', () => {
    const { expected, tolerance } = check('7.1') as Entry<unknown, number>;
    within(FWHM_PER_SIGMA, expected, tolerance);
  });

  it('the variances of seeing and guide error add (7.2)', () => {
    const { inputs, expected, tolerance } = check('7.2') as Entry<
      { fwhm0: number; rms_ra: number; rms_dec: number },
      { fwhm_ra: number; fwhm_dec: number; aspect: number }
    >;
    const star = starFootprint(
      { east: inputs.rms_ra ** 2, north: inputs.rms_dec ** 2, cross: 0 },
      inputs.fwhm0,
    );
    within(star.fwhmMajorArcsec, expected.fwhm_ra, tolerance);
    within(star.fwhmMinorArcsec, expected.fwhm_dec, tolerance);
    within(star.aspect, expected.aspect, tolerance);
    expect(star.positionAngleDegrees).toBe(90);
  });

  it('aspect and eccentricity are two words for one shape (7.3)', () => {
    const { expected, tolerance } = check('7.3') as Entry<
      unknown,
      Record<string, { eccentricity: number }>
    >;
    for (const [aspect, { eccentricity }] of Object.entries(expected)) {
      within(eccentricityOf(Number(aspect)), eccentricity, tolerance);
      // Back from a near-round shape the digits of 1 − e² are few: e = 0.14 leaves 14 of them.
      within(aspectOf(eccentricity), Number(aspect), { rel: 1e-12 });
    }
  });

  it.each(['7.4a', '7.4b', '7.4c', '7.4d'])(
    'the axes of %s lie where its covariance says',
    (id) => {
      const { inputs, expected, tolerance } = check(id) as Entry<
        Spread,
        { lambda1: number; lambda2: number; pa_deg: number }
      >;
      const seeing = 1;
      const star = starFootprint(
        { east: inputs.var_east, north: inputs.var_north, cross: inputs.cov },
        seeing,
      );
      const variance = (fwhm: number) => (fwhm ** 2 - seeing ** 2) / (8 * Math.LN2);
      within(variance(star.fwhmMajorArcsec), expected.lambda1, tolerance);
      within(variance(star.fwhmMinorArcsec), expected.lambda2, tolerance);
      within(star.positionAngleDegrees, expected.pa_deg, tolerance);
    },
  );

  it('a covariance and a seeing disc make the star of 7.5', () => {
    const { inputs, expected, tolerance } = check('7.5') as Entry<
      Spread & { fwhm0: number },
      {
        fwhm_major: number;
        fwhm_minor: number;
        aspect: number;
        eccentricity: number;
        pa_deg: number;
      }
    >;
    const star = starFootprint(
      { east: inputs.var_east, north: inputs.var_north, cross: inputs.cov },
      inputs.fwhm0,
    );
    within(star.fwhmMajorArcsec, expected.fwhm_major, tolerance);
    within(star.fwhmMinorArcsec, expected.fwhm_minor, tolerance);
    within(star.aspect, expected.aspect, tolerance);
    within(star.eccentricity, expected.eccentricity, tolerance);
    within(star.positionAngleDegrees, expected.pa_deg, tolerance);
  });
});
