import type { NightSummary } from '@stillpier/contract';
import { nightsCsv } from './nights-csv';

const NIGHT: NightSummary = {
  date: '2026-11-28',
  startsAt: '2026-11-28T17:42:15Z',
  endsAt: '2026-11-29T04:36:00Z',
  targets: ['M 33'],
  runCount: 1,
  guidedHours: 9.5,
  frames: 14961,
  used: 13600,
  raRmsArcsec: 0.654321,
  decRmsArcsec: 0.43,
  totalRmsArcsec: 0.78,
  aspect: null,
  positionAngleDegrees: null,
  keptShare: 0.76,
  mainLimit: { code: 'periodic-error', severity: 'act' },
};

describe('nightsCsv', () => {
  it('keeps full precision and leaves what is missing empty', () => {
    const [, line] = nightsCsv([NIGHT]).split('\r\n');
    expect(line).toBe(
      '2026-11-28,M 33,1,9.5,14961,13600,0.654321,0.43,0.78,,,0.76,periodic-error,act',
    );
  });

  it('quotes names, and gives a spreadsheet no formula to run', () => {
    const csv = nightsCsv([
      { ...NIGHT, targets: ['Veil, "east"'] },
      { ...NIGHT, targets: ['=1+1'] },
    ]);
    expect(csv).toContain('"Veil, ""east"""');
    expect(csv).toContain(",'=1+1,");
  });
});
