import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isMissingCell, readNumber } from './number-cell';

const POINT = '.'.charCodeAt(0);
const COMMA = ','.charCodeAt(0);

describe('a cell with a number', () => {
  it('is the nearest double, as ECMAScript reads it', () => {
    const decimal = fc.tuple(fc.integer(), fc.nat({ max: 22 })).map(([integer, places]) => {
      const digits = String(Math.abs(integer)).padStart(places + 1, '0');
      const cut = digits.length - places;
      const sign = integer < 0 ? '-' : '';
      return places === 0
        ? `${sign}${digits}`
        : `${sign}${digits.slice(0, cut)}.${digits.slice(cut)}`;
    });
    fc.assert(
      fc.property(
        fc.oneof(decimal, fc.double({ noNaN: true, noDefaultInfinity: true }).map(String)),
        (text) => {
          expect(readNumber(text, POINT)).toBe(Number(text));
        },
      ),
      { numRuns: 5000, seed: 7 },
    );
  });

  it.each([
    [' 1.5 ', 1.5],
    ['\u00a01.5\t', 1.5],
    ['+.5', 0.5],
    ['-5.', -5],
    ['−0.25', -0.25], // the minus sign of typography
    ['1e3', 1000],
    ['123456789.0123456789', 123456789.01234567],
  ])('reads %j', (cell, expected) => {
    expect(readNumber(cell, POINT)).toBe(expected);
  });

  it('reads a decimal comma where the file has one, and no point beside it', () => {
    expect(readNumber('-1,25', COMMA)).toBe(-1.25);
    expect(readNumber('1,5e-1', COMMA)).toBe(0.15);
    expect(readNumber('1.25', COMMA)).toBeNaN();
    expect(readNumber('1,25', POINT)).toBeNaN();
  });

  it.each([
    '',
    ' ',
    'x',
    '1 2',
    '0x10',
    '1_0',
    'Infinity',
    '1e999',
    '--1',
    '+-1',
    '1.2.3',
    '.',
    '-',
    '1e',
    '5px',
  ])('finds no number in %j', (cell) => {
    expect(readNumber(cell, POINT)).toBeNaN();
  });

  it('tells a missing number from text', () => {
    expect(['', '  ', 'nan', 'NaN', '-nan'].map(isMissingCell)).toEqual(Array(5).fill(true));
    expect(['--', 'x', '1', 'n/a', 'null'].map(isMissingCell)).toEqual(Array(5).fill(false));
  });
});
