import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { request as httpRequest } from 'node:http';
import { tmpdir } from 'node:os';
import path from 'node:path';
import {
  accountPaths,
  importPaths,
  type LogImport,
  logImportSchema,
  nightPaths,
  nightSchema,
  setupPaths,
} from '@stillpier/contract';
import request from 'supertest';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { migrateDatabase } from '../../server/database/migrate-database';
import { startCluster } from '../../server/local/cluster.mjs';
import { ensurePostgres } from '../../server/local/postgres-programs.mjs';
import { type Agent, makeApp, PASSWORD, type TestApp } from '../support/api-app';
import { EXAMPLE_SETUP, guideCsv } from '../support/example-rig';
import { castOf } from '../support/rig-members';
import { type ServerProcess, startServerProcess } from '../support/server-process';
import { finished, startTestWorker, upload } from '../support/test-worker';

const NIGHT = '2026-03-14';
const PATIENCE = { timeout: 25_000, interval: 20 };
const BOUNDARY = 'half-of-an-upload';

/** Also after a test that ran out of time, newest first. */
let cleanUps: (() => unknown)[];
beforeEach(() => (cleanUps = []));
afterEach(async () => {
  for (const cleanUp of cleanUps.reverse()) await cleanUp();
});

async function started(
  entry: Parameters<typeof startServerProcess>[0],
  databaseUrl: string,
): Promise<ServerProcess> {
  const process = await startServerProcess(entry, databaseUrl);
  cleanUps.push(() => process.kill());
  return process;
}
async function startedWorkerOf(app: TestApp): Promise<void> {
  const worker = await startTestWorker(app);
  cleanUps.push(() => worker.stop());
}
async function ownerAt(web: ServerProcess): Promise<Agent> {
  const agent = request.agent(web.baseUrl);
  const signIn = { email: 'owner@stillpier.test', password: PASSWORD };
  await agent.post(accountPaths.session).send(signIn).expect(200);
  return agent;
}
/** Sends the beginning of a file, and leaves the rest to come. */
async function sendStart(web: ServerProcess, rigId: string, start: string): Promise<void> {
  const owner = request(web.baseUrl).post(accountPaths.session);
  const signIn = await owner.send({ email: 'owner@stillpier.test', password: PASSWORD });
  const cookies = signIn.get('Set-Cookie') ?? [];
  const sending = httpRequest(`${web.baseUrl}${importPaths.all(rigId)}`, {
    method: 'POST',
    headers: {
      Cookie: cookies.map((cookie) => cookie.split(';')[0]).join('; '),
      'Content-Type': `multipart/form-data; boundary=${BOUNDARY}`,
      'Content-Length': String(10 * start.length),
    },
  });
  sending.on('error', () => undefined); // it ends with the process that it speaks to
  const disposition = 'Content-Disposition: form-data; name="file"; filename="night.csv"';
  sending.write(`--${BOUNDARY}\r\n${disposition}\r\nContent-Type: text/csv\r\n\r\n${start}`);
}
/** Connections that have written a piece of an upload and wait for the next one. */
const writingUploads = async (app: TestApp): Promise<number> => {
  const { rows } = await app.knex.raw<{ rows: unknown[] }>(
    `SELECT 1 FROM pg_stat_activity WHERE datname = current_database()
        AND state LIKE 'idle in transaction%' AND query LIKE 'insert into "import_chunks"%'`,
  );
  return rows.length;
};
const countOf = async (app: TestApp, table: string) => (await app.knex(table)).length;
const jobsOf = (app: TestApp, importId: string) =>
  app.knex('graphile_worker._private_jobs').whereRaw(`payload->>'importId' = ?`, [importId]);

it('a web process that is killed in the middle of an upload leaves nothing half; the next takes the file', async () => {
  const app = await makeApp();
  cleanUps.push(() => app.close());
  const { owner, rigId } = await castOf(app);
  const csv = guideCsv(20_000); // two pieces of 512 KiB
  const first = await started('main', app.databaseUrl);
  await sendStart(first, rigId, csv.slice(0, 600_000));
  await expect.poll(() => writingUploads(app), PATIENCE).toBe(1);
  await first.kill();
  await expect.poll(() => writingUploads(app), PATIENCE).toBe(0);
  expect(await countOf(app, 'imports')).toBe(0);
  expect(await countOf(app, 'importChunks')).toBe(0);

  const second = await started('main', app.databaseUrl);
  const sent = await upload(await ownerAt(second), rigId, 'night.csv', csv).expect(202);
  const { id } = logImportSchema.parse(sent.body);
  await second.kill(); // what was answered stands
  await startedWorkerOf(app);
  expect(await finished(owner, rigId, id)).toMatchObject({ state: 'done', frames: 20_000 });
  const again = await upload(owner, rigId, 'night.csv', csv).expect(200);
  expect(again.body).toMatchObject({ id, duplicate: true });
  expect(await countOf(app, 'imports')).toBe(1);
  expect(await countOf(app, 'runs')).toBe(1);
});

it('PostgreSQL that is killed in the middle of an import is started again, and nothing is lost or doubled', async () => {
  const programs = ensurePostgres();
  // A cluster of its own, with the settings of a real one: that of the other specs would not survive.
  const base = mkdtempSync(path.join(tmpdir(), 'stillpier-killed-'));
  let cluster = await startCluster({ base, programs });
  cleanUps.push(() => {
    cluster.stop();
    rmSync(base, { recursive: true, force: true });
  });
  await migrateDatabase(cluster.url);
  const app = await makeApp({ database: { url: cluster.url, drop: () => Promise.resolve() } });
  cleanUps.push(() => app.close());
  const { owner, rigId } = await castOf(app);
  await owner.post(setupPaths.all(rigId)).send(EXAMPLE_SETUP).expect(201);
  const before = await upload(owner, rigId, 'early.csv', guideCsv(60, 1)).expect(202);
  const worker = await started('worker', cluster.url);
  await finished(owner, rigId, logImportSchema.parse(before.body).id);

  const csv = guideCsv(20_000, 2, '2026-03-15T03:00:00Z');
  const sent = await upload(owner, rigId, 'late.csv', csv).expect(202);
  const { id } = logImportSchema.parse(sent.body);
  const now = async (): Promise<LogImport> =>
    logImportSchema.parse((await owner.get(importPaths.one(rigId, id))).body);
  await expect.poll(async () => (await now()).progress, PATIENCE).toBeGreaterThan(0.1);
  killPostgres(path.join(base, `data-${programs.major}`));
  const isReady = async () => (await owner.get('/readyz')).status === 200;
  await expect.poll(isReady, PATIENCE).toBe(false);
  await worker.kill(); // whether or not it has ended by itself

  cluster = await startCluster({ base, programs });
  await expect.poll(isReady, PATIENCE).toBe(true); // the web process has only waited
  expect(await now()).toMatchObject({ state: 'running' });
  await startedWorkerOf(app);
  expect(await finished(owner, rigId, id)).toMatchObject({ state: 'done', frames: 20_000 });
  const night = await owner.get(nightPaths.one(rigId, NIGHT)).expect(200);
  expect(nightSchema.parse(night.body).summary).toMatchObject({ runCount: 2, frames: 20_060 });
  expect(await countOf(app, 'imports')).toBe(2);
  expect(await jobsOf(app, id)).toEqual([]);
});

/** The postmaster; its other processes see that it is gone and end. */
function killPostgres(dataFolder: string): void {
  const [pid] = readFileSync(path.join(dataFolder, 'postmaster.pid'), 'utf8').split('\n');
  process.kill(Number(pid), 'SIGKILL');
}
