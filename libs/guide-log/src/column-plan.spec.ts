import { describe, expect, it } from 'vitest';
import {
  type Expected,
  HEADER,
  seen,
  THREE_COLUMNS,
  utf8,
} from '../../../test/support/small-guide-log';
import { type ColumnMap } from './column-map';
import { readGuideLog } from './log-reader';

// Every expected number is written in the small file itself.
const CASES: [name: string, file: string | Uint8Array, map: ColumnMap, expected: Expected][] = [
  // Headers, comments, preambles
  [
    'header names in any case, with blanks, dashes or underscores',
    'TIME_S,Ra-Error-Arcsec,dec  error_ARCSEC\n0,1,2\n',
    {},
    { ra: [1], dec: [2] },
  ],
  [
    'errors in guide pixels',
    'time s,ra error px,dec error px\n0,0.1,0.2\n',
    {},
    { ra: [0.1], unit: 'guide px' },
  ],
  [
    'comments and a preamble above the header',
    `# night of the lantern\nCamera: north pier, gain 20\n\n${HEADER}\n0,1,2\n`,
    {},
    { ra: [1], headerLine: 4 },
  ],
  ['a header inside a comment', `# ${HEADER}\n0,1,2\n`, {}, { ra: [1], headerLine: 1 }],
  [
    'comments between frames',
    `${HEADER}\n0,1,2\n# a cloud\n2,3,4\n`,
    {},
    { ra: [1, 3], refused: [] },
  ],
  [
    'the comment sign that the map names',
    `${HEADER}\n0,1,2\n;; a, cloud\n2,3,4\n`,
    { comment: ';;' },
    { ra: [1, 3], refused: [] },
  ],
  ['blank lines', `${HEADER}\n\n0,1,2\n   \n2,3,4\n\n`, {}, { ra: [1, 3], refused: [] }],
  [
    'the header again further down',
    `${HEADER}\n0,1,2\n2,3,4\n${HEADER}\n0,5,6\n`,
    {},
    { ra: [1, 3, 5], time: [0, 2, 0], refused: [] },
  ],
  [
    'no header, columns by number',
    '0,1,2\n2,3,4\n',
    THREE_COLUMNS,
    { ra: [1, 3], headerLine: null },
  ],
  [
    'a map that says there is no header',
    'a,b,c\n0,1,2\n',
    { ...THREE_COLUMNS, headerLine: 0 },
    { ra: [1], refused: [[1, 'time is not a number: "a"']], headerLine: null },
  ],
  [
    'unknown header names that the map names',
    'clock,x,y\n0,1,2\n',
    {
      columns: {
        clock: { role: 'time', unit: 'seconds' },
        x: { role: 'raError', unit: 'arcsec' },
        Y: { role: 'decError', unit: 'arcsec' },
      },
    },
    { ra: [1], dec: [2], headerLine: 1 },
  ],
  [
    'a header line that the map names',
    'time s,ra error arcsec,dec error arcsec\nt,x,y\n0,1,2\n',
    { ...THREE_COLUMNS, headerLine: 2 },
    { ra: [1], headerLine: 2 },
  ],
  [
    'known columns beside mapped ones',
    `${HEADER},pulse\n0,1,2,30\n`,
    { columns: { pulse: { role: 'raCorrection', unit: 'ms' } } },
    { ra: [1], raCorrection: [30] },
  ],
  [
    'a known column that the map ignores',
    `${HEADER},ra correction ms\n0,1,2,30\n`,
    { columns: { 'ra correction ms': { role: 'ignore' } } },
    { raCorrection: null },
  ],
  [
    'both units of one error: arcseconds are read',
    'time s,ra error px,ra error arcsec,dec error px,dec error arcsec\n0,1,2,3,4\n',
    {},
    {
      ra: [2],
      dec: [4],
      unit: 'arcsec',
      warnings: [
        'Two columns have the RA error: "ra error arcsec" is read, "ra error px" is not.',
        'Two columns have the Dec error: "dec error arcsec" is read, "dec error px" is not.',
      ],
    },
  ],
];

describe('headers, comments and column maps', () => {
  it.each(CASES)('are read: %s', (_name, file, map, expected) => {
    const log = readGuideLog(typeof file === 'string' ? utf8(file) : file, { map });
    expect(seen(log)).toMatchObject(expected);
  });
});
