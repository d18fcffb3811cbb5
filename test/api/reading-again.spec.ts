import {
  type ColumnMap,
  importPaths,
  logImportSchema,
  type NightRun,
  nightPaths,
  nightSchema,
  rigPaths,
  rigSchema,
  setupPaths,
  setupSchema,
} from '@stillpier/contract';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { makeApp, type TestApp } from '../support/api-app';
import { EXAMPLE_RIG, EXAMPLE_SETUP, guideCsv } from '../support/example-rig';
import { type Cast, castOf } from '../support/rig-members';
import {
  finished,
  startTestWorker,
  type TestWorker,
  upload,
  uploaded,
} from '../support/test-worker';

const NIGHT = '2026-03-14';

let app: TestApp;
let cast: Cast;
let workers: TestWorker[] = [];
beforeAll(async () => {
  app = await makeApp();
  cast = await castOf(app);
});
afterEach(stopWorkers);
afterAll(() => app.close());

async function startWorker(): Promise<void> {
  workers.push(await startTestWorker(app));
}
async function stopWorkers(): Promise<void> {
  for (const worker of workers) await worker.stop();
  workers = [];
}
async function newRig(): Promise<string> {
  const answer = await cast.owner.post(rigPaths.all).send(EXAMPLE_RIG).expect(201);
  const rigId = rigSchema.parse(answer.body).id;
  await cast.owner.post(setupPaths.all(rigId)).send(EXAMPLE_SETUP).expect(201);
  return rigId;
}
async function nightOf(rigId: string) {
  const answer = await cast.advisor.get(nightPaths.one(rigId, NIGHT));
  return answer.status === 200 ? nightSchema.parse(answer.body) : null;
}

describe('a log that is read again', () => {
  /** The axes the other way round: other figures of the same frames. */
  const swapped: ColumnMap = {
    columns: {
      ra_error_arcsec: { role: 'decError', unit: 'arcsec' },
      dec_error_arcsec: { role: 'raError', unit: 'arcsec' },
    },
  };
  const rmsOf = ({ run }: NightRun) => [run.ra?.rmsArcsec, run.dec?.rmsArcsec];

  it('with another map keeps its old figures until the new ones stand', async () => {
    await startWorker();
    const { id } = await uploaded(cast.owner, cast.rigId, 'a.csv', guideCsv(400, 1));
    await stopWorkers();
    const before = await nightOf(cast.rigId);
    const retries = importPaths.retries(cast.rigId, id);
    await cast.owner.post(retries).send({ map: swapped }).expect(202);
    expect(await nightOf(cast.rigId)).toEqual(before);
    const document = await cast.owner.get(importPaths.document(cast.rigId, id)).expect(200);

    await startWorker();
    expect(await finished(cast.owner, cast.rigId, id)).toMatchObject({ state: 'done' });
    const after = await nightOf(cast.rigId);
    const [old] = before?.runs ?? [];
    const [now] = after?.runs ?? [];
    expect(now && rmsOf(now)).toEqual(old && rmsOf(old).reverse());
    expect(after?.summary.raRmsArcsec).toBe(before?.summary.decRmsArcsec);
    const later = await cast.owner.get(importPaths.document(cast.rigId, id)).expect(200);
    expect(later.body).not.toEqual(document.body);
    await cast.owner.delete(importPaths.one(cast.rigId, id)).expect(204);
  });

  it('with another setup belongs to it, and the night says so only then', async () => {
    const rigId = await newRig();
    await startWorker();
    const { id } = await uploaded(cast.owner, rigId, 'a.csv', guideCsv(400, 2));
    await stopWorkers();
    const setup = { ...EXAMPLE_SETUP, name: 'Long refractor', seeingFwhmArcsec: 4 };
    const made = await cast.owner.post(setupPaths.all(rigId)).send(setup).expect(201);
    const setupId = setupSchema.parse(made.body).id;
    const runOf = async () => {
      const answer = await cast.owner.get(nightPaths.one(rigId, NIGHT)).expect(200);
      return nightSchema.parse(answer.body).runs[0];
    };
    const { run } = (await runOf()) ?? {};
    await cast.owner.post(importPaths.retries(rigId, id)).send({ setupId }).expect(202);
    expect(await runOf()).toMatchObject({ setupName: EXAMPLE_SETUP.name, run });

    await startWorker();
    await finished(cast.owner, rigId, id);
    const now = await runOf();
    expect(now).toMatchObject({ setupId, setupName: 'Long refractor', seeingFwhmArcsec: 4 });
    expect(now?.run.footprint?.aspect).toBeLessThan(run?.footprint?.aspect ?? NaN); // a wider disc hides more
  });
});

describe('logs of one night that are read at once', () => {
  it('by two workers leave a night that sums up all of them', async () => {
    await startWorker();
    await startWorker();
    const starts = ['01:00', '02:30', '04:00', '05:30', '07:00', '08:30'];
    const sent = await Promise.all(
      starts.map(async (time, i) => {
        const csv = guideCsv(200 + i, i, `2026-03-15T${time}:00Z`);
        const answer = await upload(cast.owner, cast.rigId, `${i}.csv`, csv).expect(202);
        return logImportSchema.parse(answer.body).id;
      }),
    );
    for (const id of sent) {
      const done = await finished(cast.owner, cast.rigId, id);
      expect(done).toMatchObject({ state: 'done', nights: [NIGHT] });
    }
    const night = await nightOf(cast.rigId);
    expect(night?.summary).toMatchObject({
      ...{ runCount: 6, frames: 200 + 201 + 202 + 203 + 204 + 205 },
      startsAt: '2026-03-15T01:00:00.000Z',
    });
    expect(night?.runs.map(({ importId }) => importId)).toEqual(sent);
    expect(workers.flatMap(({ logged }) => logged)).toEqual([]);
  });
});
