import {
  altitudeDegrees,
  greenwichSiderealHours,
  hourAngleHours,
  julianDay,
  parallacticAngleDegrees,
} from '@stillpier/analysis';
import { describe, expect, it } from 'vitest';
import { allowed, check, type Entry } from './checks';

const agrees = (got: number, expected: number, { tolerance, title }: Entry<unknown, unknown>) => {
  expect(Math.abs(got - expected), title).toBeLessThanOrEqual(allowed(tolerance, expected));
};

describe('time', () => {
  it('the Julian day of 1970 is the offset of Unix time (10.1e)', () => {
    const entry = check('10.1e') as Entry<{ unix_ms: number }, number>;
    agrees(julianDay(entry.inputs.unix_ms / 1000), entry.expected, entry);
  });

  it.each([
    ['10.1a', '1957-10-04T19:26:24Z'],
    ['10.1b', '1987-04-10T00:00:00Z'],
    ['10.1c', '2000-01-01T12:00:00Z'],
  ])('the Julian day of %s is that of the calendar', (id, instant) => {
    const entry = check(id) as Entry<unknown, number>;
    agrees(julianDay(Date.parse(instant) / 1000), entry.expected, entry);
  });

  it.each(['10.2a', '10.2b'])('mean sidereal time at Greenwich of %s', (id) => {
    const entry = check(id) as Entry<{ jd: number }, number>;
    agrees(greenwichSiderealHours(entry.inputs.jd), entry.expected, entry);
  });

  it('the hour angle is sidereal time and longitude less right ascension (10.6)', () => {
    const entry = check('10.6') as Entry<
      { gmst_h: number; lon_east_deg: number; ra_h: number },
      number
    >;
    const { gmst_h, lon_east_deg, ra_h } = entry.inputs;
    agrees(hourAngleHours(gmst_h, lon_east_deg, ra_h) * 15, entry.expected, entry);
  });

  it('the hour angle stays between -12 and 12 hours', () => {
    expect(hourAngleHours(1, 0, 23)).toBeCloseTo(2, 12); // by hand: 1 - 23 + 24
    expect(hourAngleHours(23, 30, 1)).toBeCloseTo(0, 12); // by hand: 23 + 2 - 1 - 24
    expect(hourAngleHours(0, 0, 12)).toBe(12); // by hand: the lower meridian counts as west
  });
});

describe('place in the sky', () => {
  it('the altitude of Venus in the worked example (10.3a)', () => {
    const entry = check('10.3a') as Entry<
      { dec_deg: number; lat_deg: number },
      { h_deg: number; H_deg: number; A_south_deg: number }
    >;
    const { dec_deg, lat_deg } = entry.inputs;
    agrees(
      altitudeDegrees(lat_deg, dec_deg, entry.expected.H_deg / 15),
      entry.expected.h_deg,
      entry,
    );
  });

  it('the same altitude by another theory of sidereal time (10.3b)', () => {
    const { inputs } = check('10.3a') as Entry<
      { dec_deg: number; lat_deg: number; lon_east_deg: number; jd: number; ra_h: number },
      unknown
    >;
    const { expected, title } = check('10.3b') as Entry<unknown, { h_deg: number }>;
    const hourAngle = hourAngleHours(
      greenwichSiderealHours(inputs.jd),
      inputs.lon_east_deg,
      inputs.ra_h,
    );
    const altitude = altitudeDegrees(inputs.lat_deg, inputs.dec_deg, hourAngle);
    // Mean for apparent sidereal time: the nutation of that day moves the altitude by 0.0007°.
    expect(Math.abs(altitude - expected.h_deg), title).toBeLessThan(0.001);
  });

  it('the parallactic angle west of the meridian (10.4)', () => {
    const entry = check('10.4') as Entry<
      { H_deg: number; lat_deg: number; dec_deg: number },
      number
    >;
    const { H_deg, lat_deg, dec_deg } = entry.inputs;
    agrees(parallacticAngleDegrees(lat_deg, dec_deg, H_deg / 15), entry.expected, entry);
  });

  it('on the meridian the zenith lies away from the pole or beyond it', () => {
    // By geometry: south of the zenith the pole and the zenith are in one direction, north of it opposite.
    expect(parallacticAngleDegrees(50, 20, 0)).toBe(0);
    expect(parallacticAngleDegrees(50, 80, 0)).toBe(180);
  });
});
