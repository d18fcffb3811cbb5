import { describe, expect, it } from 'vitest';
import {
  type Expected,
  HEADER,
  latin,
  seen,
  utf16,
  utf8,
} from '../../../test/support/small-guide-log';
import { type ColumnMap } from './column-map';
import { readGuideLog } from './log-reader';

// Every expected number is written in the small file itself.
const CASES: [name: string, file: string | Uint8Array, map: ColumnMap, expected: Expected][] = [
  // Delimiters, decimal signs and line ends
  [
    'commas',
    `${HEADER}\n0,1,2\n2,3,4\n`,
    {},
    { time: [0, 2], ra: [1, 3], dec: [2, 4], delimiter: ',' },
  ],
  [
    'commas with a blank after each',
    `time s, ra error arcsec, dec error arcsec\n0, 1.5, -2\n`,
    {},
    { ra: [1.5], dec: [-2] },
  ],
  [
    'semicolons and decimal commas',
    'time s;ra error arcsec;dec error arcsec\n0,5;1,25;-2\n1,0;0,5;+3\n',
    {},
    { time: [0, 0.5], ra: [1.25, 0.5], dec: [-2, 3], delimiter: ';', decimal: ',' },
  ],
  [
    'semicolons and decimal points',
    'time s;ra error arcsec;dec error arcsec\n0.5;1.25;-2\n',
    {},
    { ra: [1.25], decimal: '.' },
  ],
  [
    'tabs',
    'time s\tra error arcsec\tdec error arcsec\n0\t1\t2\n',
    {},
    { ra: [1], delimiter: '\t' },
  ],
  [
    'tabs and decimal commas',
    'time s\tra error arcsec\tdec error arcsec\n0\t1,5\t2,25\n',
    {},
    { ra: [1.5], dec: [2.25], decimal: ',' },
  ],
  ['pipes', 'time s|ra error arcsec|dec error arcsec\n0|1|2\n', {}, { ra: [1], delimiter: '|' }],
  [
    'runs of blanks',
    'time_s   ra_error_arcsec  dec_error_arcsec\n  0   1.5    2\n 10  -1.5   -2\n',
    {},
    { time: [0, 10], ra: [1.5, -1.5], dec: [2, -2], delimiter: ' ' },
  ],
  [
    'blanks and tabs mixed',
    'time_s \t ra_error_arcsec\tdec_error_arcsec\n0\t 1 2\n',
    { delimiter: ' ' },
    { ra: [1], dec: [2] },
  ],
  ['CRLF', `${HEADER}\r\n0,1,2\r\n2,3,4\r\n`, {}, { ra: [1, 3], refused: [] }],
  ['CR alone', `${HEADER}\r0,1,2\r2,3,4\r`, {}, { ra: [1, 3], refused: [] }],
  ['no line end at the end', `${HEADER}\n0,1,2\n2,3,4`, {}, { ra: [1, 3] }],
  [
    'a delimiter at the end of every line',
    `${HEADER},\n0,1,2,\n2,3,4,\n`,
    {},
    { ra: [1, 3], refused: [] },
  ],
  [
    'a delimiter at the end of every line but the header',
    `${HEADER}\n0,1,2,\n2,3,4,\n`,
    {},
    { ra: [1, 3], refused: [] },
  ],
  [
    'a delimiter at the end of the header alone',
    `${HEADER},\n0,1,2\n2,3,4\n`,
    {},
    { ra: [1, 3], refused: [] },
  ],
  [
    'the delimiter that the map names',
    'time s;ra error arcsec;dec error arcsec\n0;1;2\n',
    { delimiter: ';' },
    { ra: [1] },
  ],
  // Encodings
  [
    'UTF-8 with a byte order mark',
    utf8(`\uFEFF${HEADER}\n0,1,2\n`),
    {},
    { ra: [1], encoding: 'utf-8' },
  ],
  [
    'UTF-16, little end first',
    utf16(`\uFEFF${HEADER}\n0,1,2\n`, true),
    {},
    { ra: [1], encoding: 'utf-16le' },
  ],
  [
    'UTF-16, big end first',
    utf16(`\uFEFF${HEADER}\n0,1,2\n`, false),
    {},
    { ra: [1], encoding: 'utf-16be' },
  ],
  [
    'Windows-1252',
    latin(`# Höhe\n${HEADER}\n0,1,2\n`),
    {},
    {
      ra: [1],
      encoding: 'windows-1252',
      warnings: ['The file is not UTF-8: it was read as Windows-1252.'],
    },
  ],
  [
    'two files with byte order marks joined',
    utf8(`\uFEFF${HEADER}\n0,1,2\n\uFEFF${HEADER}\n5,3,4\n`),
    {},
    { time: [0, 5], ra: [1, 3], refused: [] },
  ],
  // Quotes
  [
    'every cell in quotes',
    '"time s","ra error arcsec","dec error arcsec"\n"0","1","2"\n"2","3","4"\n',
    {},
    { ra: [1, 3] },
  ],
  [
    'a delimiter and a doubled quote inside a quoted cell',
    `${HEADER},target\n0,1,2,"Field ""A"", north"\n`,
    {},
    { ra: [1] },
  ],
  [
    'a quoted cell over two lines',
    `${HEADER},target\n0,1,2,"Field\nA"\n2,3,4,B\n`,
    {},
    { ra: [1, 3], refused: [] },
  ],
  [
    'a quote that never closes',
    `${HEADER},target\n0,1,2,"Field\n2,3,4,B\n4,5,6,B\n`,
    {},
    { ra: [3, 5], refused: [[2, 'a quote opens and is not closed']] },
  ],
];

describe('delimiters, line ends, encodings and quotes', () => {
  it.each(CASES)('are read: %s', (_name, file, map, expected) => {
    const log = readGuideLog(typeof file === 'string' ? utf8(file) : file, { map });
    expect(seen(log)).toMatchObject(expected);
  });
});
