import { describe, expect, it } from 'vitest';
import { knownHeader } from './known-headers';

// The words are the project's own; the ways of writing a unit are common practice, no source.
describe('a header text', () => {
  it.each([
    ['RA error (arcsec)', 'raError', 'arcsec'],
    ['RA_error [px]', 'raError', 'guide px'],
    ['dec-error / arcsec', 'decError', 'arcsec'],
    ['Dec error (")', 'decError', 'arcsec'],
    ['Dec error (″)', 'decError', 'arcsec'],
    ['RA correction(ms)', 'raCorrection', 'ms'],
    ['dec correction [arcsec]', 'decCorrection', 'arcsec'],
    ['Time (s)', 'time', 'seconds'],
    ['time [ms]', 'time', 'milliseconds'],
    ['Declination (°)', 'declination', 'degrees'],
    ['hour angle (hours)', 'hourAngle', 'hours'],
    ['TIMESTAMP', 'time', 'iso'],
  ])('is recognised with its unit: %s', (text, role, unit) => {
    expect(knownHeader(text)).toEqual({ role, unit });
  });

  it.each([
    'RA error',
    'RA error (mm)',
    'RA error (degrees)',
    'RA (arcsec)',
    'error (arcsec)',
    'time',
    'time (min)',
    'snr (dB)',
    '(arcsec)',
    'RA error (arcsec) (px)',
    'RA error (arcsec',
  ])('is not guessed: %s', (text) => {
    expect(knownHeader(text)).toBeUndefined();
  });
});
