import {
  type ByHand,
  byHandPaths,
  byHandSchema,
  type ChangeByHand,
  importPaths,
  type NightRun,
  nightPaths,
  nightSchema,
  problemSchema,
  setupPaths,
} from '@stillpier/contract';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { makeApp, type TestApp } from '../support/api-app';
import { EXAMPLE_SETUP, guideCsv } from '../support/example-rig';
import { type Cast, castOf } from '../support/rig-members';
import { finished, startTestWorker, type TestWorker, uploaded } from '../support/test-worker';

const NIGHT = '2026-03-14';
const FRAMES = 200;
/** The second run begins half an hour later. */
const TWO_RUNS = `${guideCsv(FRAMES)}${guideCsv(FRAMES, 1, '2026-03-15T02:10:00Z').replace(/^.*\n/, '')}`;

let app: TestApp;
let cast: Cast;
let worker: TestWorker;
let importId: string;
let variant = 0;
beforeAll(async () => {
  app = await makeApp();
  cast = await castOf(app);
  await cast.owner.post(setupPaths.all(cast.rigId)).send(EXAMPLE_SETUP).expect(201);
  worker = await startTestWorker(app);
});
beforeEach(async () => {
  if (variant > 0) await cast.owner.delete(importPaths.one(cast.rigId, importId)).expect(204);
  variant += 1;
  const csv = `${TWO_RUNS}# ${variant}\n`;
  importId = (await uploaded(cast.owner, cast.rigId, 'night.csv', csv)).id;
});
afterAll(async () => {
  await worker.stop();
  await app.close();
});

async function runs(): Promise<[NightRun, NightRun]> {
  const answer = await cast.advisor.get(nightPaths.one(cast.rigId, NIGHT)).expect(200);
  const [first, second] = nightSchema.parse(answer.body).runs;
  if (!first || !second) throw new Error('The night needs two runs');
  return [first, second];
}
const runOf = async (index: 0 | 1) => (await runs())[index];
async function change(
  index: 0 | 1,
  action: ChangeByHand['action'],
  fromSeconds: number,
  toSeconds: number,
  agent = cast.operator,
) {
  const body: ChangeByHand = { action, fromSeconds, toSeconds, reason: 'A cloud passed' };
  return agent.post(byHandPaths.of(cast.rigId, (await runOf(index)).id)).send(body);
}
async function changed(...args: Parameters<typeof change>): Promise<ByHand> {
  const answer = await change(...args);
  expect(answer.status).toBe(202);
  expect(answer.headers['location']).toBe(importPaths.one(cast.rigId, importId));
  expect(await finished(cast.owner, cast.rigId, importId)).toMatchObject({ state: 'done' });
  return byHandSchema.parse(answer.body);
}
const byHandOf = ({ run }: NightRun) => run.setAside.filter(({ reason }) => reason === 'by hand');

