import { describe, expect, it } from 'vitest';
import { type Expected, seen, timeIn, utf8 } from '../../../test/support/small-guide-log';
import { type ColumnMap } from './column-map';
import { readGuideLog } from './log-reader';
import { previewGuideLog } from './preview';

const DATE_AND_CLOCK: ColumnMap = {
  columns: {
    d: { role: 'date' },
    t: { role: 'time', unit: 'clock' },
    x: { role: 'raError', unit: 'arcsec' },
    y: { role: 'decError', unit: 'arcsec' },
  },
};
const DAY_FIRST: ColumnMap = { dateOrder: 'day-month-year' };
const ZONE_OF_THE_PLACE = -4 * 3600;

const log = (...rows: string[]) => ['d,t,x,y', ...rows, ''].join('\n');
const oneTime = (...rows: string[]) =>
  ['timestamp,ra error arcsec,dec error arcsec', ...rows, ''].join('\n');

// Every expected number is written in the small file itself; the clock of the place is four hours behind UTC.
const CASES: [name: string, file: string, map: ColumnMap, expected: Expected][] = [
  [
    'date and time in two columns, past midnight',
    log('2026-03-14,23:59:59,1,2', '2026-03-15,00:00:01.5,3,4'),
    DATE_AND_CLOCK,
    { time: [0, 2.5], start: '2026-03-15T03:59:59.000Z', refused: [], warnings: [] },
  ],
  [
    'date and time with a zone in two columns',
    log('2026-03-14,23:59:59Z,1,2'),
    DATE_AND_CLOCK,
    { start: '2026-03-14T23:59:59.000Z' },
  ],
  [
    'a date that is missing in one line',
    log('2026-03-14,23:00:00,1,2', ',23:00:02,1,2', '2026-03-14,23:00:04,3,4'),
    DATE_AND_CLOCK,
    { time: [0, 4], refused: [[3, 'time is not a date and time: "23:00:02"']] },
  ],
  [
    'days first: no month has the number 14',
    oneTime('14/03/2026 21:40:00,1,2', '14/03/2026 21:40:02,3,4'),
    {},
    { time: [0, 2], start: '2026-03-15T01:40:00.000Z', refused: [] },
  ],
  [
    'days first in a column of dates, with points and without leading zeros',
    log('14.3.2026,21:40:00,1,2', '14.3.2026,21:40:02,3,4'),
    DATE_AND_CLOCK,
    { time: [0, 2], start: '2026-03-15T01:40:00.000Z' },
  ],
  [
    'months first: no month has the number 14',
    oneTime('03/14/2026 21:40:00,1,2'),
    {},
    { start: '2026-03-15T01:40:00.000Z' },
  ],
  [
    'both readings possible, and the map says that the day is first',
    oneTime('03/04/2026 21:40:00Z,1,2'),
    DAY_FIRST,
    { start: '2026-04-03T21:40:00.000Z' },
  ],
  [
    'both readings possible, and the map says that the month is first',
    oneTime('03/04/2026 21:40:00Z,1,2'),
    { dateOrder: 'month-day-year' },
    { start: '2026-03-04T21:40:00.000Z' },
  ],
  [
    'one date of the file decides for all',
    oneTime('12/03/2026 23:59:59Z,1,2', '13/03/2026 00:00:01Z,3,4'),
    {},
    { time: [0, 2], start: '2026-03-12T23:59:59.000Z' },
  ],
  [
    'the word of the map against a date that it makes impossible',
    oneTime('03/14/2026 21:40:00Z,1,2', '04/03/2026 21:40:00Z,1,2'),
    DAY_FIRST,
    { refused: [[2, 'time is not a date and time: "03/14/2026 21:40:00Z"']] },
  ],
  [
    'dates with the year first, whatever the map says of the others',
    oneTime('2026-03-04T21:40:00Z,1,2'),
    DAY_FIRST,
    { start: '2026-03-04T21:40:00.000Z' },
  ],
  [
    'a clock of twelve hours',
    oneTime('3/14/2026 11:59:58 PM,1,2', '3/15/2026 12:00:01 AM,3,4'),
    {},
    { time: [0, 3], start: '2026-03-15T03:59:58.000Z' },
  ],
  [
    'a clock of twelve hours that shows thirteen',
    '13:00:00 PM,1,2\n12:00:00 PM,3,4\n1:00:00 pm,5,6\n',
    timeIn('clock'),
    { time: [0, 3600], refused: [[1, 'time is not a time of day: "13:00:00 PM"']] },
  ],
];

describe('dates beside clocks and dates whose year stands last', () => {
  it.each(CASES)('are read: %s', (_name, file, map, expected) => {
    const instantOfLocalTime = (seconds: number) => seconds - ZONE_OF_THE_PLACE;
    expect(seen(readGuideLog(utf8(file), { map, instantOfLocalTime }))).toMatchObject(expected);
  });

  it('are asked for, not guessed, where both readings are possible', () => {
    const sentence =
      'The date "03/04/2026" can be read with the day or with the month first: the column map must say which (dateOrder).';
    const bytes = utf8(oneTime('03/04/2026 21:40:00,1,2', '04/04/2026 00:10:00,1,2'));
    expect(() => readGuideLog(bytes)).toThrow(
      expect.objectContaining({ fault: 'date-order-open', message: sentence }),
    );
    expect(previewGuideLog(bytes)).toMatchObject({
      dateOrder: null,
      asksDateOrder: true,
      missing: sentence,
    });
    expect(previewGuideLog(bytes, DAY_FIRST)).toMatchObject({
      dateOrder: 'day-month-year',
      asksDateOrder: false,
      missing: null,
    });
  });

  it('say in the preview which order was found', () => {
    const preview = previewGuideLog(utf8(oneTime('03/14/2026 21:40:00,1,2')));
    expect(preview).toMatchObject({ dateOrder: 'month-day-year', asksDateOrder: false });
  });
});
