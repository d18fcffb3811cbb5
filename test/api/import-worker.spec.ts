import {
  importPaths,
  type LogImport,
  logImportSchema,
  nightPaths,
  nightSchema,
  setupPaths,
} from '@stillpier/contract';
import type { Job } from 'graphile-worker';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { ImportTurn, TakenOverError } from '../../server/jobs/import-turn';
import { makeApp, type TestApp } from '../support/api-app';
import { EXAMPLE_SETUP, guideCsv } from '../support/example-rig';
import { type Cast, castOf } from '../support/rig-members';
import { startServerProcess } from '../support/server-process';
import { finished, startTestWorker, type TestWorker, upload } from '../support/test-worker';

/** Long enough to be stopped in the middle. */
const MANY_FRAMES = 60_000;

let app: TestApp;
let cast: Cast;
beforeAll(async () => {
  app = await makeApp();
  cast = await castOf(app);
  await cast.owner.post(setupPaths.all(cast.rigId)).send(EXAMPLE_SETUP).expect(201);
});
afterAll(() => app.close());

let worker: TestWorker | undefined;
beforeEach(() => (worker = undefined));
afterEach(() => worker?.stop());

async function send(variant: number, frames: number): Promise<LogImport> {
  const csv = guideCsv(frames, variant);
  const sent = await upload(cast.owner, cast.rigId, `${variant}.csv`, csv).expect(202);
  return logImportSchema.parse(sent.body);
}
const now = async (id: string): Promise<LogImport> =>
  logImportSchema.parse((await cast.owner.get(importPaths.one(cast.rigId, id))).body);
const untilRunning = (id: string) =>
  expect.poll(async () => (await now(id)).state, { timeout: 20_000, interval: 10 }).toBe('running');
const jobsOf = (id: string) =>
  app.knex('graphile_worker._private_jobs').whereRaw(`payload->>'importId' = ?`, [id]);

describe('a worker that is killed in the middle of an import', () => {
  it('is followed by the next one, which finishes it with nothing counted twice', async () => {
    const killed = await startServerProcess('worker', app.databaseUrl);
    const { id } = await send(1, MANY_FRAMES);
    await untilRunning(id);
    await killed.kill();
    expect(await now(id)).toMatchObject({ state: 'running', attempt: 1 });

    const killedAt = performance.now();
    worker = await startTestWorker(app);
    const done = await finished(cast.owner, cast.rigId, id);
    expect((performance.now() - killedAt) / 1000).toBeLessThan(60); // the promise of a minute
    expect(done).toMatchObject({ state: 'done', attempt: 2, frames: MANY_FRAMES });

    const runs = await app.knex('runs').where({ importId: id });
    expect(runs).toHaveLength(1);
    const answer = await cast.owner.get(nightPaths.one(cast.rigId, done.nights[0] ?? ''));
    const { summary } = nightSchema.parse(answer.body);
    expect(summary).toMatchObject({ runCount: 1, frames: MANY_FRAMES });
    expect(await jobsOf(id)).toEqual([]);
    await cast.owner.delete(importPaths.one(cast.rigId, id)).expect(204);
  });

  it('each time, leaves a failed import that says so', async () => {
    const { id } = await send(2, 50);
    // as three killed workers leave it: tries used up, nobody at work
    await app.knex('imports').where({ id }).update({ state: 'running', attempt: 3 });
    await jobsOf(id).update({ attempts: 3 });
    worker = await startTestWorker(app);
    const failed = await finished(cast.owner, cast.rigId, id);
    expect(failed).toMatchObject({ state: 'failed', nights: [] });
    expect(failed.error).toMatch(/stopped each time/);
  });
});

describe('a worker that is stopped in order', () => {
  it('gives its import back, and the try is not counted', async () => {
    const first = await startTestWorker(app);
    const { id } = await send(3, MANY_FRAMES);
    await untilRunning(id);
    await first.stop();
    expect(await now(id)).toMatchObject({ state: 'waiting', progress: 0 });
    expect(await jobsOf(id)).toMatchObject([{ attempts: 0, lockedBy: null }]);

    worker = await startTestWorker(app);
    const done = await finished(cast.owner, cast.rigId, id);
    expect(done).toMatchObject({ state: 'done', attempt: 1 });
  });
});

describe('a file that makes the program fail', () => {
  it('is tried three times and failed, and keeps nobody else waiting', async () => {
    const poisoned = await send(4, 50);
    await app.knex('importChunks').where({ importId: poisoned.id }).delete();
    worker = await startTestWorker(app);
    await expect.poll(async () => (await now(poisoned.id)).stage).toBe('Waiting for another try');

    const good = await send(5, 50);
    expect(await finished(cast.owner, cast.rigId, good.id)).toMatchObject({ state: 'done' });
    await expect
      .poll(
        async () => {
          await jobsOf(poisoned.id).update({ runAt: new Date() }); // without the queue's wait
          return now(poisoned.id);
        },
        { timeout: 20_000, interval: 200 },
      )
      .toMatchObject({ state: 'failed', attempt: 3, nights: [] });
    expect((await now(poisoned.id)).error).toMatch(/fault of the program/);
  });
});

describe('a run that was taken over', () => {
  it('writes no more', async () => {
    const { id } = await send(6, 50);
    const { jobId } = await app.knex('imports').where({ id }).first<{ jobId: number }>('jobId');
    const attempt = (attempts: number) => ({ id: String(jobId), attempts }) as Job;
    const slow = await ImportTurn.begin(app.knex, id, attempt(1));
    const quick = await ImportTurn.begin(app.knex, id, attempt(2));
    await expect(slow?.fail('too late')).rejects.toThrow(TakenOverError);
    await quick?.report(0.5, 'Reading the lines');
    expect(await now(id)).toMatchObject({ state: 'running', progress: 0.5, attempt: 2 });
    expect(await ImportTurn.begin(app.knex, id, attempt(1))).toBeNull();

    // started anew by hand: the job of before has no more say, whatever its try
    await quick?.fail('for the spec');
    await cast.owner.post(importPaths.retries(cast.rigId, id)).send({}).expect(202);
    expect(await ImportTurn.begin(app.knex, id, attempt(3))).toBeNull();
  });
});
