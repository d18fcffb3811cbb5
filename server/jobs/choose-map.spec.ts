import { expect, it } from 'vitest';
import { EXAMPLE_MAP, guideCsv } from '../../test/support/example-rig';
import { chooseMap } from './choose-map';

const bytes = (text: string) => new TextEncoder().encode(text);
const OWN_HEADERS = bytes('when,east,north\n2026-03-15T01:40:00Z,0.1,0.2\n');
const asked = { decimal: ',' } as const;
const other = { ...EXAMPLE_MAP, map: { decimal: '.' } as const };

it('takes what was asked for before all else', () => {
  expect(chooseMap(bytes(guideCsv(3)), asked, [EXAMPLE_MAP])).toBe(asked);
  expect(chooseMap(OWN_HEADERS, asked, [EXAMPLE_MAP])).toBe(asked);
});

it('needs no map for recognised headers', () => {
  expect(chooseMap(bytes(guideCsv(3)), null, [EXAMPLE_MAP])).toEqual({});
});

it('takes the first saved map that was made for the header line', () => {
  const elsewhere = { ...EXAMPLE_MAP, headerCells: ['when', 'north', 'east'] };
  expect(chooseMap(OWN_HEADERS, null, [elsewhere, EXAMPLE_MAP, other])).toBe(EXAMPLE_MAP.map);
});

it('takes a map that came as a file where all columns that it names are there', () => {
  const sent = { headerCells: null, map: EXAMPLE_MAP.map };
  expect(chooseMap(OWN_HEADERS, null, [sent, other])).toBe(EXAMPLE_MAP.map);
  expect(chooseMap(bytes('when,east\n1,2\n'), null, [sent])).toEqual({});
  const byNumber = {
    columns: {
      '1': { role: 'time', unit: 'iso' },
      '2': { role: 'raError', unit: 'arcsec' },
      '3': { role: 'decError', unit: 'arcsec' },
    },
  } as const;
  expect(chooseMap(OWN_HEADERS, null, [{ headerCells: null, map: byNumber }])).toEqual({});
});

it.each([
  ['other headers', bytes('a,b,c\n1,2,3\n')],
  ['binary data', new Uint8Array(400)],
])('leaves %s to the reader, which says what is missing', (_what, file) => {
  expect(chooseMap(file, null, [EXAMPLE_MAP])).toEqual({});
});
