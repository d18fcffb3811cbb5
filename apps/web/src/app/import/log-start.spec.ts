import { previewGuideLog } from '@stillpier/guide-log';
import { guessStart, startTimeOf } from './log-start';

const preview = previewGuideLog(
  new TextEncoder().encode('clock,dRA,dDec\n18:42:15,0.45,-0.67\n18:42:17,-0.01,0.09\n'),
);
const CLOCK = [{ role: 'time', unit: 'clock' } as const];
const MORNING = Date.UTC(2026, 10, 29, 7); // 08:00 at the site

describe('guessStart', () => {
  it('takes the date in the name and the time of the clock column', () => {
    const guess = guessStart(
      { name: 'guide_2026-11-28.csv', lastModified: MORNING },
      preview,
      CLOCK,
      'Europe/Berlin',
    );
    expect(guess.local).toBe('2026-11-28T18:42:15');
  });

  it('takes the evening before the file was written', () => {
    const file = { name: 'guide.csv', lastModified: MORNING };
    const guess = guessStart(file, preview, CLOCK, 'Europe/Berlin');
    expect(guess.local).toBe('2026-11-28T18:42:15');
  });

  it.each([
    ['18:42:15', '2026-01-20T18:42:15'],
    ['02:10:00', '2026-01-21T02:10:00'], // a night lasts from noon to noon
  ])('puts a log that was read before into its night again: %s', (clock, local) => {
    const log = new TextEncoder().encode(`clock,dRA,dDec\n${clock},0.45,-0.67\n`);
    const file = { name: 'guide_2026-11-28.csv', lastModified: MORNING, night: '2026-01-20' };
    const guess = guessStart(file, previewGuideLog(log), CLOCK, 'Europe/Berlin');
    expect(guess.local).toBe(local);
  });

  it('guesses no time of day, but says when the file was written', () => {
    const file = { name: 'guide.csv', lastModified: MORNING };
    const guess = guessStart(file, preview, [], 'Europe/Berlin');
    expect(guess).toEqual({
      local: '',
      hint: 'The file was last written on 29 Nov 2026 at 08:00.',
    });
  });
});

describe('startTimeOf', () => {
  // Offsets: IANA time zone database (Berlin +1 h in winter, +2 h in summer).
  it.each([
    ['2026-11-28T18:42:15', '2026-11-28T17:42:15.000Z'],
    ['2026-07-01T23:00', '2026-07-01T21:00:00.000Z'],
    ['2026-10-25T02:30', '2026-10-25T00:30:00.000Z'], // shown twice: the first of the two
  ])('finds the instant of %s at the site', (local, instant) => {
    expect(startTimeOf(local, 'Europe/Berlin')).toBe(instant);
  });

  it('has no instant for a field that is not filled', () => {
    expect(startTimeOf('', 'Europe/Berlin')).toBeNull();
  });
});
