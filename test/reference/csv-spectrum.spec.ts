import { readdirSync, readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';
import { previewGuideLog } from '@stillpier/guide-log';
import { describe, expect, it } from 'vitest';

const folder = dirname(createRequire(import.meta.url).resolve('csv-spectrum/package.json'));
const names = readdirSync(join(folder, 'csvs')).map((file) => file.replace(/\.csv$/, ''));

/** The table as the reader splits it: an object a row, keyed by the header. */
function table(name: string): Record<string, string>[] {
  const bytes = readFileSync(join(folder, 'csvs', `${name}.csv`));
  const { columns, rows } = previewGuideLog(bytes, { headerLine: 1 });
  return rows.map(({ cells }) =>
    Object.fromEntries(columns.map(({ header }, at) => [header ?? '', cells[at] ?? ''])),
  );
}

/** One JSON is not of its CSV: another telephone number, and the row alone instead of a list of one. */
function corrected(name: string, row: unknown): unknown {
  const isOff = name === 'location_coordinates';
  return isOff ? { ...(row as object), 'Contact Phone Number': '2095257564' } : row;
}

// Expected tables: csv-spectrum 2.0.0, "A variety of CSV files to serve as an acid test for CSV parsing libraries"
// (M. Ogden, npm), its json folder. A line end inside quotes is LF to the reader, whatever the file has there.
describe('the files of csv-spectrum', () => {
  it('are all there', () => {
    expect(names).toHaveLength(12);
  });

  it.each(names)('%s is split as its JSON says', (name) => {
    const json = readFileSync(join(folder, 'json', `${name}.json`), 'utf8');
    const expected: unknown = JSON.parse(json.replaceAll('\\r\\n', '\\n'));
    expect(table(name)).toEqual([expected].flat().map((row) => corrected(name, row)));
  });
});
