import { gzipSync } from 'node:zlib';
import { PLAIN_DIALECT, simulateNight, toCsv } from '@stillpier/analysis';
import { rewriteTable } from './rewrite-table';
import type { FaultySample } from './sample';
import { CALM } from './sample-scenarios';

const KNOWN = ['time s', 'ra error arcsec', 'dec error arcsec', 'ra correction ms'];
/** Signature and first chunk of a PNG picture (PNG specification, W3C 2003), one pixel large. */
const PNG =
  'iVBORw0KGgoAAAANSUhEUgAAAAEAAAABCAQAAAC1HAwCAAAAC0lEQVR42mNk+A8AAQUBAScY42YAAAAASUVORK5CYII=';

/** All faulty samples: none of them can be used, and each ends with one sentence. */
export function faultySamples(): FaultySample[] {
  const night = simulateNight({ ...CALM, runs: CALM.runs.map(shortened) }, 201);
  const good = toCsv(night.frames, { ...PLAIN_DIALECT, state: false, targets: false, sky: false });
  const withHeader = (header: string[], cells = (row: readonly string[]) => row) =>
    rewriteTable(good, ',', header, (row) => cells(row).slice(0, header.length));
  return [
    {
      file: 'empty.csv',
      shows: 'A file of no bytes.',
      content: '',
      complaint: 'The file is empty.',
    },
    {
      file: 'header-only.csv',
      shows: 'The header of a log that was never begun.',
      content: `${KNOWN.join(',')}\n`,
      complaint: 'The file has a header, but no line with figures.',
    },
    {
      file: 'picture.csv',
      shows: 'A picture whose name ends in .csv.',
      content: Buffer.from(PNG, 'base64'),
      complaint: 'The file is not text: it holds binary data.',
    },
    {
      file: 'one-column.csv',
      shows: 'Errors of one axis and nothing beside them.',
      content: rewriteTable(good, ',', ['ra error arcsec'], ([, error = '']) => [error]),
      complaint:
        'The file has only one column: a guide log needs a time, a RA error and a Dec error in each line.',
    },
    {
      file: 'unknown-headers.csv',
      shows: 'Headers that are not recognised, and no column map.',
      content: withHeader(['Clock', 'Off east', 'Off north']),
      complaint:
        'The header (line 1) has no column that is known as the time, the RA error and the Dec error: a column map must say which it is.',
    },
    {
      file: 'no-dec-error.csv',
      shows: 'A log of one axis: the Dec error is missing.',
      content: withHeader(['time s', 'ra error arcsec']),
      complaint:
        'The header (line 1) has no column that is known as the Dec error: a column map must say which it is.',
    },
    {
      file: 'two-units.csv',
      shows: 'The RA error in guide pixels, the Dec error in arcseconds.',
      content: withHeader(['time s', 'ra error px', 'dec error arcsec']),
      complaint: 'RA error and Dec error have different units: both must be in the same one.',
    },
    {
      file: 'every-line-refused.csv',
      shows: 'Words where the RA error must be, in every line.',
      content: withHeader(KNOWN, ([time = '', , ...rest]) => [time, 'low', ...rest]),
      complaint:
        'Every one of the 300 lines with figures was refused; line 2: RA error is not a number: "low".',
    },
    {
      file: 'wrong-map.csv',
      shows: 'A good log with a column map that was made for another kind of file.',
      content: withHeader(KNOWN),
      map: { columns: { 'Off east': { role: 'raError', unit: 'arcsec' } } },
      complaint:
        'The map names a column "Off east", which is not in the file; its columns are "time s", "ra error arcsec", "dec error arcsec", "ra correction ms".',
    },
    {
      file: 'cut-off.csv.gz',
      shows: 'A compressed log of which the second half is missing.',
      content: gzipSync(good).subarray(0, 2000),
      complaint: 'The compressed file "cut-off.csv.gz" is cut off.',
    },
  ];
}

function shortened<Run extends { durationSeconds: number }>(run: Run): Run {
  return { ...run, durationSeconds: 600 };
}
