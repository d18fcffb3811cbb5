import {
  ARCSEC_PER_RADIAN,
  dawesArcsec,
  describeOptics,
  namedPeriods,
  plateScaleArcsecPerPx,
  rayleighArcsec,
  scaleRatio,
  SIDEREAL_DAY_SECONDS,
  SIDEREAL_RATE_ARCSEC_PER_SECOND,
  STAR_RATE_ARCSEC_PER_SECOND,
  wormPeriodSeconds,
} from '@stillpier/analysis';
import { describe, expect, it } from 'vitest';
import { allowed, check, type Entry } from './checks';

interface Camera {
  pixel_um: number;
  focal_mm: number;
  binning?: number;
}
const scaleOf = ({ pixel_um, focal_mm, binning }: Camera) =>
  plateScaleArcsecPerPx(pixel_um, binning ?? 1, focal_mm);

const agrees = (
  got: number,
  { expected, tolerance, title }: { expected: number; tolerance: object; title: string },
) => {
  expect(Math.abs(got - expected), title).toBeLessThanOrEqual(allowed(tolerance, expected));
};

describe('plate scale', () => {
  it('a radian has 648000 / π arcseconds (1.1)', () => {
    agrees(ARCSEC_PER_RADIAN, check('1.1') as Entry<unknown, number>);
  });

  it.each(['1.2a', '1.2b', '1.2c'])(
    'pixel, binning and focal length of %s give its scale',
    (id) => {
      const entry = check(id) as Entry<Camera, number>;
      agrees(scaleOf(entry.inputs), entry);
    },
  );

  it('the flat formula is the exact angle of an axial pixel within 1e-9 (1.2d)', () => {
    const { inputs, expected } = check('1.2d') as Entry<Camera, number>;
    expect(Math.abs(scaleOf(inputs) / expected - 1)).toBeLessThan(1e-9);
  });

  it('an error in guide pixels becomes arcseconds and imaging pixels by the two scales (1.3)', () => {
    const { inputs, expected, tolerance, title } = check('1.3') as Entry<
      { guide: Camera; imaging: Camera; err_guide_px: number },
      { ratio: number; err_arcsec: number; err_img_px: number }
    >;
    const ratio = scaleRatio(scaleOf(inputs.guide), scaleOf(inputs.imaging));
    agrees(ratio, { expected: expected.ratio, tolerance, title });
    const arcsec = inputs.err_guide_px * scaleOf(inputs.guide);
    agrees(arcsec, { expected: expected.err_arcsec, tolerance, title });
    agrees(inputs.err_guide_px * ratio, { expected: expected.err_img_px, tolerance, title });
  });
});

describe('sampling', () => {
  it('a star of two pixels is sampled by the largest pixel that will do (1.5c)', () => {
    const { inputs, expected } = check('1.5c') as Entry<{ fwhm_arcsec: number }, number>;
    const pixelUm = 3.76;
    const focalLengthMm = (pixelUm * ARCSEC_PER_RADIAN) / 1000 / expected;
    const optics = describeOptics({
      imaging: { focalLengthMm, pixelUm },
      seeingFwhmArcsec: inputs.fwhm_arcsec,
    });
    expect(optics.seeingSamplingPx).toBeCloseTo(2, 9);
  });
});

describe('resolution', () => {
  it("Dawes' limit is 116 over the aperture (2.1)", () => {
    const entry = check('2.1') as Entry<{ D_mm: number }, number>;
    agrees(dawesArcsec(entry.inputs.D_mm), entry);
  });

  it("Rayleigh's limit is the first dark ring of the round opening (2.2b)", () => {
    const entry = check('2.2b') as Entry<{ D_mm: number; lambda_nm: number }, number>;
    agrees(rayleighArcsec(entry.inputs.D_mm, entry.inputs.lambda_nm), entry);
  });

  it('the first dark ring lies at 1.21967 λ/D (2.2a)', () => {
    // One nanometre over an aperture of so many millimetres is one arcsecond.
    agrees(rayleighArcsec(1e-6 * ARCSEC_PER_RADIAN, 1), check('2.2a') as Entry<unknown, number>);
  });

  it('138 over the aperture is Rayleigh at 548.5 nm (2.4)', () => {
    const { expected } = check('2.4') as Entry<unknown, number>;
    // The wavelength is given to 1e-6 of itself.
    expect(Math.abs(rayleighArcsec(1, expected) - 138)).toBeLessThan(138e-6);
  });
});

describe('sidereal rate and worm period', () => {
  it('a star of fixed place goes round in a stellar day (3.2, 3.3, 3.4b)', () => {
    agrees(1296000 / STAR_RATE_ARCSEC_PER_SECOND, check('3.2') as Entry<unknown, number>);
    agrees(STAR_RATE_ARCSEC_PER_SECOND / ARCSEC_PER_RADIAN, check('3.3') as Entry<unknown, number>);
  });

  it('the sidereal day and the rate agree (3.1, 3.4a)', () => {
    agrees(SIDEREAL_DAY_SECONDS, check('3.1') as Entry<unknown, number>);
    agrees(SIDEREAL_RATE_ARCSEC_PER_SECOND, check('3.4a') as Entry<unknown, number>);
  });

  it.each(['144', '180', '360', '435'])('a wheel of %s teeth gives its worm period', (teeth) => {
    const { expected, tolerance, title } = check(`3.5.${teeth}`) as Entry<unknown, { T_s: number }>;
    agrees(wormPeriodSeconds(Number(teeth)), { expected: expected.T_s, tolerance, title });
  });

  it('the worm and its parts are the periods that a spectrum names (12.1)', () => {
    const { expected, tolerance } = check('12.1') as Entry<
      { teeth: number },
      { T: number; T2: number; T3: number }
    >;
    const named = namedPeriods({ mount: { wormTeeth: 180 } });
    const of = (label: string) => named.find((period) => period.label === label)!.periodSeconds;
    agrees(of('worm'), { expected: expected.T, tolerance, title: '12.1' });
    agrees(of('worm / 2'), { expected: expected.T2, tolerance, title: '12.1' });
    agrees(of('worm / 3'), { expected: expected.T3, tolerance, title: '12.1' });
  });
});
