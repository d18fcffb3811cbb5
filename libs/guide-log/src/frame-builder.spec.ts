import { describe, expect, it } from 'vitest';
import {
  type Expected,
  HEADER,
  seen,
  timeIn,
  utf8,
  withDirections,
} from '../../../test/support/small-guide-log';
import { type ColumnMap } from './column-map';
import { readGuideLog } from './log-reader';

// Every expected number is written in the small file itself.
const CASES: [name: string, file: string | Uint8Array, map: ColumnMap, expected: Expected][] = [
  // Numbers
  [
    'blank and NaN errors are frames without a star',
    `${HEADER}\n0,,2\n1,NaN,3\n2,1,nan\n`,
    {},
    { ra: [NaN, NaN, 1], dec: [2, 3, NaN], refused: [] },
  ],
  [
    'text where a number must be',
    `${HEADER}\n0,--,2\n1,1,0x10\n2,inf,1\n3,1 px,2\n4,1,2\n`,
    {},
    {
      ra: [1],
      refused: [
        [2, 'RA error is not a number: "--"'],
        [3, 'Dec error is not a number: "0x10"'],
        [4, 'RA error is not a number: "inf"'],
        [5, 'RA error is not a number: "1 px"'],
      ],
    },
  ],
  [
    'exponents, leading points, plus and minus signs',
    `${HEADER}\n0,1e-2,.5\n1,+1.,−2\n`,
    {},
    { ra: [0.01, 1], dec: [0.5, -2] },
  ],
  [
    'grouped thousands are not numbers',
    'time s;ra error arcsec;dec error arcsec\n0;1.234,5;1,5\n1;0,5;1,5\n',
    {},
    { ra: [0.5], refused: [[2, 'RA error is not a number: "1.234,5"']] },
  ],
  [
    'lines too short and too long',
    `${HEADER}\n0,1\n1,1,2,3\n2,3,4\n`,
    {},
    {
      ra: [3],
      refused: [
        [2, 'the line has 2 columns instead of 3'],
        [3, 'the line has 4 columns instead of 3'],
      ],
    },
  ],
  // Times
  ['times that do not begin at zero', `${HEADER}\n100.5,1,2\n102.5,3,4\n`, {}, { time: [0, 2] }],
  ['milliseconds', '500,1,2\n2500,3,4\n', timeIn('milliseconds'), { time: [0, 2] }],
  [
    'epoch seconds',
    '1773538800,1,2\n1773538802.5,3,4\n',
    timeIn('epoch seconds'),
    { time: [0, 2.5], start: '2026-03-15T01:40:00.000Z' },
  ],
  [
    'epoch milliseconds',
    '1773538800000,1,2\n1773538802500,3,4\n',
    timeIn('epoch milliseconds'),
    { time: [0, 2.5], start: '2026-03-15T01:40:00.000Z' },
  ],
  [
    'ISO times in UTC',
    'timestamp,ra error arcsec,dec error arcsec\n2026-03-14T23:59:59Z,1,2\n2026-03-15T00:00:01.25Z,3,4\n',
    {},
    { time: [0, 2.25], start: '2026-03-14T23:59:59.000Z' },
  ],
  [
    'ISO times with an offset and a blank',
    'timestamp,ra error arcsec,dec error arcsec\n2026-03-14 21:40:00-04:00,1,2\n2026-03-14 21:40:02-04:00,3,4\n',
    {},
    { time: [0, 2], start: '2026-03-15T01:40:00.000Z' },
  ],
  [
    'ISO times without a zone',
    'timestamp,ra error arcsec,dec error arcsec\n2026-03-14T21:40:00,1,2\n',
    {},
    {
      start: null,
      warnings: ['The times carry no time zone, so that the instant of the start is not known.'],
    },
  ],
  [
    'ISO times without a zone, with a start in the map',
    'timestamp,ra error arcsec,dec error arcsec\n2026-03-14T21:40:00,1,2\n',
    { startTime: '2026-03-14T21:40:00-04:00' },
    { start: '2026-03-15T01:40:00.000Z', warnings: [] },
  ],
  [
    'dates that are none',
    'timestamp,ra error arcsec,dec error arcsec\n2026-02-31T21:40:00Z,1,2\n2026-03-14T25:00:00Z,1,2\n2026-03-14T21:40:00Z,1,2\n',
    {},
    {
      time: [0],
      refused: [
        [2, 'time is not a date and time: "2026-02-31T21:40:00Z"'],
        [3, 'time is not a date and time: "2026-03-14T25:00:00Z"'],
      ],
    },
  ],
  [
    'seconds beside a timestamp: the start comes from the timestamp',
    `timestamp,${HEADER}\n2026-03-14T21:40:00Z,5.25,1,2\n2026-03-14T21:40:01Z,6.5,3,4\n`,
    {},
    { time: [0, 1.25], start: '2026-03-14T21:40:00.000Z', warnings: [] },
  ],
  [
    'a clock past midnight',
    '23:59:58,1,2\n00:00:00.5,3,4\n00:00:02,5,6\n',
    timeIn('clock'),
    { time: [0, 2.5, 4], refused: [], start: null },
  ],
  [
    'seconds of the day past midnight',
    '86398,1,2\n0.5,3,4\n',
    timeIn('seconds'),
    { time: [0, 2.5], refused: [] },
  ],
  [
    'a time that goes back',
    `${HEADER}\n0,1,2\n4,3,4\n2,5,6\n6,7,8\n`,
    {},
    { time: [0, 4, 6], refused: [[4, 'time goes back by 2 s']] },
  ],
  [
    'a time that goes back with a new run',
    `${HEADER},run\n0,1,2,a\n4,3,4,a\n1,5,6,b\n`,
    {},
    { time: [0, 4, 1], runs: ['a', 'b'], run: [0, 0, 1], refused: [] },
  ],
  ['a blank time', `${HEADER}\n,1,2\n2,3,4\n`, {}, { time: [0], refused: [[2, 'time is blank']] }],
  // Corrections and states
  [
    'directions in a column of their own',
    't,x,y,p,d\n0,1,2,100,E\n1,1,2,50,w\n2,1,2,0,\n3,1,2,,\n4,1,2,70,q\n5,1,2,70,\n',
    withDirections,
    {
      raCorrection: [100, -50, 0, NaN],
      refused: [
        [6, 'RA direction is not known: "q"'],
        [7, 'RA direction is not known: ""'],
      ],
    },
  ],
  [
    'directions as signs',
    't,x,y,p,d\n0,1,2,100,+\n1,1,2,50,-\n',
    withDirections,
    { raCorrection: [100, -50] },
  ],
  [
    'the words for states',
    `${HEADER},state\n0,1,2,guiding\n1,1,2,Dither\n2,1,2,SETTLING\n3,1,2,star_lost\n4,1,2,\n`,
    {},
    { state: [0, 1, 2, 3, 0], warnings: [] },
  ],
  [
    'states that the map explains, and one that nobody does',
    `${HEADER},state\n0,1,2,G\n1,1,2,D\n2,1,2,X\n`,
    { states: { g: 'guiding', D: 'dither' } },
    {
      state: [0, 1, 0],
      warnings: [
        'The state column has texts that the map does not explain, taken as guiding: "X" (1 frame).',
      ],
    },
  ],
];

describe('numbers, times, corrections and states', () => {
  it.each(CASES)('are read: %s', (_name, file, map, expected) => {
    const log = readGuideLog(typeof file === 'string' ? utf8(file) : file, { map });
    expect(seen(log)).toMatchObject(expected);
  });
});
