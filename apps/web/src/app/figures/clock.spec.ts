import { clockSecondsText, clockText, clockTicks, nightDatesText, zoneOffsetText } from './clock';

const EVENING = Date.UTC(2026, 10, 28, 17, 42, 15);

// Expected times: the IANA zone's offset at that date, worked out by hand.
describe('clock', () => {
  it('shows the time at the site, not in the browser', () => {
    expect(clockText(EVENING, 'Europe/Berlin')).toBe('18:42');
    expect(clockSecondsText(EVENING, 'America/Toronto')).toBe('12:42:15');
  });

  it('names the offset with a true minus', () => {
    expect(zoneOffsetText(EVENING, 'Europe/Berlin')).toBe('UTC+1');
    expect(zoneOffsetText(EVENING, 'America/Toronto')).toBe('UTC\u22125');
  });

  it('names a night by its evening and its morning', () => {
    expect(nightDatesText('2026-11-28').replace(/\s/g, ' ')).toBe('28–29 November 2026');
  });

  it('puts ticks on full hours of a zone with an odd offset', () => {
    const ticks = clockTicks(EVENING, EVENING + 4 * 3_600_000, 5, 'Asia/Kolkata'); // UTC+5:30
    expect(ticks.map((t) => clockText(t, 'Asia/Kolkata'))).toEqual([
      '00:00',
      '01:00',
      '02:00',
      '03:00',
    ]);
  });

  it('goes down to seconds for a short stretch', () => {
    const ticks = clockTicks(EVENING, EVENING + 20_000, 5, 'UTC');
    expect(ticks.map((t) => clockSecondsText(t, 'UTC'))).toEqual([
      '17:42:15',
      '17:42:20',
      '17:42:25',
      '17:42:30',
      '17:42:35',
    ]);
  });
});
