import { type ClientRequest, request as httpRequest } from 'node:http';
import {
  importPaths,
  logImportSchema,
  problemSchema,
  rigPaths,
  rigSchema,
  setupPaths,
} from '@stillpier/contract';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makeApp, PASSWORD, type TestApp } from '../support/api-app';
import { EXAMPLE_RIG, EXAMPLE_SETUP, guideCsv } from '../support/example-rig';
import { type Cast, castOf } from '../support/rig-members';
import {
  finished,
  startTestWorker,
  type TestWorker,
  upload,
  uploaded,
} from '../support/test-worker';

const MIB = 1024 * 1024;
const HEADER = 'timestamp,ra_error_arcsec,dec_error_arcsec\n';
/** The eight bytes that every PNG begins with (PNG specification, 5.2), and zeros. */
/** A whole picture of one pixel. */
const PNG = Buffer.from(
  'iVBORw0KGgoAAAANSUhEUgAAAAEAAAABCAQAAAC1HAwCAAAAC0lEQVR42mNkYAAAAAYAAjCB0C8AAAAASUVORK5CYII=',
  'base64',
);

let app: TestApp;
let cast: Cast;
let worker: TestWorker;
beforeAll(async () => {
  app = await makeApp({ uploadLimitMib: 1 });
  cast = await castOf(app);
  await cast.owner.post(setupPaths.all(cast.rigId)).send(EXAMPLE_SETUP).expect(201);
  worker = await startTestWorker(app);
});
afterAll(async () => {
  await worker.stop();
  await app.close();
});

const countOf = async (table: string) => (await app.knex(table)).length;
const orphans = () =>
  app.knex('importChunks').whereNotIn('importId', app.knex('imports').select('id'));

describe('a file that is no guide log', () => {
  it.each([
    ['empty', Buffer.alloc(0), /empty/],
    ['a header and nothing else', HEADER, /header, but no line with figures/],
    ['a picture', PNG, /not text/],
    ['one column', 'time\n1\n2\n3\n', /one column/],
    ['headers that nobody knows', 'a,b,c\n1,2,3\n4,5,6\n', /column/],
    ['only bad lines', `${HEADER}x,y,z\nx,y,z\n`, /refused/],
  ])('(%s) leaves a failed import with one sentence and nothing else', async (name, file, why) => {
    const { id, ...failed } = await uploaded(cast.owner, cast.rigId, `${name}.csv`, file);
    expect(failed).toMatchObject({ state: 'failed', attempt: 1, nights: [], frames: null });
    expect(failed.error).toMatch(why);
    expect(failed.error).toMatch(/^[A-Z].*\.$/); // one sentence
    expect(await app.knex('runs').where({ importId: id })).toEqual([]);
    expect(await countOf('nights')).toBe(0);
  });

  it('(a map that names a column which is not there) is refused with the name', async () => {
    const columns = {
      'star x': { role: 'raError', unit: 'arcsec' },
      timestamp: { role: 'time', unit: 'iso' },
      dec_error_arcsec: { role: 'decError', unit: 'arcsec' },
    };
    const options = { setupId: null, map: { columns } };
    const failed = await uploaded(cast.owner, cast.rigId, 'm.csv', guideCsv(40, 7), options);
    expect(failed).toMatchObject({ state: 'failed' });
    expect(failed.error).toContain('star x');
  });

  it('(times without a date) can be read again with the time of its first frame', async () => {
    const lines = Array.from(
      { length: 60 },
      (_, i) => `${i * 2},${Math.sin(i * i)},${Math.cos(i * i)}`,
    );
    const csv = `time s,ra error arcsec,dec error arcsec\n${lines.join('\n')}\n`;
    const failed = await uploaded(cast.owner, cast.rigId, 'seconds.csv', csv);
    expect(failed.error).toContain('startTime');

    const map = { startTime: '2026-05-01T22:00:00-04:00' };
    const retries = importPaths.retries(cast.rigId, failed.id);
    await cast.owner.post(retries).send({ map }).expect(202);
    const done = await finished(cast.owner, cast.rigId, failed.id);
    expect(done).toMatchObject({ state: 'done', error: null, nights: ['2026-05-01'] });
    await cast.owner.delete(importPaths.one(cast.rigId, done.id)).expect(204);
  });

  it('leaves alone what an earlier reading of it found, when it was one with another map', async () => {
    const done = await uploaded(cast.owner, cast.rigId, 'good.csv', guideCsv(60, 3));
    const map = { columns: { nothing: { role: 'time', unit: 'iso' } } };
    await cast.owner.post(importPaths.retries(cast.rigId, done.id)).send({ map }).expect(202);
    const failed = await finished(cast.owner, cast.rigId, done.id);
    expect(failed).toMatchObject({ state: 'failed', nights: done.nights, frames: done.frames });
    expect(await app.knex('runs').where({ importId: done.id })).toHaveLength(1);
    await cast.owner.delete(importPaths.one(cast.rigId, done.id)).expect(204);
  });
});

