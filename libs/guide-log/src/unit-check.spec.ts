import { describe, expect, it } from 'vitest';
import { unitWarnings } from './unit-check';

const sine = (amplitude: number, count = 5000) =>
  Float64Array.from({ length: count }, (_, n) => amplitude * Math.sin(n / 9));
const calm = sine(0.7);

// Expected RMS: amplitude / √2 of a sine over many periods.
describe('the unit of the errors', () => {
  it('is not doubted for a star that is guided, or drifts with a worm of 20″', () => {
    expect(unitWarnings(calm, sine(20), 'arcsec')).toEqual([]);
    expect(unitWarnings(calm, sine(0.02), 'guide px')).toEqual([]);
  });

  it('is doubted for a star that moves by 40″ RMS', () => {
    expect(unitWarnings(sine(40 * Math.SQRT2), calm, 'arcsec')).toEqual([
      'The star moves by 40″ RMS in RA, far more than a guided star: check the unit of the errors.',
    ]);
  });

  it('is doubted for places on the camera that were taken for errors', () => {
    const places = Float64Array.from({ length: 60_000 }, (_, n) => 512 + (n % 3));
    expect(unitWarnings(calm, places, 'guide px')).toEqual([
      'The star moves by 510 guide px RMS in Dec, far more than a guided star: check the unit of the errors.',
    ]);
  });

  it('is doubted for degrees that were taken for arcseconds', () => {
    expect(unitWarnings(sine(0.7 / 3600), calm, 'arcsec')).toEqual([
      'The star moves by 0.00014″ RMS in RA, less than any star: check the unit of the errors.',
    ]);
  });

  it('is not doubted for a few wild frames, for missing ones or for none', () => {
    const wild = calm.map((error, n) => (n % 100 === 7 ? 9999 : error));
    const gaps = calm.map((error, n) => (n % 3 === 0 ? NaN : error));
    expect(unitWarnings(wild, gaps, 'arcsec')).toEqual([]);
    expect(unitWarnings(Float64Array.of(NaN, NaN), new Float64Array(9), 'arcsec')).toEqual([]);
  });
});
