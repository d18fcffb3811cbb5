import { createHash } from 'node:crypto';
import {
  analysisDocumentSchema,
  importPaths,
  type LogImport,
  logImportSchema,
  nightPaths,
  nightSchema,
  pageOf,
  rigPaths,
  rigSchema,
  setupPaths,
  setupSchema,
} from '@stillpier/contract';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makeApp, type TestApp } from '../support/api-app';
import { EXAMPLE_MAP, EXAMPLE_RIG, EXAMPLE_SETUP, guideCsv } from '../support/example-rig';
import { type Cast, castOf } from '../support/rig-members';
import {
  finished,
  startTestWorker,
  type TestWorker,
  upload,
  uploaded,
} from '../support/test-worker';

const importPageSchema = pageOf(logImportSchema);

let app: TestApp;
let cast: Cast;
let worker: TestWorker;
beforeAll(async () => {
  app = await makeApp();
  cast = await castOf(app);
  worker = await startTestWorker(app);
});
afterAll(async () => {
  await worker.stop();
  await app.close();
});

async function newRig(): Promise<string> {
  const answer = await cast.owner.post(rigPaths.all).send(EXAMPLE_RIG).expect(201);
  const rigId = rigSchema.parse(answer.body).id;
  await cast.owner.post(setupPaths.all(rigId)).send(EXAMPLE_SETUP).expect(201);
  return rigId;
}
const rowsOf = async (table: string, importId: string): Promise<number> =>
  (await app.knex(table).where({ importId })).length;
const send = (rigId: string, name: string, file: string | Buffer, options?: object) =>
  uploaded(cast.owner, rigId, name, file, options);

describe('a guide log', () => {
  it('becomes a night, and its original is kept byte for byte', async () => {
    const rigId = await newRig();
    const csv = guideCsv(400);
    const sent = await upload(cast.owner, rigId, 'März 14.csv', csv).expect(202);
    const waiting = logImportSchema.parse(sent.body);
    expect(waiting).toMatchObject({ state: 'waiting', duplicate: false, fileName: 'März 14.csv' });
    expect(sent.headers['location']).toBe(importPaths.one(rigId, waiting.id));

    const done = await finished(cast.owner, rigId, waiting.id);
    expect(done).toMatchObject({
      ...{ state: 'done', progress: 1, error: null, lines: 401, frames: 400, refusedCount: 0 },
      sha256: createHash('sha256').update(csv).digest('hex'),
      nights: ['2026-03-14'], // 21:40 in Toronto, the evening before the UTC date
    });
    const original = await cast.owner
      .get(importPaths.original(rigId, done.id))
      .buffer(true)
      .expect(200);
    expect(Buffer.from(original.body as Buffer).toString()).toBe(csv);
    expect(original.headers['content-disposition']).toContain("UTF-8''M%C3%A4rz%2014.csv");

    const answer = await cast.owner.get(importPaths.document(rigId, done.id)).expect(200);
    const document = analysisDocumentSchema.parse(answer.body);
    const night = nightSchema.parse(
      (await cast.owner.get(nightPaths.one(rigId, '2026-03-14')).expect(200)).body,
    );
    expect(night.runs.map(({ run }) => run)).toEqual(document.runs);
    expect(night.logs).toMatchObject([{ importId: done.id, reading: document.reading }]);
  });

  it('of many chunks is kept whole', async () => {
    const rigId = await newRig();
    const csv = guideCsv(22_000); // over 1 MiB: two chunks
    const done = await send(rigId, 'long.csv', csv);
    expect(await rowsOf('importChunks', done.id)).toBe(2);
    const original = await cast.owner.get(importPaths.original(rigId, done.id)).buffer(true);
    expect(Buffer.from(original.body as Buffer).equals(Buffer.from(csv))).toBe(true);
    expect(done).toMatchObject({ state: 'done', frames: 22_000 });
  });

  it('keeps the good lines and counts the bad ones', async () => {
    const csv = guideCsv(100).replace(/\n[^,]+,[^,]+,/, '\nyesterday,0.1,');
    const done = await send(await newRig(), 'one-bad-line.csv', csv);
    expect(done).toMatchObject({ state: 'done', lines: 101, frames: 99, refusedCount: 1 });
  });

  it('is read by a saved map that was made for its header line', async () => {
    const rigId = await newRig();
    await cast.owner
      .post(`${rigPaths.one(rigId)}/column-maps`)
      .send(EXAMPLE_MAP)
      .expect(201);
    const csv = guideCsv(100)
      .replace(/^[^\n]*/, 'when,east,north')
      .replace(/,[^,\n]*,0\n/g, '\n');
    const done = await send(rigId, 'own-headers.csv', csv);
    expect(done).toMatchObject({ state: 'done', frames: 100 });
  });

  it('whose times carry no zone is taken by the clock of the site', async () => {
    const csv = guideCsv(100, 0, '2026-07-10T22:00:00Z').replaceAll('.000Z', '');
    const rigId = await newRig();
    expect(await send(rigId, 'local.csv', csv)).toMatchObject({ nights: ['2026-07-10'] });
    const answer = await cast.owner.get(nightPaths.one(rigId, '2026-07-10')).expect(200);
    // 22:00 in Toronto in summer, UTC −4 h (IANA time zone database)
    expect(nightSchema.parse(answer.body).summary.startsAt).toBe('2026-07-11T02:00:00.000Z');
  });

  it('belongs to the setup that was named, and to no other rig’s', async () => {
    const rigId = await newRig();
    const second = await cast.owner.post(setupPaths.all(rigId)).send(EXAMPLE_SETUP).expect(201);
    const setupId = setupSchema.parse(second.body).id;
    const done = await send(rigId, 'a.csv', guideCsv(60), { setupId, map: null });
    expect(done.setupId).toBe(setupId);
    const refused = upload(cast.owner, await newRig(), 'a.csv', guideCsv(60), {
      setupId,
      map: null,
    });
    expect((await refused).status).toBe(400);
  });
});

