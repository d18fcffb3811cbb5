import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { fileURLToPath } from 'node:url';
import { gzipSync } from 'node:zlib';
import type { AnalysisDocument } from '@stillpier/analysis';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { runAnalyse } from './analyse';

const HEADER = 'time s,ra error arcsec,dec error arcsec';
const LOG =
  [HEADER, ...Array.from({ length: 60 }, (_, n) => `${n * 2},${n % 3},${n % 4}`)].join('\n') + '\n';

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'analyse-'));
});
afterAll(() => {
  rmSync(folder, { recursive: true });
});

function file(name: string, content: string | Uint8Array): string {
  const path = join(folder, name);
  writeFileSync(path, content);
  return path;
}

const nothing = () => Readable.from([]);
async function documentOf(args: string[], input = nothing()): Promise<AnalysisDocument> {
  const { exitCode, output, complaint } = await runAnalyse(args, input);
  expect({ exitCode, complaint }).toEqual({ exitCode: 0, complaint: null });
  return JSON.parse(output) as AnalysisDocument;
}
async function complaintOf(...args: string[]): Promise<string | null> {
  const { exitCode, output, complaint } = await runAnalyse(args, nothing());
  expect({ exitCode, output }).toEqual({ exitCode: 2, output: '' });
  return complaint;
}

