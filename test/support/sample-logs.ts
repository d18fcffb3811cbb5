import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { gunzipSync } from 'node:zlib';
import { columnMapSchema } from '@stillpier/contract';
import { type ColumnMap } from '@stillpier/guide-log';

export interface SampleLog {
  readonly file: string;
  /** Unpacked. */
  readonly bytes: Uint8Array;
  readonly map: ColumnMap;
}

const FOLDER = 'samples/ok';

/** The good sample logs with the column maps that lie beside them. */
export function sampleLogs(): SampleLog[] {
  return readdirSync(FOLDER)
    .filter((file) => !file.endsWith('.json'))
    .map((file) => {
      const raw = readFileSync(`${FOLDER}/${file}`);
      const mapPath = `${FOLDER}/${file.replace(/\..*$/, '')}.map.json`;
      const map: unknown = existsSync(mapPath) ? JSON.parse(readFileSync(mapPath, 'utf8')) : {};
      const bytes = file.endsWith('.gz') ? gunzipSync(raw) : raw;
      return { file, bytes: new Uint8Array(bytes), map: columnMapSchema.parse(map) };
    });
}