describe('the same file again', () => {
  it('is recognised and not counted twice', async () => {
    const rigId = await newRig();
    const first = await send(rigId, 'night.csv', guideCsv(60));
    const again = await upload(cast.operator, cast.rigId, 'night.csv', guideCsv(60)).expect(202);
    expect(logImportSchema.parse(again.body).duplicate).toBe(false); // another rig
    const second = await upload(cast.owner, rigId, 'renamed.csv', guideCsv(60)).expect(200);
    expect(second.body).toEqual({ ...first, duplicate: true });
    expect(await app.knex('imports').where({ rigId })).toHaveLength(1);
    await finished(cast.operator, cast.rigId, logImportSchema.parse(again.body).id);
  });

  it('at the same moment is one import, with nothing doubled and nothing left over', async () => {
    const rigId = await newRig();
    const csv = guideCsv(15_000);
    const answers = await Promise.all(
      ['a.csv', 'b.csv', 'c.csv'].map((name) => upload(cast.owner, rigId, name, csv)),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 200, 202]);
    const ids = new Set(answers.map(({ body }) => logImportSchema.parse(body).id));
    expect(ids.size).toBe(1);
    const [id = ''] = ids;
    expect(await finished(cast.owner, rigId, id)).toMatchObject({ state: 'done' });
    expect(await rowsOf('runs', id)).toBe(1);
    const orphans = app
      .knex('importChunks')
      .whereNotIn('importId', app.knex('imports').select('id'));
    expect(await orphans).toEqual([]);
  });

  it('is tried anew with the new options when it failed before', async () => {
    const rigId = await newRig();
    const csv = guideCsv(60).replace(/^[^\n]*/, 'when,east,north,a,b');
    const failed = await send(rigId, 'x.csv', csv);
    expect(failed).toMatchObject({ state: 'failed', nights: [], frames: null });
    const again = await send(rigId, 'x.csv', csv, { setupId: null, map: EXAMPLE_MAP.map });
    expect(again).toMatchObject({ id: failed.id, state: 'done', frames: 60, error: null });
  });
});

describe('an import', () => {
  it('is read again from its original, and writes the same rows', async () => {
    const rigId = await newRig();
    const done = await send(rigId, 'night.csv', guideCsv(500));
    const everything = async () => ({
      runs: await app.knex('runs').where({ importId: done.id }).orderBy('id'),
      series: await app
        .knex('runSeries')
        .whereIn('runId', app.knex('runs').where({ importId: done.id }).select('id'))
        .orderBy(['runId', 'channel']),
      nights: await app.knex('nights').where({ rigId }),
    });
    const before = await everything();
    expect(before.runs).toHaveLength(1);

    const retries = importPaths.retries(rigId, done.id);
    await cast.owner.post(retries).send({}).expect(202);
    expect(await finished(cast.owner, rigId, done.id)).toEqual(done);
    expect(await everything()).toEqual(before);
  });

  it('that is being read is not started a second time', async () => {
    const rigId = await newRig();
    const sent = await upload(cast.owner, rigId, 'night.csv', guideCsv(20_000)).expect(202);
    const { id } = logImportSchema.parse(sent.body);
    expect((await cast.owner.post(importPaths.retries(rigId, id)).send({})).status).toBe(409);
    await finished(cast.owner, rigId, id);
  });

  it('takes its runs with it when it is deleted; a night that others share is summed up anew', async () => {
    const rigId = await newRig();
    const early = await send(rigId, 'early.csv', guideCsv(100));
    const late = await send(rigId, 'late.csv', guideCsv(50, 1, '2026-03-15T05:00:00Z'));
    const nightNow = () => cast.owner.get(nightPaths.one(rigId, '2026-03-14'));
    expect(nightSchema.parse((await nightNow()).body).summary).toMatchObject({
      frames: 150,
      runCount: 2,
    });
    await cast.operator.delete(importPaths.one(rigId, early.id)).expect(404);
    await cast.owner.delete(importPaths.one(rigId, early.id)).expect(204);
    expect(nightSchema.parse((await nightNow()).body).summary).toMatchObject({
      frames: 50,
      runCount: 1,
    });
    expect(await rowsOf('importChunks', early.id)).toBe(0);
    await cast.owner.delete(importPaths.one(rigId, late.id)).expect(204);
    expect((await nightNow()).status).toBe(404);
  });

  it('is listed in pages, newest first', async () => {
    const rigId = await newRig();
    const sent: LogImport[] = [];
    for (const variant of [1, 2, 3])
      sent.push(await send(rigId, `${variant}.csv`, guideCsv(40, variant)));
    const page = async (query: object) =>
      importPageSchema.parse((await cast.owner.get(importPaths.all(rigId)).query(query)).body);
    const first = await page({ limit: 2 });
    const rest = await page({ limit: 2, cursor: first.next });
    expect([...first.items, ...rest.items].map(({ id }) => id)).toEqual(
      sent.map(({ id }) => id).reverse(),
    );
    expect(rest.next).toBeNull();
    const wrong = cast.owner.get(importPaths.all(rigId)).query({ cursor: 'x' });
    expect((await wrong).status).toBe(400);
  });
});