describe('an upload', () => {
  it.each([
    ['../../etc/night.csv', 'night.csv'],
    ['C:\\logs\\night.csv', 'night.csv'],
  ])('called %j keeps a plain name', async (sent, kept) => {
    const body = formBody(`x,y\n${sent}\n`, sent);
    const answer = await cast.owner
      .post(importPaths.all(cast.rigId))
      .set('Content-Type', `multipart/form-data; boundary=${BOUNDARY}`)
      .send(body)
      .expect(202);
    const { id, fileName } = logImportSchema.parse(answer.body);
    expect(fileName).toBe(kept);
    await finished(cast.owner, cast.rigId, id);
  });

  it.each([
    ['no file', () => cast.owner.post(importPaths.all(cast.rigId)).field('options', '{}')],
    ['no form', () => cast.owner.post(importPaths.all(cast.rigId)).send({ file: 'x' })],
    ['options that are not JSON', () => withOptions('{')],
    ['options that nobody knows', () => withOptions('{"setupId":null,"map":null,"x":1}')],
    [
      'two files',
      () => upload(cast.owner, cast.rigId, 'a.csv', 'a').attach('file', Buffer.from('b'), 'b.csv'),
    ],
    [
      'another field',
      () => cast.owner.post(importPaths.all(cast.rigId)).attach('log', Buffer.from('a'), 'a.csv'),
    ],
    [
      'a body that is cut off',
      () =>
        cast.owner
          .post(importPaths.all(cast.rigId))
          .set('Content-Type', `multipart/form-data; boundary=${BOUNDARY}`)
          .send(formBody('x', 'x.csv').slice(0, -BOUNDARY.length - 6)),
    ],
  ])('with %s is refused and leaves nothing', async (_what, send) => {
    const before = await countOf('imports');
    const refused = await send();
    expect(refused.status).toBe(400);
    expect(problemSchema.parse(refused.body).type).toBe('bad-input');
    expect(await countOf('imports')).toBe(before);
    expect(await orphans()).toEqual([]);
  });

  it('that says it is too long is refused before its body is read', async () => {
    const cookie = await cookieOf('owner@stillpier.test');
    const { status, body } = await answerTo(openUpload(cookie, 201 * MIB));
    expect(status).toBe(413);
    expect(body).toContain('1 MiB'); // the limit of this spec
  });

  it('that turns out to be too long is refused and leaves nothing', async () => {
    const cookie = await cookieOf('owner@stillpier.test');
    const before = await countOf('imports');
    const request = openUpload(cookie, null);
    request.end(`${'1,2,3\n'.repeat(500_000)}\r\n--${BOUNDARY}--\r\n`);
    const { status, body } = await answerTo(request);
    expect(status).toBe(413);
    expect(body).toContain('larger than 1 MiB');
    expect(await countOf('imports')).toBe(before);
    expect(await orphans()).toEqual([]);
  });

  it('that breaks off leaves nothing', async () => {
    const cookie = await cookieOf('owner@stillpier.test');
    const before = await countOf('imports');
    const transactions = async () => {
      const { rows } = await app.knex.raw<{ rows: unknown[] }>(
        `SELECT 1 FROM pg_stat_activity WHERE state LIKE 'idle in transaction%'
            AND datname = current_database()`,
      );
      return rows.length;
    };
    const request = openUpload(cookie, MIB);
    request.on('error', () => undefined); // it is broken off on purpose
    request.write(Buffer.alloc(MIB / 2, '1,2,3\n'));
    await expect.poll(transactions, { timeout: 10_000 }).toBe(1);
    request.destroy();
    await expect.poll(transactions, { timeout: 10_000 }).toBe(0);
    expect(await countOf('imports')).toBe(before);
    expect(await orphans()).toEqual([]);
  });
});

describe('a rig without a setup', () => {
  it('takes logs in arcseconds, and says so of those in guide pixels', async () => {
    const answer = await cast.owner.post(rigPaths.all).send(EXAMPLE_RIG).expect(201);
    const rigId = rigSchema.parse(answer.body).id;
    const done = await uploaded(cast.owner, rigId, 'px.csv', guideCsv(60).replace(/arcsec/g, 'px'));
    expect(done).toMatchObject({ state: 'done', setupId: null });
    const [run] = await app.knex('runs').where({ importId: done.id });
    expect(run).toMatchObject({ raRmsArcsec: null });
  });
});

const BOUNDARY = 'the-boundary-of-the-spec';

function formBody(file: string, fileName: string): string {
  const disposition = `Content-Disposition: form-data; name="file"; filename="${fileName}"`;
  return `--${BOUNDARY}\r\n${disposition}\r\n\r\n${file}\r\n--${BOUNDARY}--\r\n`;
}

function withOptions(options: string) {
  const request = cast.owner.post(importPaths.all(cast.rigId)).field('options', options);
  return request.attach('file', Buffer.from(guideCsv(40)), 'x.csv');
}

async function cookieOf(email: string): Promise<string> {
  const answer = await app.agent().post('/api/v1/session').send({ email, password: PASSWORD });
  return String(answer.headers['set-cookie']).split(';')[0] ?? '';
}

/** An upload that has begun, with its first bytes sent; null announces no length. */
function openUpload(cookie: string, announcedBytes: number | null): ClientRequest {
  const request = httpRequest(app.baseUrl + importPaths.all(cast.rigId), {
    method: 'POST',
    headers: {
      cookie,
      'content-type': `multipart/form-data; boundary=${BOUNDARY}`,
      ...(announcedBytes !== null && { 'content-length': announcedBytes }),
    },
  });
  request.write(formBody('|', 'x.csv').split('|')[0]);
  return request;
}

function answerTo(request: ClientRequest): Promise<{ status: number; body: string }> {
  return new Promise((resolve, reject) => {
    request.on('error', reject);
    request.on('response', (response) => {
      let body = '';
      response.on('data', (text) => (body += String(text)));
      response.on('end', () => {
        resolve({ status: response.statusCode ?? 0, body });
        request.destroy();
      });
    });
  });
}