describe('a stretch of a run', () => {
  it('is set aside by hand, and the figures rest on the rest', async () => {
    const [before] = await runs();
    const { stretches } = await changed(0, 'set aside', 100, 160);
    expect(stretches).toEqual([{ fromSeconds: 100, toSeconds: 160 }]);

    const [after, other] = await runs();
    // frames every 2 s: those at 100 s to 158 s
    expect(byHandOf(after)).toEqual([
      { fromSeconds: 100, toSeconds: 160, frames: 30, reason: 'by hand' },
    ]);
    expect(after.run.used).toBe(before.run.used - 30);
    expect(after.run.ra?.rmsArcsec).not.toBe(before.run.ra?.rmsArcsec);
    expect(after.id).toBe(before.id);
    expect(byHandOf(other)).toEqual([]);
    const document = await cast.owner.get(importPaths.document(cast.rigId, importId)).expect(200);
    expect(JSON.stringify(document.body)).toContain('"by hand"');
  });

  it('of the second run is a stretch of the second run', async () => {
    await changed(1, 'set aside', 20, 30);
    const [first, second] = await runs();
    expect(byHandOf(first)).toEqual([]);
    expect(byHandOf(second)).toMatchObject([{ fromSeconds: 20, toSeconds: 30, frames: 5 }]);
  });

  it('up to the end of a run holds its last frame', async () => {
    const { run } = await runOf(0);
    await changed(0, 'set aside', 390, run.durationSeconds + 60);
    expect(byHandOf(await runOf(0))).toMatchObject([{ fromSeconds: 390, frames: 5 }]);
  });

  it('is taken back, and the figures are as they were; who did what and why is kept', async () => {
    const [before] = await runs();
    await changed(0, 'set aside', 100, 160);
    const after = await changed(0, 'take back', 0, 300, cast.owner);
    expect(after.stretches).toEqual([]);
    expect((await runs())[0]).toEqual(before);
    expect(after.history).toMatchObject([
      { action: 'take back', fromSeconds: 0, toSeconds: 300, reason: 'A cloud passed' },
      { action: 'set aside', fromSeconds: 100, toSeconds: 160, by: 'A tester' },
    ]);
    const seen = await cast.advisor.get(byHandPaths.of(cast.rigId, before.id)).expect(200);
    expect(byHandSchema.parse(seen.body)).toEqual(after);
    await app.knex('byHandEntries').where({ importId }).update({ madeBy: null });
    const later = await cast.advisor.get(byHandPaths.of(cast.rigId, before.id)).expect(200);
    expect(byHandSchema.parse(later.body).history.map(({ by }) => by)).toEqual([null, null]);
  });

  it('stays set aside when the log is read again', async () => {
    await changed(0, 'set aside', 100, 160);
    await cast.owner.post(importPaths.retries(cast.rigId, importId)).send({}).expect(202);
    await finished(cast.owner, cast.rigId, importId);
    expect(byHandOf(await runOf(0))).toMatchObject([{ fromSeconds: 100, toSeconds: 160 }]);
  });

  it('and another one at once are both set aside', async () => {
    const answers = await Promise.all([
      change(0, 'set aside', 10, 20),
      change(0, 'set aside', 50, 60),
      change(1, 'set aside', 10, 20),
    ]);
    expect(answers.map(({ status }) => status)).toEqual([202, 202, 202]);
    await finished(cast.owner, cast.rigId, importId);
    const [first, second] = await runs();
    expect(byHandOf(first)).toMatchObject([{ fromSeconds: 10 }, { fromSeconds: 50 }]);
    expect(byHandOf(second)).toMatchObject([{ fromSeconds: 10 }]);
  });
});

it('the old figures stay until the new ones stand', async () => {
  const before = await runs();
  await worker.stop();
  expect((await change(0, 'set aside', 100, 160)).status).toBe(202);
  expect(await runs()).toEqual(before);
  worker = await startTestWorker(app);
  await finished(cast.owner, cast.rigId, importId);
  expect((await runs())[0].run.used).toBeLessThan(before[0].run.used);
});

describe('a change is refused', () => {
  it.each([
    ['with nothing to take back', 'take back', 0, 10, 422],
    ['that ends before it begins', 'set aside', 10, 10, 400],
    ['behind the end of the run', 'set aside', 5000, 6000, 400],
  ] as const)('%s', async (_what, action, from, to, status) => {
    const answer = await change(0, action, from, to);
    expect(answer.status).toBe(status);
    expect(problemSchema.parse(answer.body).status).toBe(status);
  });

  it('while the last reading of the log is a failed one', async () => {
    const map = { columns: { nothing: { role: 'time', unit: 'iso' } } };
    await cast.owner.post(importPaths.retries(cast.rigId, importId)).send({ map }).expect(202);
    await finished(cast.owner, cast.rigId, importId);
    expect((await change(0, 'set aside', 10, 20)).status).toBe(409);
  });
});
