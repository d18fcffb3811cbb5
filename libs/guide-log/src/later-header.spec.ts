import { describe, expect, it } from 'vitest';
import { type Expected, HEADER, seen, utf8 } from '../../../test/support/small-guide-log';
import { type ColumnMap } from './column-map';
import { readGuideLog } from './log-reader';

const UNREAD = 'has no column that is known as the Dec error';
const PIXELS = 'has the RA error in another unit than the first header';

// Every expected number is written in the small file itself.
const CASES: [name: string, file: string, map: ColumnMap, expected: Expected][] = [
  [
    'the columns in another order',
    `${HEADER}\n0,1,2\ndec error arcsec,time s,ra error arcsec\n4,0,3\n`,
    {},
    { time: [0, 0], ra: [1, 3], dec: [2, 4], refused: [], warnings: [] },
  ],
  [
    'fewer columns: what is missing is blank',
    `${HEADER},ra correction ms,state\n0,1,2,30,dither\n${HEADER}\n0,3,4\n`,
    {},
    { ra: [1, 3], raCorrection: [30, NaN], state: [1, 0], refused: [] },
  ],
  [
    'more columns: they are not read, and that is said',
    `${HEADER}\n0,1,2\n${HEADER},snr,flux\n0,3,4,5,6\n`,
    {},
    {
      ra: [1, 3],
      refused: [],
      warnings: [
        'The header in line 3 has columns that the first header does not have, and they are not read: "snr".',
      ],
    },
  ],
  [
    'text, a preamble and a comment between the runs',
    `${HEADER}\n0,1,2\n\nCamera: north pier\n# second run\n# ra error arcsec,dec error arcsec,time s\n3,4,0\n`,
    {},
    { ra: [1, 3], refused: [[4, 'the line has 1 column instead of 3']] },
  ],
  [
    'names that the map gives',
    't,x,y\n0,1,2\ny,x,t\n4,3,0\n',
    {
      columns: {
        t: { role: 'time', unit: 'seconds' },
        x: { role: 'raError', unit: 'arcsec' },
        y: { role: 'decError', unit: 'arcsec' },
      },
    },
    { ra: [1, 3], dec: [2, 4] },
  ],
  [
    'an error missing: its lines are refused, and the next run is read',
    `${HEADER}\n0,1,2\ntime s,ra error arcsec,z\n0,7,8\n1,7,8\n${HEADER}\n0,3,4\n`,
    {},
    {
      ra: [1, 3],
      refused: [
        [4, `the header above (line 3) ${UNREAD}`],
        [5, `the header above (line 3) ${UNREAD}`],
      ],
      warnings: [`The lines below the header in line 3 are not read: it ${UNREAD}.`],
    },
  ],
  [
    'another unit: its lines are refused',
    `${HEADER}\n0,1,2\ntime s,ra error px,dec error px\n0,7,8\n`,
    {},
    {
      ra: [1],
      refused: [[4, `the header above (line 3) ${PIXELS}`]],
      warnings: [`The lines below the header in line 3 are not read: it ${PIXELS}.`],
    },
  ],
  [
    'a delimiter at the end of every line but the headers',
    `${HEADER}\n0,1,2,\n1,1,2,\ndec error arcsec,ra error arcsec,time s\n4,3,0,\n`,
    {},
    { ra: [1, 1, 3], refused: [] },
  ],
  [
    'figures above the first known header are refused, not passed over',
    `a,b,c\n0,7,8\n${HEADER}\n0,1,2\n`,
    {},
    { ra: [1], headerLine: 3, refused: [[2, 'the line stands above the header']] },
  ],
  [
    'one known word: it is a line of text',
    `${HEADER}\n0,1,2\nstate,of,sky\n1,3,4\n`,
    {},
    { ra: [1, 3], refused: [[3, 'time is not a number: "state"']] },
  ],
];

describe('a header further down in the file', () => {
  it.each(CASES)('is followed: %s', (_name, file, map, expected) => {
    expect(seen(readGuideLog(utf8(file), { map }))).toMatchObject(expected);
  });
});
