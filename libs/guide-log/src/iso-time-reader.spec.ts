import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isoTimeReader } from './iso-time-reader';
import { readDateTime } from './time-cell';

describe('a reader of ISO times', () => {
  it('agrees with Date.parse on instants, in any order', () => {
    const instant = fc.integer({ min: Date.UTC(1990, 0), max: Date.UTC(2090, 0) });
    fc.assert(
      fc.property(fc.array(instant, { minLength: 1, maxLength: 20 }), (instants) => {
        const read = isoTimeReader(null);
        for (const milliseconds of instants.flatMap((start) => [
          start,
          start + 2000,
          start + 4001,
        ])) {
          const text = new Date(milliseconds).toISOString();
          // A double of today's epoch seconds resolves 2.4e-7 s.
          expect(read(text) * 1000).toBeCloseTo(Date.parse(text), 2);
        }
      }),
      { numRuns: 300, seed: 3 },
    );
  });

  it('says the same as the careful reading, whatever stands in the cells', () => {
    const cell = fc
      .tuple(
        fc.constantFrom('2026-03-14', '2026-03-15', '2026-02-31', '26-3-14'),
        fc.constantFrom('T', ' ', ''),
        fc.constantFrom(
          '21:40:00',
          '21:40:59.5',
          '21:40',
          '23:59:60',
          '24:00:00',
          '2:4:0',
          '21:40:00,25',
          'x',
        ),
        fc.constantFrom('', 'Z', '-04:00', '+0530', '+01', ' ', '+99:00'),
      )
      .map((parts) => parts.join(''));
    fc.assert(
      fc.property(fc.array(cell, { maxLength: 12 }), (cells) => {
        const read = isoTimeReader(null);
        const careful = cells.map((text) => readDateTime(text, null)?.epochSeconds ?? NaN);
        expect(cells.map(read)).toEqual(careful);
      }),
      { numRuns: 2000, seed: 4 },
    );
  });

  it.each([
    ['2026-03-14T21:40:00-04:00', Date.UTC(2026, 2, 15, 1, 40) / 1000, true],
    ['2026/03/14 21:40:00.5+0530', Date.UTC(2026, 2, 14, 16, 10) / 1000 + 0.5, true],
    ['2026-03-14T21:40', Date.UTC(2026, 2, 14, 21, 40) / 1000, false],
    ['2028-02-29T00:00:00Z', Date.UTC(2028, 1, 29) / 1000, true],
  ])('reads %s', (cell, epochSeconds, hasZone) => {
    expect(readDateTime(cell, null)).toEqual({ epochSeconds, hasZone });
  });

  it.each([
    '2026-02-29T00:00:00Z',
    '2026-13-01T00:00:00Z',
    '2026-00-01T00:00:00Z',
    '14.03.2026 21:40:00',
    '2026-03-14',
  ])('takes %s for no time', (cell) => {
    expect(readDateTime(cell, null)).toBeNull();
  });
});
