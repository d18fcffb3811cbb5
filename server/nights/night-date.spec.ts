import { describe, expect, it } from 'vitest';
import { instantOfWallClock, nightDateOf } from './night-date';

// Offsets of the zones: IANA time zone database (Toronto −5 h / −4 h, change on 2026-03-08 at 02:00).
describe('nightDateOf', () => {
  it.each([
    ['an evening', '2026-03-15T01:40:00Z', 'America/Toronto', '2026-03-14'],
    ['the hours after midnight', '2026-03-15T08:00:00Z', 'America/Toronto', '2026-03-14'],
    ['the last second before noon', '2026-03-15T15:59:59Z', 'America/Toronto', '2026-03-14'],
    ['noon itself', '2026-03-15T16:00:00Z', 'America/Toronto', '2026-03-15'],
    [
      'noon on the day of the clock change',
      '2026-03-08T16:00:00Z',
      'America/Toronto',
      '2026-03-08',
    ],
    ['a site east of Greenwich', '2026-03-14T12:30:00Z', 'Australia/Perth', '2026-03-14'],
  ])('takes %s for the right night', (_what, instant, zone, night) => {
    expect(nightDateOf(new Date(instant), zone)).toBe(night);
  });
});

describe('instantOfWallClock', () => {
  it.each([
    ['winter', '2026-01-10T22:00:00.250Z', '2026-01-11T03:00:00.250Z'],
    ['summer', '2026-07-10T22:00:00Z', '2026-07-11T02:00:00Z'],
    ['the hour that is shown twice', '2026-11-01T01:30:00Z', '2026-11-01T05:30:00Z'],
    ['the hour that is left out', '2026-03-08T02:30:00Z', '2026-03-08T07:30:00Z'],
  ])('finds the instant in %s', (_what, clock, instant) => {
    const found = instantOfWallClock(Date.parse(clock), 'America/Toronto');
    expect(found.toISOString()).toBe(new Date(instant).toISOString());
  });
});
