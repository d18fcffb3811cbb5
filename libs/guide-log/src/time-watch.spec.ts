import { describe, expect, it } from 'vitest';
import { HEADER, timeIn, utf8 } from '../../../test/support/small-guide-log';
import { readGuideLog } from './log-reader';

/** A log of frames at these times; the first of them stands in line 2. */
const warningsAt = (times: readonly number[]) =>
  readGuideLog(utf8(`${HEADER}\n${times.map((time) => `${time},0.1,0.2\n`).join('')}`)).reading
    .warnings;
const evenly = (count: number, step: number, from = 0) =>
  Array.from({ length: count }, (_, n) => from + n * step);

describe('the times of a log', () => {
  it('raise no warning while they are even, uneven by a little, or pause', () => {
    const uneven = evenly(400, 2).map((time, n) => time + ((n * 7) % 5) / 10);
    expect(warningsAt(evenly(400, 2))).toEqual([]);
    expect(warningsAt(uneven)).toEqual([]);
    expect(warningsAt([...evenly(200, 2), ...evenly(200, 2, 3000)])).toEqual([]);
  });

  it('tell where the cadence changes and changes back', () => {
    const times = [...evenly(200, 2), ...evenly(200, 5, 405), ...evenly(200, 2, 1405)];
    expect(warningsAt(times)).toEqual([
      'From about line 202 on the frames are 5 s apart instead of 2 s.',
      'From about line 403 on the frames are 2 s apart instead of 5 s.',
    ]);
  });

  it('tell of a clock that was set back inside a run', () => {
    // An hour back at line 102: the next frame that counts is the one after 198 s + 3600 s.
    const times = [...evenly(100, 2, 3600), ...evenly(1900, 2, 200)];
    const { reading } = readGuideLog(
      utf8(`${HEADER}\n${times.map((time) => `${time},0.1,0.2\n`).join('')}`),
    );
    expect(reading.refusedCount).toBe(1799);
    expect(reading.warnings).toEqual([
      'In line 102 the clock goes back by 3598 s: 1799 lines are refused, until line 1901, whose times lie before that of line 101.',
    ]);
  });

  it('tell of a clock that stays back until the end', () => {
    const times = [...evenly(100, 2, 3600), ...evenly(20, 2, 200)];
    expect(warningsAt(times)).toEqual([
      'In line 102 the clock goes back by 3598 s: 20 lines are refused, until the end of the file, whose times lie before that of line 101.',
    ]);
  });

  it('leave a few lines out of place to the list of refused lines', () => {
    expect(warningsAt([...evenly(100, 2), 20, 22, ...evenly(100, 2, 200)])).toEqual([]);
  });

  it('tell of a date that goes back by more than half a day', () => {
    const at = (day: string) => `2026-03-${day}T21:40:00Z,1,2\n`;
    const { reading, frames } = readGuideLog(
      utf8(`timestamp,ra error arcsec,dec error arcsec\n${at('14')}${at('12')}`),
    );
    expect(frames.count).toBe(2);
    expect(reading.warnings).toEqual([
      'In line 3 the time goes back by 172800 s: a new run begins there.',
    ]);
  });

  it('are no more than twenty warnings and a count', () => {
    const times = Array.from({ length: 30 }, (_, n) => evenly(60, 2, 90_000 * (30 - n))).flat();
    const warnings = warningsAt(times);
    expect(warnings).toHaveLength(21);
    expect(warnings.at(-1)).toBe('The times change their course 9 more times.');
  });

  it('pass midnight without a word', () => {
    const clock = evenly(200, 2, 86_300).map((time) => {
      const seconds = time % 86_400;
      const parts = [Math.floor(seconds / 3600), Math.floor(seconds / 60) % 60, seconds % 60];
      return `${parts.map((part) => String(part).padStart(2, '0')).join(':')},1,2\n`;
    });
    const { reading, frames } = readGuideLog(utf8(clock.join('')), { map: timeIn('clock') });
    expect(frames.timeSeconds.at(-1)).toBe(398);
    expect(reading.warnings).toEqual([]);
  });
});
