import { PLAIN_DIALECT, simulateNight, toCsv } from '@stillpier/analysis';
import type { ColumnMap } from '@stillpier/guide-log';
import { countClaims, rmsClaims, setAsideClaims, textClaim } from './night-claims';
import { ORCHARD_PIER } from './orchard-pier';
import { rewriteTable } from './rewrite-table';
import type { GoodSample } from './sample';
import { TURNED } from './sample-scenarios';

const CAMERA_ANGLE_DEGREES = 128;
/** What the guider writes where it has no star. */
const NO_STAR = '-99.99';

/** A log along the axes of a turned camera, with date and time of day apart: its map tells how to read it. */
export function turnedCamera(): GoodSample {
  const night = simulateNight(TURNED, 110);
  const csv = toCsv(night.frames, {
    ...PLAIN_DIALECT,
    time: 'timestamp',
    decimals: 5,
    targets: false,
    sky: false,
  });
  const map: ColumnMap = {
    columns: {
      Day: { role: 'date' },
      Clock: { role: 'time', unit: 'clock' },
      Across: { role: 'xError', unit: 'arcsec', sentinels: [NO_STAR] },
      Down: { role: 'yError', unit: 'arcsec', sentinels: [NO_STAR] },
      Phase: { role: 'state' },
    },
    dateOrder: 'day-month-year',
    cameraAngleDegrees: CAMERA_ANGLE_DEGREES,
  };
  return {
    file: 'turned-camera.csv',
    shows:
      'Two hours with a guide camera that is turned by 128°: the errors run along its axes, and the column map beside the log says how they become RA and Dec. Date (the day first) and time of day stand apart; -99.99 stands where there was no star.',
    night,
    content: rewriteTable(csv, ',', ['Day', 'Clock', 'Across', 'Down', 'Phase'], (cells) => {
      const [time = '', ra = '', dec = '', , , state = ''] = cells;
      return [...dayAndClock(time), ...acrossAndDown(ra, dec), state];
    }),
    rig: ORCHARD_PIER,
    map,
    claims: [
      textClaim('runs[0].start', 'start', '2026-03-26T01:12:00Z'),
      ...countClaims(night, 0),
      ...setAsideClaims(night, 0),
      ...rmsClaims(night, 0),
    ],
  };
}

/** Day and time of day by a clock four hours behind UTC. */
function dayAndClock(instant: string): [string, string] {
  const local = new Date(Date.parse(instant) - 4 * 3_600_000).toISOString();
  const [year, month, day] = local.slice(0, 10).split('-');
  return [`${day}.${month}.${year}`, local.slice(11, 21)];
}

/** A displacement along RA and Dec as it shows along x and y of the camera: the turning of the reader undone. */
function acrossAndDown(raCell: string, decCell: string): [string, string] {
  if (raCell === '' || decCell === '') return [NO_STAR, NO_STAR];
  const [ra, dec] = [Number(raCell), Number(decCell)];
  const angle = (CAMERA_ANGLE_DEGREES * Math.PI) / 180;
  const x = ra * Math.cos(angle) - dec * Math.sin(angle);
  const y = ra * Math.sin(angle) + dec * Math.cos(angle);
  return [x.toFixed(4), y.toFixed(4)];
}
