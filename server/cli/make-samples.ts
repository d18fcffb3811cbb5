import { mkdirSync, rmSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { faultySamples } from './sample-logs/faulty-samples';
import { goodSamples } from './sample-logs/good-samples';
import type { ExpectedSamples } from './sample-logs/sample';
import { samplesReadme } from './sample-logs/samples-readme';

// Makes the folder `samples` anew: logs, their rigs and column maps, what must come out of them, and the README.

const folder = resolve('samples');

function write(file: string, content: string | Uint8Array): void {
  writeFileSync(join(folder, file), content);
}

/** Writes a setting beside its log and returns its name; null when there is none. */
function writeBeside(place: string, file: string, kind: 'rig' | 'map', setting: unknown) {
  if (setting === undefined) return null;
  const name = `${file.replace(/\..*$/, '')}.${kind}.json`;
  write(`${place}/${name}`, `${JSON.stringify(setting, null, 2)}\n`);
  return name;
}

for (const place of ['ok', 'not-ok']) {
  rmSync(join(folder, place), { recursive: true, force: true });
  mkdirSync(join(folder, place), { recursive: true });
}

const expected: ExpectedSamples = {
  ok: goodSamples().map(({ file, shows, content, rig, map, claims }) => {
    write(`ok/${file}`, content);
    const beside = {
      map: writeBeside('ok', file, 'map', map),
      rig: writeBeside('ok', file, 'rig', rig),
    };
    return { file, shows, ...beside, claims };
  }),
  notOk: faultySamples().map(({ file, shows, content, map, complaint }) => {
    write(`not-ok/${file}`, content);
    return { file, shows, map: writeBeside('not-ok', file, 'map', map), rig: null, complaint };
  }),
};
write('expected.json', `${JSON.stringify(expected, null, 2)}\n`);
write('README.md', samplesReadme(expected));
