import { describe, expect, it } from 'vitest';
import { PLAIN_DIALECT, toCsv } from './night-csv';
import { PLAIN_NIGHT } from './night-scenario';
import { simulateNight } from './simulate-night';

const { frames } = simulateNight({ ...PLAIN_NIGHT, clouds: [{ fromSeconds: 2, toSeconds: 4 }] }, 1);
const lines = (text: string) => text.trimEnd().split('\n');

describe('a night written down', () => {
  it('has the headers that are read without a map, and a line a frame', () => {
    const [header, ...rows] = lines(toCsv(frames, PLAIN_DIALECT));
    expect(header).toBe(
      'time s,ra error arcsec,dec error arcsec,ra correction ms,dec correction ms,state,target,declination,hour angle h,pier side',
    );
    expect(rows).toHaveLength(frames.count);
    expect(rows[0]!.split(',')[1]).toBe(frames.raError[0]!.toFixed(3));
  });

  it('leaves the errors of a lost star blank', () => {
    expect(lines(toCsv(frames, PLAIN_DIALECT))[2]).toMatch(/^2\.00,,,0,0,star lost,/);
  });

  it('writes timestamps, decimal commas and guide pixels on demand', () => {
    const dialect = { ...PLAIN_DIALECT, delimiter: ';', decimal: ',', time: 'timestamp' } as const;
    const [header, row] = lines(toCsv(frames, { ...dialect, guidePixelArcsec: 4, sky: false }));
    expect(header).toMatch(/^timestamp;ra error px;dec error px;/);
    const cells = row!.split(';');
    expect(cells[0]).toBe(new Date(PLAIN_NIGHT.startEpochSeconds * 1000).toISOString());
    expect(cells[1]).toBe((frames.raError[0]! / 4).toFixed(3).replace('.', ','));
  });
});
