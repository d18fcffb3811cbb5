import {
  columnMapPaths,
  problemSchema,
  rigPaths,
  rigSchema,
  savedColumnMapSchema,
  setupPaths,
  setupSchema,
} from '@stillpier/contract';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import * as z from 'zod';
import { makeApp, type TestApp } from '../support/api-app';
import { EXAMPLE_MAP, EXAMPLE_RIG, EXAMPLE_SETUP } from '../support/example-rig';
import { type Cast, castOf } from '../support/rig-members';

let app: TestApp;
let cast: Cast;
beforeAll(async () => {
  app = await makeApp();
  cast = await castOf(app);
});
afterAll(() => app.close());

async function newRig() {
  const answer = await cast.owner.post(rigPaths.all).send(EXAMPLE_RIG).expect(201);
  return { rig: rigSchema.parse(answer.body), headers: answer.headers };
}

describe('a rig', () => {
  it('belongs to whoever describes it', async () => {
    const { rig, headers } = await newRig();
    expect(rig).toMatchObject({ ...EXAMPLE_RIG, role: 'owner', version: 1 });
    expect(headers).toMatchObject({ location: rigPaths.one(rig.id), etag: '"1"' });

    const read = await cast.owner.get(rigPaths.one(rig.id)).expect(200);
    expect(rigSchema.parse(read.body)).toEqual(rig);
  });

  it('is listed with the role of the account that asks', async () => {
    const roleOf = async (agent: Cast['owner']) => {
      const { body } = await agent.get(rigPaths.all).expect(200);
      return z
        .array(rigSchema)
        .parse(body)
        .find(({ id }) => id === cast.rigId)?.role;
    };
    expect(await roleOf(cast.owner)).toBe('owner');
    expect(await roleOf(cast.operator)).toBe('operator');
    expect(await roleOf(cast.advisor)).toBe('advisor');
    expect(await roleOf(cast.stranger)).toBeUndefined();
    expect(await roleOf(cast.steward)).toBeUndefined();
  });

  it('is changed only by those who have seen its newest version', async () => {
    const { rig } = await newRig();
    const put = (name: string) =>
      cast.owner.put(rigPaths.one(rig.id)).send({ ...EXAMPLE_RIG, name });
    expect((await put('Unseen')).status).toBe(428);
    const changed = await put('Second').set('If-Match', '"1"').expect(200);
    expect(changed.headers['etag']).toBe('"2"');
    const late = await put('Third').set('If-Match', '"1"').expect(412);
    expect(problemSchema.parse(late.body).type).toBe('stale-version');
    const now = await cast.owner.get(rigPaths.one(rig.id)).expect(200);
    expect(rigSchema.parse(now.body)).toMatchObject({ name: 'Second', version: 2 });
  });

  it('is kept once when two people change it at the same moment', async () => {
    const { rig } = await newRig();
    const answers = await Promise.all(
      ['One', 'Other'].map((name) =>
        cast.owner
          .put(rigPaths.one(rig.id))
          .set('If-Match', '"1"')
          .send({ ...EXAMPLE_RIG, name }),
      ),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 412]);
  });

  it.each([
    ['no name', { ...EXAMPLE_RIG, name: ' ' }, 'name'],
    ['an unknown key', { ...EXAMPLE_RIG, colour: 'red' }, ''],
    [
      'no such time zone',
      { ...EXAMPLE_RIG, site: { ...EXAMPLE_RIG.site, timeZone: 'Moon/Sea' } },
      'site.timeZone',
    ],
  ])('with %s is refused, and the field is named', async (_what, body, path) => {
    const refused = await cast.owner.post(rigPaths.all).send(body).expect(400);
    expect(problemSchema.parse(refused.body).errors?.map((error) => error.path)).toEqual([path]);
  });

  it('is not found at an address that no rig can have', async () => {
    expect((await cast.owner.get(rigPaths.one('nonsense'))).status).toBe(404);
    expect((await cast.owner.get(setupPaths.all('nonsense'))).status).toBe(404);
  });

  it('goes with all that hangs on it', async () => {
    const { rig } = await newRig();
    await cast.owner.post(setupPaths.all(rig.id)).send(EXAMPLE_SETUP).expect(201);
    await cast.owner.post(columnMapPaths.all(rig.id)).send(EXAMPLE_MAP).expect(201);
    await cast.owner.delete(rigPaths.one(rig.id)).expect(204);
    await cast.owner.get(rigPaths.one(rig.id)).expect(404);
    for (const table of ['rigMembers', 'setups', 'columnMaps']) {
      expect(await app.knex(table).where({ rigId: rig.id })).toEqual([]);
    }
  });
});

describe('a setup', () => {
  it('is made, read, listed, changed and deleted', async () => {
    const { rig } = await newRig();
    const made = await cast.owner.post(setupPaths.all(rig.id)).send(EXAMPLE_SETUP).expect(201);
    const setup = setupSchema.parse(made.body);
    expect(setup).toMatchObject({ ...EXAMPLE_SETUP, rigId: rig.id, version: 1 });
    const one = setupPaths.one(rig.id, setup.id);
    expect((await cast.owner.get(one).expect(200)).headers['etag']).toBe('"1"');

    const body = { ...EXAMPLE_SETUP, seeingFwhmArcsec: null };
    expect((await cast.owner.put(one).send(body)).status).toBe(428);
    const changed = await cast.owner.put(one).set('If-Match', '"1"').send(body).expect(200);
    expect(setupSchema.parse(changed.body)).toMatchObject({ seeingFwhmArcsec: null, version: 2 });
    expect((await cast.owner.put(one).set('If-Match', '"1"').send(body)).status).toBe(412);

    const list = await cast.owner.get(setupPaths.all(rig.id)).expect(200);
    expect(z.array(setupSchema).parse(list.body)).toEqual([changed.body]);
    await cast.owner.delete(one).expect(204);
    await cast.owner.get(one).expect(404);
  });

  it('is found under its own rig only', async () => {
    const made = await cast.owner.post(setupPaths.all(cast.rigId)).send(EXAMPLE_SETUP).expect(201);
    const { rig } = await newRig();
    const elsewhere = setupPaths.one(rig.id, setupSchema.parse(made.body).id);
    expect((await cast.owner.get(elsewhere)).status).toBe(404);
    expect((await cast.owner.delete(elsewhere)).status).toBe(404);
    const put = cast.owner.put(elsewhere).set('If-Match', '"1"').send(EXAMPLE_SETUP);
    expect((await put).status).toBe(404);
  });
});

describe('a column map', () => {
  it('is saved, read, listed and deleted', async () => {
    const all = columnMapPaths.all(cast.rigId);
    const made = await cast.owner.post(all).send(EXAMPLE_MAP).expect(201);
    const map = savedColumnMapSchema.parse(made.body);
    expect(map).toMatchObject(EXAMPLE_MAP);
    const one = columnMapPaths.one(cast.rigId, map.id);
    expect((await cast.owner.get(one).expect(200)).body).toEqual(map);
    expect((await cast.owner.get(all).expect(200)).body).toEqual([map]);
    await cast.owner.delete(one).expect(204);
    expect((await cast.owner.delete(one)).status).toBe(404);
  });
});
