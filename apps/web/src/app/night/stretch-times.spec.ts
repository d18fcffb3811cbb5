import { clockAt, secondsAt, stretchText } from './stretch-times';

// Berlin is UTC+1 in November.
const CLOCK = { startMs: Date.parse('2026-11-28T22:59:50.500Z'), timeZone: 'Europe/Berlin' };

describe('the times of a stretch', () => {
  it('are those of the site, also over midnight', () => {
    expect(stretchText(CLOCK, { fromSeconds: 0, toSeconds: 19.5 })).toBe('23:59:50 to 00:00:10');
    expect(secondsAt(CLOCK, '00:00:10')).toBe(19.5);
  });

  it('do not begin before the run', () => {
    expect(secondsAt(CLOCK, '23:59:50')).toBe(0);
  });

  it('may leave the seconds out, as a time field does for full minutes', () => {
    expect(secondsAt(CLOCK, '00:01')).toBe(69.5);
  });

  it('count from the start of a run that has no time of day', () => {
    const clock = { startMs: null, timeZone: 'Europe/Berlin' };
    expect(clockAt(clock, 3725)).toBe('01:02:05');
    expect(secondsAt(clock, '01:02:05')).toBe(3725);
  });

  it('are none where the text is no time', () => {
    expect(secondsAt(CLOCK, '')).toBeNull();
  });
});
