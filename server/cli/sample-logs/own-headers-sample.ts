import { PLAIN_DIALECT, simulateNight, toCsv } from '@stillpier/analysis';
import type { ColumnMap } from '@stillpier/guide-log';
import { countClaims, rmsClaims, setAsideClaims, textClaim } from './night-claims';
import { ORCHARD_PIER } from './orchard-pier';
import { rewriteTable } from './rewrite-table';
import type { GoodSample } from './sample';
import { LATE } from './sample-scenarios';

/** A log in a dialect of its own: its map tells what the columns are. */
export function ownHeaders(): GoodSample {
  const night = simulateNight(LATE, 104);
  const csv = toCsv(night.frames, {
    ...PLAIN_DIALECT,
    delimiter: '\t',
    time: 'timestamp',
    targets: false,
    sky: false,
  });
  const header = [
    'Clock',
    'Off east',
    'Off north',
    'Pulse 1',
    'Way 1',
    'Pulse 2',
    'Way 2',
    'Phase',
  ];
  const letters = new Map([
    ['guiding', 'G'],
    ['dither', 'D'],
    ['settling', 'S'],
    ['star lost', 'L'],
  ]);
  const map: ColumnMap = {
    delimiter: '\t',
    columns: {
      Clock: { role: 'time', unit: 'clock' },
      'Off east': { role: 'raError', unit: 'arcsec' },
      'Off north': { role: 'decError', unit: 'arcsec' },
      'Pulse 1': { role: 'raCorrection', unit: 'ms' },
      'Way 1': { role: 'raDirection' },
      'Pulse 2': { role: 'decCorrection', unit: 'ms' },
      'Way 2': { role: 'decDirection' },
      Phase: { role: 'state' },
    },
    states: { G: 'guiding', D: 'dither', S: 'settling', L: 'star lost' },
    correctionSign: 'same',
    targetDeclinationDegrees: 20,
    targetHourAngleHours: -1.5,
    startTime: '2026-03-20T22:55:00-04:00',
  };
  return {
    file: 'own-headers.tsv',
    shows:
      'Two hours around midnight under headers that are not recognised, with clock times, letters for directions and states: only the column map beside it tells what they are. Tabs.',
    night,
    content: rewriteTable(csv, '\t', header, ([time = '', ra = '', dec = '', ...rest]) => {
      const [raPulse = '', decPulse = '', state = ''] = rest;
      const pulses = [...unsigned(raPulse, 'E', 'W'), ...unsigned(decPulse, 'N', 'S')];
      return [localClock(time), ra, dec, ...pulses, letters.get(state) ?? ''];
    }),
    rig: ORCHARD_PIER,
    map,
    claims: [
      textClaim('runs[0].start', 'start', '2026-03-21T02:55:00Z'),
      ...countClaims(night, 0),
      ...setAsideClaims(night, 0),
      ...rmsClaims(night, 0),
    ],
  };
}

/** Time of day at four hours west of Greenwich, as a clock on the wall shows it. */
function localClock(instant: string): string {
  return new Date(Date.parse(instant) - 4 * 3_600_000).toISOString().slice(11, 21);
}

/** A signed pulse as its size and the letter of its direction. */
function unsigned(pulse: string, positive: string, negative: string): [string, string] {
  const value = Number(pulse);
  if (value === 0) return ['0', ''];
  return [String(Math.abs(value)), value > 0 ? positive : negative];
}
