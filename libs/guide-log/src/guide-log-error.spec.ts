import { describe, expect, it } from 'vitest';
import { HEADER, utf16, utf8 } from '../../../test/support/small-guide-log';
import { type ColumnMap } from './column-map';
import { readGuideLog } from './log-reader';

const FAULTS: [
  name: string,
  file: string | Uint8Array,
  map: ColumnMap,
  fault: string,
  message: string,
][] = [
  ['an empty file', '', {}, 'empty', 'The file is empty.'],
  ['blank lines alone', '\n \n\n', {}, 'empty', 'The file has nothing but blank lines.'],
  [
    'a header alone',
    `${HEADER}\n`,
    {},
    'no-figures',
    'The file has a header, but no line with figures.',
  ],
  [
    'the first bytes of a picture',
    Uint8Array.from([0x89, 80, 78, 71, 13, 10, 26, 10, 0, 0, 0, 13, 73, 72, 68, 82, 0, 0, 2, 0]),
    {},
    'binary',
    'The file is not text: it holds binary data.',
  ],
  [
    'UTF-16 without its mark',
    utf16(`${HEADER}\n0,1,2\n`, true),
    {},
    'binary',
    'The file is not text: it holds binary data.',
  ],
  [
    'one column',
    'ra error arcsec\n1\n2\n3\n',
    {},
    'one-column',
    'The file has only one column: a guide log needs a time, a RA error and a Dec error in each line.',
  ],
  [
    'unknown names and no map',
    'a,b,c\n0,1,2\n',
    {},
    'columns-unknown',
    'The header (line 1) has no column that is known as the time, the RA error and the Dec error: a column map must say which it is.',
  ],
  [
    'no header and no map',
    '0,1,2\n1,2,3\n',
    {},
    'columns-unknown',
    'The file has no column that is known as the time, the RA error and the Dec error: a column map must say which it is.',
  ],
  [
    'a missing Dec error',
    'time s,ra error arcsec,x\n0,1,2\n',
    {},
    'columns-unknown',
    'The header (line 1) has no column that is known as the Dec error: a column map must say which it is.',
  ],
  [
    'a map with a column that is not there',
    `${HEADER}\n0,1,2\n`,
    { columns: { flux: { role: 'brightness' } } },
    'map-column-missing',
    'The map names a column "flux", which is not in the file; its columns are "time s", "ra error arcsec", "dec error arcsec".',
  ],
  [
    'a map with a number beyond the columns',
    `${HEADER}\n0,1,2\n`,
    { columns: { '4': { role: 'snr' } } },
    'map-column-missing',
    'The map names a column "4", which is not in the file; its columns are "time s", "ra error arcsec", "dec error arcsec".',
  ],
  [
    'a map with a name that two columns have',
    'x,x,y\n0,1,2\n',
    { columns: { x: { role: 'snr' } } },
    'map-column-unclear',
    'Two columns are called "x": the map must name them by their number.',
  ],
  [
    'a role without its unit',
    `${HEADER}\n0,1,2\n`,
    { columns: { '2': { role: 'raError' } } },
    'map-unit',
    'The column "2" of the map needs one of the units "arcsec", "guide px" for the role raError.',
  ],
  [
    'a unit that the role cannot have',
    `${HEADER}\n0,1,2\n`,
    { columns: { '2': { role: 'raError', unit: 'ms' } } },
    'map-unit',
    'The column "2" of the map needs one of the units "arcsec", "guide px" for the role raError, not "ms".',
  ],
  [
    'one role for two columns',
    `${HEADER}\n0,1,2\n`,
    { columns: { '2': { role: 'snr' }, '3': { role: 'snr' } } },
    'role-twice',
    'The map gives two columns the role snr: one of them must be ignored.',
  ],
  [
    'errors in two units',
    'time s,ra error px,dec error arcsec\n0,1,2\n',
    {},
    'units-differ',
    'RA error and Dec error have different units: both must be in the same one.',
  ],
  [
    'a header line beyond the end',
    `${HEADER}\n0,1,2\n`,
    { headerLine: 9 },
    'header-line-missing',
    'The map says that the header is line 9, but no row begins there.',
  ],
  [
    'no line that can be read',
    `${HEADER}\n0,a,2\n1,b,2\n`,
    {},
    'every-line-refused',
    'Every one of the 2 lines with figures was refused; line 2: RA error is not a number: "a".',
  ],
  [
    'a line without end',
    `${HEADER}\n0,1,2\n${'9'.repeat(1_100_000)}`,
    {},
    'line-too-long',
    'The file has a line of more than a million characters: it is no guide log.',
  ],
];

describe('a file that cannot be read', () => {
  it.each(FAULTS)('says what is wrong with %s', (_name, file, map, fault, message) => {
    const read = () => readGuideLog(typeof file === 'string' ? utf8(file) : file, { map });
    expect(read).toThrow(expect.objectContaining({ fault, message }));
  });
});
