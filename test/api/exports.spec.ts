import { buffer } from 'node:stream/consumers';
import {
  analysisDocumentSchema,
  byHandPaths,
  exportPaths,
  importPaths,
  type LogImport,
  nightPaths,
  nightSchema,
  rigPaths,
  rigSchema,
  setupPaths,
} from '@stillpier/contract';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import yauzl from 'yauzl';
import { makeApp, type TestApp } from '../support/api-app';
import { EXAMPLE_RIG, EXAMPLE_SETUP, guideCsv } from '../support/example-rig';
import { type Cast, castOf } from '../support/rig-members';
import { finished, startTestWorker, type TestWorker, uploaded } from '../support/test-worker';

const NIGHT = '2026-03-14';
const FRAMES = 9000; // three pieces

let app: TestApp;
let cast: Cast;
let worker: TestWorker;
let log: LogImport;
let other: LogImport;
let failed: LogImport;
beforeAll(async () => {
  app = await makeApp();
  cast = await castOf(app);
  worker = await startTestWorker(app);
  await cast.owner.post(setupPaths.all(cast.rigId)).send(EXAMPLE_SETUP).expect(201);
  log = await uploaded(cast.owner, cast.rigId, 'long.csv', guideCsv(FRAMES));
  const next = guideCsv(100, 1, '2026-03-16T01:00:00Z');
  other = await uploaded(cast.owner, cast.rigId, 'What "?".csv', next);
  failed = await uploaded(cast.owner, cast.rigId, 'unknown.csv', 'a,b\n1,2\n');
});
afterAll(async () => {
  await worker.stop();
  await app.close();
});

async function newRig(hasSetup = true): Promise<string> {
  const answer = await cast.owner.post(rigPaths.all).send(EXAMPLE_RIG).expect(201);
  const rigId = rigSchema.parse(answer.body).id;
  if (hasSetup) await cast.owner.post(setupPaths.all(rigId)).send(EXAMPLE_SETUP).expect(201);
  return rigId;
}
async function framesOf(rigId: string, importId: string): Promise<string> {
  const answer = await cast.owner.get(exportPaths.frames(rigId, importId)).expect(200);
  expect(answer.headers['content-type']).toContain('text/csv');
  return answer.text;
}
async function documentOf(rigId: string, importId: string) {
  const answer = await cast.owner.get(importPaths.document(rigId, importId)).expect(200);
  return analysisDocumentSchema.parse(answer.body);
}
async function archive(path: string): Promise<Map<string, Buffer>> {
  const answer = await cast.advisor.get(path).buffer(true).responseType('blob').expect(200);
  expect(answer.headers['content-type']).toBe('application/zip');
  return unzipped(answer.body as Buffer);
}
/** Every entry by name; yauzl checks sizes and checksums. */
async function unzipped(bytes: Buffer): Promise<Map<string, Buffer>> {
  const entries = new Map<string, Buffer>();
  const zip = await yauzl.fromBufferPromise(bytes);
  for await (const entry of zip.eachEntry()) {
    entries.set(entry.fileName, await buffer(await zip.openReadStreamPromise(entry)));
  }
  return entries;
}

describe('frames as CSV', () => {
  it('are read in again without a map, and give the same figures', async () => {
    const run = nightSchema.parse(
      (await cast.owner.get(nightPaths.one(cast.rigId, NIGHT)).expect(200)).body,
    ).runs[0];
    await cast.owner
      .post(byHandPaths.of(cast.rigId, run?.id ?? ''))
      .send({ action: 'set aside', fromSeconds: 1000, toSeconds: 1100, reason: 'Wind' })
      .expect(202);
    await finished(cast.owner, cast.rigId, log.id);
    const csv = await framesOf(cast.rigId, log.id);
    expect(csv.split('\n')).toHaveLength(FRAMES + 2); // header, frames, and the end of the last line

    const rigId = await newRig();
    const again = await uploaded(cast.owner, rigId, 'frames.csv', csv);
    expect(again).toMatchObject({ state: 'done', frames: FRAMES, refusedCount: 0 });
    const [before] = (await documentOf(cast.rigId, log.id)).runs;
    const document = await documentOf(rigId, again.id);
    const [after] = document.runs;
    expect(document.reading.warnings).toEqual([]);
    expect(after).toMatchObject({ start: before?.start, used: before?.used });
    expect(after?.setAside).toEqual(before?.setAside);
    // single-precision floats that were decimals of three places: the decimals come back exactly
    expect(after?.ra?.rmsArcsec).toBeCloseTo(before?.ra?.rmsArcsec ?? NaN, 12);
    expect(after?.loop.ra?.gain).toBeCloseTo(before?.loop.ra?.gain ?? NaN, 12);
  });

  it('hold no formula, whatever a target is called', async () => {
    const [header = '', ...lines] = guideCsv(60, 3).trim().split('\n');
    const csv = [`${header},target`, ...lines.map((line) => `${line},=1+1`)].join('\n');
    const rigId = await newRig();
    const { id } = await uploaded(cast.owner, rigId, 'formula.csv', csv);
    const frames = await framesOf(rigId, id);
    expect(frames).toContain(`"'=1+1"`);
    expect(frames).not.toMatch(/(^|,)[=+@\t\r]/m);
  });

  it('are refused with the reason where no scale is known, and not found where nothing was read', async () => {
    const csv = guideCsv(60, 4).replaceAll('error_arcsec', 'error_px');
    const rigId = await newRig(false);
    const { id, state } = await uploaded(cast.owner, rigId, 'pixels.csv', csv);
    expect(state).toBe('done');
    expect((await cast.owner.get(exportPaths.frames(rigId, id))).status).toBe(409);
    expect((await cast.owner.get(exportPaths.frames(cast.rigId, failed.id))).status).toBe(404);
  });
});

describe('a ZIP', () => {
  it('of a night holds original, frames and document of its logs', async () => {
    const entries = await archive(exportPaths.night(cast.rigId, NIGHT));
    const folder = `${NIGHT}/long.csv ${log.id.slice(0, 8)}`;
    expect([...entries.keys()]).toEqual([
      `${folder}/original/long.csv`,
      `${folder}/frames.csv`,
      `${folder}/analysis.json`,
    ]);
    const [original, frames, document] = [...entries.values()].map(String);
    expect(original).toBe(guideCsv(FRAMES));
    expect(frames).toBe(await framesOf(cast.rigId, log.id));
    expect(JSON.parse(document ?? '')).toEqual(await documentOf(cast.rigId, log.id));
  });

  it('of a rig holds all logs, those that could not be read too, under names that every system takes', async () => {
    const names = [...(await archive(exportPaths.rig(cast.rigId))).keys()];
    expect(names).toContain(`not read/unknown.csv ${failed.id.slice(0, 8)}/original/unknown.csv`);
    expect(names).toContain(
      `2026-03-15/What ___.csv ${other.id.slice(0, 8)}/original/What ___.csv`,
    );
    expect(names).toHaveLength(7);
  });

  it('that breaks off in the middle does not look whole', async () => {
    const rigId = await newRig();
    const { id } = await uploaded(cast.owner, rigId, 'long.csv', guideCsv(22_000));
    await app.knex('importChunks').where({ importId: id, position: 1 }).delete();
    const answer = cast.owner.get(exportPaths.rig(rigId)).buffer(true).responseType('blob');
    await expect(answer).rejects.toThrow(/aborted|hang up/);
  });

  it('of a night that is not there is not found', async () => {
    await cast.owner.get(exportPaths.night(cast.rigId, '2020-01-01')).expect(404);
  });
});
