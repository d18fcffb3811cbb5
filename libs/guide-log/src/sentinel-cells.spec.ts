import { describe, expect, it } from 'vitest';
import { type Expected, HEADER, seen, utf8 } from '../../../test/support/small-guide-log';
import { type ColumnMap } from './column-map';
import { readGuideLog } from './log-reader';

const errors = (sentinels: string[]): ColumnMap => ({
  columns: {
    'ra error arcsec': { role: 'raError', unit: 'arcsec', sentinels },
    'dec error arcsec': { role: 'decError', unit: 'arcsec', sentinels },
  },
});

// Every expected number is written in the small file itself.
const CASES: [name: string, file: string, map: ColumnMap, expected: Expected][] = [
  [
    'nothing without a map: a strange number is a number, a strange text is refused',
    `${HEADER}\n0,-999,1\n1,n/a,1\n`,
    {},
    { ra: [-999], refused: [[3, 'RA error is not a number: "n/a"']] },
  ],
  [
    'a number in any way of writing it',
    `${HEADER}\n0,-999,1\n1,-999.00,1\n2,-9.99e2,1\n3,-99,1\n`,
    errors(['-999']),
    { ra: [NaN, NaN, NaN, -99], refused: [] },
  ],
  [
    'a text in any case',
    `${HEADER}\n0, N/A ,1\n1,--,1\n2,x,1\n`,
    errors(['n/a', '--']),
    { ra: [NaN, NaN], refused: [[4, 'RA error is not a number: "x"']] },
  ],
  [
    'in its own column alone',
    `${HEADER},snr\n0,-1,1,-1\n`,
    { columns: { snr: { role: 'snr', sentinels: ['-1'] } } },
    { ra: [-1] },
  ],
  [
    'a number with a decimal comma, in the map with either sign',
    'time s;ra error arcsec;dec error arcsec\n0;99,9;1,5\n1;77,7;1,5\n2;0,5;1,5\n',
    errors(['99.9', '77,7']),
    { ra: [NaN, NaN, 0.5] },
  ],
];

describe('cells that mean "no value"', () => {
  it.each(CASES)('are those that the map names: %s', (_name, file, map, expected) => {
    expect(seen(readGuideLog(utf8(file), { map }))).toMatchObject(expected);
  });

  it('leave the brightness of a lost star empty', () => {
    const map: ColumnMap = { columns: { '4': { role: 'brightness', sentinels: ['0'] } } };
    const { frames } = readGuideLog(utf8(`${HEADER},b\n0,0,1,0\n1,1,1,7\n`), { map });
    expect(frames.brightness).toEqual(Float64Array.of(NaN, 7));
    expect(frames.raError).toEqual(Float64Array.of(0, 1));
  });
});
