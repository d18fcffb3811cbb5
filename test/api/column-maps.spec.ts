import {
  type ColumnMap,
  columnMapPathsOf,
  columnMapSchema,
  type CreateColumnMap,
  ownColumnMapPaths,
  ownColumnMapSchema,
  rigPaths,
  rigSchema,
  savedColumnMapSchema,
  setupPaths,
} from '@stillpier/contract';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Agent, makeApp, type TestApp } from '../support/api-app';
import { EXAMPLE_MAP, EXAMPLE_RIG, EXAMPLE_SETUP, guideCsv } from '../support/example-rig';
import { type Cast, castOf } from '../support/rig-members';
import { startTestWorker, type TestWorker, uploaded } from '../support/test-worker';

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

async function newRig(agent: Agent): Promise<string> {
  const rig = await agent.post(rigPaths.all).send(EXAMPLE_RIG).expect(201);
  const rigId = rigSchema.parse(rig.body).id;
  await agent.post(setupPaths.all(rigId)).send(EXAMPLE_SETUP).expect(201);
  return rigId;
}
/** A log under the headers of EXAMPLE_MAP: time, east and north. */
const ownHeaders = (variant: number) =>
  guideCsv(60, variant)
    .replace(/^[^\n]*/, 'when,east,north')
    .replace(/,[^,\n]*,0\n/g, '\n');
/** EXAMPLE_MAP with the two axes the other way round. */
const swapped: ColumnMap = {
  columns: {
    when: { role: 'time', unit: 'iso' },
    north: { role: 'raError', unit: 'arcsec' },
    east: { role: 'decError', unit: 'arcsec' },
  },
};
async function raColumnOf(agent: Agent, rigId: string, variant: number): Promise<string> {
  const { id, state } = await uploaded(agent, rigId, 'own.csv', ownHeaders(variant));
  expect(state).toBe('done');
  const row = await app
    .knex('imports')
    .where({ id })
    .first<{ document: { reading: { columns: Record<string, string> } } }>('document');
  return row.document.reading.columns['raError'] ?? '';
}

describe('the maps of a person', () => {
  it('are tried on all their rigs, after those of the rig', async () => {
    const own: CreateColumnMap = { ...EXAMPLE_MAP, map: swapped };
    await cast.owner.post(ownColumnMapPaths.all).send(own).expect(201);
    const rigId = await newRig(cast.owner);
    expect(await raColumnOf(cast.owner, rigId, 1)).toBe('north');
    await cast.owner.post(columnMapPathsOf(rigId).all).send(EXAMPLE_MAP).expect(201);
    expect(await raColumnOf(cast.owner, rigId, 2)).toBe('east');
  });

  it('are nobody else’s', async () => {
    const rigId = await newRig(cast.stranger);
    const { state } = await uploaded(cast.stranger, rigId, 'own.csv', ownHeaders(3));
    expect(state).toBe('failed');
  });
});

describe('a map as a file', () => {
  it('goes out as a MAP.json, and in again for another rig, where it recognises the headers that it names', async () => {
    const from = columnMapPathsOf(await newRig(cast.operator));
    const saved = await cast.operator.post(from.all).send(EXAMPLE_MAP).expect(201);
    const { id } = savedColumnMapSchema.parse(saved.body);
    const file = await cast.operator.get(from.file(id)).expect(200);
    expect(file.headers['content-disposition']).toContain(`${EXAMPLE_MAP.name}.json`);
    expect(columnMapSchema.parse(file.body)).toEqual(EXAMPLE_MAP.map);

    const rigId = await newRig(cast.advisor);
    const sent = await cast.advisor
      .post(columnMapPathsOf(rigId).files)
      .query({ name: 'From the other rig' })
      .send(file.body as object)
      .expect(201);
    expect(savedColumnMapSchema.parse(sent.body)).toMatchObject({
      ...{ rigId, name: 'From the other rig', headerCells: null, map: EXAMPLE_MAP.map },
    });
    expect(await raColumnOf(cast.advisor, rigId, 4)).toBe('east');
  });

  it('can be kept by a person as well', async () => {
    const sent = await cast.steward
      .post(`${ownColumnMapPaths.files}?name=Mine`)
      .send(swapped)
      .expect(201);
    const own = ownColumnMapSchema.parse(sent.body);
    expect(sent.headers['location']).toBe(ownColumnMapPaths.one(own.id));
    const file = await cast.steward.get(ownColumnMapPaths.file(own.id)).expect(200);
    expect(file.body).toEqual(swapped);
    expect(await raColumnOf(cast.steward, await newRig(cast.steward), 5)).toBe('north');
  });

  it.each([
    ['with a key that no map has', '?name=A', { colour: 'red' }],
    ['with a role that is none', '?name=A', { columns: { a: { role: 'wind' } } }],
    ['without a name', '', {}],
  ])('%s is refused', async (_what, query, map) => {
    const path = `${ownColumnMapPaths.files}${query}`;
    expect((await cast.owner.post(path).send(map)).status).toBe(400);
  });
});