describe('the command analyse', () => {
  it('prints the document of a log', async () => {
    const document = await documentOf([file('log.csv', LOG)]);
    expect(document.schema).toBe('stillpier-analysis/1');
    expect(document.reading).toMatchObject({ lines: 61, frames: 60, refusedCount: 0 });
    expect(document.runs).toHaveLength(1);
  });

  it('reads a compressed log, by its content and not by its name', async () => {
    const plain = await documentOf([file('log.csv', LOG)]);
    expect(await documentOf([file('log.csv.gz', gzipSync(LOG))])).toEqual(plain);
    expect(await documentOf([file('other.csv', gzipSync(LOG))])).toEqual(plain);
  });

  it('reads standard input for a dash, compressed too', async () => {
    const plain = await documentOf([file('log.csv', LOG)]);
    expect(await documentOf(['-'], Readable.from([Buffer.from(LOG)]))).toEqual(plain);
    const bytes = [...gzipSync(LOG)].map((byte) => Buffer.of(byte));
    expect(await documentOf(['-'], Readable.from(bytes))).toEqual(plain);
  });

  it('takes the map, the rig and the length of a sub', async () => {
    const log = file('px.csv', LOG.replace(HEADER, 't;x;y').replaceAll(',', ';'));
    const map = file(
      'map.json',
      '{"columns":{"t":{"role":"time","unit":"seconds"},"2":{"role":"raError","unit":"guide px"},"y":{"role":"decError","unit":"guide px"}}}',
    );
    const rig = file(
      'rig.json',
      '\uFEFF{"guiding":{"focalLengthMm":200,"pixelUm":3.75},"seeingFwhmArcsec":2}',
    );
    const document = await documentOf([log, '--map', map, '--rig', rig, '--sub-seconds', '30']);
    expect(document.reading.columns).toEqual({ time: 't', raError: 'x', decError: 'y' });
    // 206.264806 · 3.75 / 200 (REFERENCE, plate scale)
    expect(document.optics.guideScaleArcsecPerPx).toBeCloseTo(3.867465, 6);
    expect(document.runs[0]?.subs?.lengthSeconds).toBe(30);
  });

  it("reads times without a zone by the clock of the rig's site", async () => {
    const lines = Array.from({ length: 40 }, (_, n) => `2026-03-14T21:40:${10 + n},1,2`);
    const log = file('local.csv', [HEADER.replace('time s', 'timestamp'), ...lines].join('\n'));
    const rig = file('site.json', '{"site":{"timeZone":"America/Toronto"}}');
    // Four hours west of Greenwich since 8 March 2026 (IANA time zone database).
    expect((await documentOf([log, '--rig', rig])).runs[0]?.start).toBe('2026-03-15T01:40:10Z');
    const { runs, reading } = await documentOf([log]);
    expect(runs[0]?.start).toBeNull();
    expect(reading.warnings).toEqual([
      'The times carry no time zone, so that the instant of the start is not known.',
    ]);
  });

  it('says in one sentence what it cannot use', async () => {
    const log = file('log.csv', LOG);
    const missing = join(folder, 'missing.csv');
    const usage =
      'Use: npm run --silent analyse -- FILE.csv [--map MAP.json] [--rig RIG.json] [--sub-seconds N]';
    expect(await complaintOf()).toBe(`No file was named. ${usage}`);
    expect(await complaintOf(log, log)).toBe(`Only one file can be read at a time. ${usage}`);
    expect(await complaintOf(log, '--sup')).toBe(
      `The words after the command were not understood. ${usage}`,
    );
    expect(await complaintOf(log, '--sub-seconds', 'ten')).toBe(
      '--sub-seconds needs a number from 1 to 3600, not "ten".',
    );
    expect(await complaintOf(missing)).toBe(`There is no file "${missing}".`);
    expect(await complaintOf(folder)).toBe(`"${folder}" is a folder, not a file.`);
    expect(await complaintOf(file('empty.csv', ''))).toBe('The file is empty.');
    const cut = file('cut.csv.gz', gzipSync(LOG).subarray(0, 90));
    expect(await complaintOf(cut)).toBe(`The compressed file "${cut}" is cut off.`);
    const damaged = file(
      'damaged.csv.gz',
      Uint8Array.of(0x1f, 0x8b, 8, 0, 1, 2, 3, 4, 0, 0, 255, 255),
    );
    expect(await complaintOf(damaged)).toBe(`The compressed file "${damaged}" is damaged.`);
  });

  it('leaves by its exit code, with nothing but the document on standard output', () => {
    const launcher = fileURLToPath(new URL('analyse-launcher.mjs', import.meta.url));
    const run = (...args: string[]) =>
      spawnSync(process.execPath, [launcher, ...args], { encoding: 'utf8' });
    const good = run(file('log.csv', LOG));
    expect(good).toMatchObject({ status: 0, stderr: '' });
    expect(JSON.parse(good.stdout)).toMatchObject({ schema: 'stillpier-analysis/1' });
    const bad = run(file('one.csv', '1\n2\n'));
    expect(bad).toMatchObject({ status: 2, stdout: '' });
    expect(bad.stderr).toBe(
      'The file has only one column: a guide log needs a time, a RA error and a Dec error in each line.\n',
    );
  });

  it.each([
    [
      '--rig',
      '{"mount":{"wormteeth":180}}',
      'The rig',
      'has a key that is not known: mount.wormteeth',
    ],
    [
      '--rig',
      '{"mount":{"gearStages":[{"name":"a","periodSeconds":1},{"name":"b","periodSeconds":1,"x":1}]}}',
      'The rig',
      'has a key that is not known: mount.gearStages[1].x',
    ],
    [
      '--rig',
      '{"mount":{"wormTeeth":"many"}}',
      'The rig',
      'has a value that cannot be used at mount.wormTeeth (Invalid input: expected number, received string)',
    ],
    ['--rig', '[1]', 'The rig', 'must be an object'],
    ['--rig', '{', 'The rig', 'is not valid JSON'],
    [
      '--rig',
      '{"site":{"timeZone":"Nowhere/Town"}}',
      'The rig',
      'has a value that cannot be used at site.timeZone (needs a time zone such as Europe/Lisbon)',
    ],
    [
      '--map',
      '{"columns":{"x":{"role":"snr","sign":1}}}',
      'The column map',
      'has a key that is not known: columns.x.sign',
    ],
    ['--map', '{"delimeter":";"}', 'The column map', 'has a key that is not known: delimeter'],
  ])('refuses %s %s', async (option, json, what, fault) => {
    const path = file('setting.json', json);
    expect(await complaintOf(file('log.csv', LOG), option, path)).toBe(
      `${what} "${path}" ${fault}.`,
    );
  });
});
