import type { Readable } from 'node:stream';
import {
  accessTokenPaths,
  accountPaths,
  byHandPaths,
  exportPaths,
  columnMapPaths,
  columnMapPathsOf,
  ownColumnMapPaths,
  ownColumnMapSchema,
  importPaths,
  logImportSchema,
  newAccessTokenSchema,
  nightPaths,
  nightSchema,
  rigPaths,
  savedColumnMapSchema,
  setupPaths,
  setupSchema,
} from '@stillpier/contract';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makeApp, type Agent, type TestApp } from '../support/api-app';
import { EXAMPLE_MAP, EXAMPLE_RIG, EXAMPLE_SETUP, guideCsv } from '../support/example-rig';
import { type Cast, castOf, type Part, PARTS } from '../support/rig-members';
import { finished, startTestWorker, upload } from '../support/test-worker';

/** The table of rights (PRODUCT, "People and rights") as status codes. */
const outsiders = { stranger: 404, steward: 404, nobody: 401 };
const see = (ok: number) => ({ owner: ok, operator: ok, advisor: ok, ...outsiders });
const edit = (ok: number) => ({ owner: ok, operator: ok, advisor: 403, ...outsiders });
const own = (ok: number) => ({ owner: ok, operator: 403, advisor: 403, ...outsiders });
const signedIn = (ok: number) => ({ ...see(ok), stranger: ok, steward: ok });
const everyone = { ...signedIn(200), nobody: 200 };

interface Rule {
  readonly expected: Record<Part, number>;
  /** null: the answer to everybody alike is tested with its resource. */
  readonly send: ((agent: Agent) => PromiseLike<{ status: number }>) | null;
}
const elsewhere: Rule = { expected: everyone, send: null };
const get = (path: () => string, expected: Record<Part, number>): Rule => ({
  expected,
  send: (agent) => agent.get(path()),
});

const TOKEN = { name: 'Dome', scope: 'read', expiresAt: '2126-01-01T00:00:00Z' };

let app: TestApp;
let cast: Cast;
let ids: Record<'setup' | 'map' | 'import' | 'run' | 'date' | 'token' | 'ownMap', string>;

beforeAll(async () => {
  app = await makeApp();
  cast = await castOf(app);
  const worker = await startTestWorker(app);
  const setup = await newSetup();
  const log = await newImport(1);
  const [date = ''] = (await finished(cast.owner, cast.rigId, log)).nights;
  const night = await cast.owner.get(nightPaths.one(cast.rigId, date)).expect(200);
  const run = nightSchema.parse(night.body).runs[0]?.id ?? '';
  const token = newAccessTokenSchema.parse(
    (await cast.owner.post(accessTokenPaths.all).send(TOKEN).expect(201)).body,
  ).id;
  const ownMap = ownColumnMapSchema.parse(
    (await cast.owner.post(ownColumnMapPaths.all).send(EXAMPLE_MAP).expect(201)).body,
  ).id;
  ids = { ownMap, setup, map: await newMap(), import: log, run, date, token };
  await worker.stop();
});
afterAll(() => app.close());

async function newSetup(): Promise<string> {
  const made = await cast.owner.post(setupPaths.all(cast.rigId)).send(EXAMPLE_SETUP).expect(201);
  return setupSchema.parse(made.body).id;
}
async function newMap(): Promise<string> {
  const made = await cast.owner.post(columnMapPaths.all(cast.rigId)).send(EXAMPLE_MAP).expect(201);
  return savedColumnMapSchema.parse(made.body).id;
}
let variant = 100;
async function newImport(of = variant++): Promise<string> {
  const sent = await upload(cast.owner, cast.rigId, 'a.csv', guideCsv(40, of)).expect(202);
  return logImportSchema.parse(sent.body).id;
}
async function versionTag(path: string): Promise<string> {
  return (await cast.owner.get(path)).headers['etag'] ?? '';
}

const rig = () => cast.rigId;
const onImport = (path: (rigId: string, importId: string) => string) => () =>
  path(rig(), ids.import);

/** Every route of the application. The rig itself is deleted last. */
const RULES: Record<string, Rule> = {
  'post /api/v1/accounts': elsewhere,
  'post /api/v1/accounts/confirmations': elsewhere,
  'get /api/v1/session': get(() => accountPaths.session, everyone),
  'post /api/v1/session': elsewhere,
  'delete /api/v1/session': elsewhere,
  'get /api/v1/account': get(() => accountPaths.account, { ...signedIn(200) }),
  'patch /api/v1/account': {
    expected: signedIn(200),
    send: (agent) => agent.patch(accountPaths.account).send({ name: 'A tester' }),
  },
  'put /api/v1/account/password': {
    expected: signedIn(400), // their own, and only with the current one
    send: (agent) => agent.put(accountPaths.password).send({}),
  },
  'get /api/v1/account/tokens': get(() => accessTokenPaths.all, signedIn(200)),
  'post /api/v1/account/tokens': {
    expected: signedIn(201),
    send: (agent) => agent.post(accessTokenPaths.all).send(TOKEN),
  },
  'patch /api/v1/account/tokens/{tokenId}': {
    expected: { ...signedIn(404), owner: 200 },
    send: (agent) => agent.patch(accessTokenPaths.one(ids.token)).send({ name: 'Dome' }),
  },
  'delete /api/v1/account/tokens/{tokenId}': {
    expected: { ...signedIn(404), owner: 204 },
    send: (agent) => agent.delete(accessTokenPaths.one(ids.token)),
  },
  'get /api/v1/account/column-maps': get(() => ownColumnMapPaths.all, signedIn(200)),
  'post /api/v1/account/column-maps': {
    expected: signedIn(201),
    send: (agent) => agent.post(ownColumnMapPaths.all).send(EXAMPLE_MAP),
  },
  'post /api/v1/account/column-maps/files': {
    expected: signedIn(201),
    send: (agent) => agent.post(`${ownColumnMapPaths.files}?name=A`).send(EXAMPLE_MAP.map),
  },
  'get /api/v1/account/column-maps/{mapId}': get(() => ownColumnMapPaths.one(ids.ownMap), {
    ...signedIn(404),
    owner: 200,
  }),
  'get /api/v1/account/column-maps/{mapId}/file': get(() => ownColumnMapPaths.file(ids.ownMap), {
    ...signedIn(404),
    owner: 200,
  }),
  'delete /api/v1/account/column-maps/{mapId}': {
    expected: { ...signedIn(404), owner: 204 },
    send: (agent) => agent.delete(ownColumnMapPaths.one(ids.ownMap)),
  },
  'post /api/v1/password-resets': elsewhere,
  'put /api/v1/password-resets': elsewhere,
  'get /api/v1/openapi.json': get(() => '/api/v1/openapi.json', everyone),
  'get /api/v1/docs': get(() => '/api/v1/docs', everyone),
  'get /healthz': get(() => '/healthz', everyone),
  'get /readyz': get(() => '/readyz', everyone),

  'get /api/v1/rigs': get(() => rigPaths.all, signedIn(200)),
  'post /api/v1/rigs': {
    expected: signedIn(201),
    send: (agent) => agent.post(rigPaths.all).send(EXAMPLE_RIG),
  },
  'get /api/v1/rigs/{rigId}': get(() => rigPaths.one(rig()), see(200)),
  'put /api/v1/rigs/{rigId}': {
    expected: edit(200),
    send: async (agent) => {
      const path = rigPaths.one(rig());
      return agent
        .put(path)
        .set('If-Match', await versionTag(path))
        .send(EXAMPLE_RIG);
    },
  },
  'get /api/v1/rigs/{rigId}/setups': get(() => setupPaths.all(rig()), see(200)),
  'post /api/v1/rigs/{rigId}/setups': {
    expected: edit(201),
    send: (agent) => agent.post(setupPaths.all(rig())).send(EXAMPLE_SETUP),
  },
  'get /api/v1/rigs/{rigId}/setups/{setupId}': get(
    () => setupPaths.one(rig(), ids.setup),
    see(200),
  ),
  'put /api/v1/rigs/{rigId}/setups/{setupId}': {
    expected: edit(200),
    send: async (agent) => {
      const path = setupPaths.one(rig(), ids.setup);
      return agent
        .put(path)
        .set('If-Match', await versionTag(path))
        .send(EXAMPLE_SETUP);
    },
  },
  'delete /api/v1/rigs/{rigId}/setups/{setupId}': {
    expected: edit(204),
    send: async (agent) => agent.delete(setupPaths.one(rig(), await newSetup())),
  },
  'get /api/v1/rigs/{rigId}/column-maps': get(() => columnMapPaths.all(rig()), see(200)),
  'post /api/v1/rigs/{rigId}/column-maps': {
    expected: edit(201),
    send: (agent) => agent.post(columnMapPaths.all(rig())).send(EXAMPLE_MAP),
  },
  'post /api/v1/rigs/{rigId}/column-maps/files': {
    expected: edit(201),
    send: (agent) => agent.post(`${columnMapPathsOf(rig()).files}?name=A`).send(EXAMPLE_MAP.map),
  },
  'get /api/v1/rigs/{rigId}/column-maps/{mapId}/file': get(
    () => columnMapPathsOf(rig()).file(ids.map),
    see(200),
  ),
  'get /api/v1/rigs/{rigId}/column-maps/{mapId}': get(
    () => columnMapPaths.one(rig(), ids.map),
    see(200),
  ),
  'delete /api/v1/rigs/{rigId}/column-maps/{mapId}': {
    expected: edit(204),
    send: async (agent) => agent.delete(columnMapPaths.one(rig(), await newMap())),
  },
  'get /api/v1/rigs/{rigId}/imports': get(() => importPaths.all(rig()), see(200)),
  'post /api/v1/rigs/{rigId}/imports': {
    expected: edit(202),
    send: (agent) => upload(agent, rig(), 'b.csv', guideCsv(40, variant++)),
  },
  'get /api/v1/rigs/{rigId}/import-events': {
    expected: see(200),
    // What is read is the head of the answer: the stream itself has no end.
    send: (agent) =>
      agent.get(importPaths.events(rig())).parse((answer, done) => {
        done(null, null);
        (answer as unknown as Readable).destroy(); // superagent's type leaves the stream out
      }),
  },
  'get /api/v1/rigs/{rigId}/imports/{importId}': get(onImport(importPaths.one), see(200)),
  'delete /api/v1/rigs/{rigId}/imports/{importId}': {
    expected: edit(204),
    send: async (agent) => agent.delete(importPaths.one(rig(), await newImport())),
  },
  'post /api/v1/rigs/{rigId}/imports/{importId}/retries': {
    expected: edit(409), // it waits to be read already
    send: async (agent) => agent.post(importPaths.retries(rig(), await newImport())).send({}),
  },
  'get /api/v1/rigs/{rigId}/imports/{importId}/original': get(
    onImport(importPaths.original),
    see(200),
  ),
  'get /api/v1/rigs/{rigId}/imports/{importId}/document': get(
    onImport(importPaths.document),
    see(200),
  ),
  'get /api/v1/rig-states': get(() => nightPaths.rigStates, signedIn(200)),
  'get /api/v1/rigs/{rigId}/nights': get(() => nightPaths.all(rig()), see(200)),
  'get /api/v1/rigs/{rigId}/nights/{date}': get(() => nightPaths.one(rig(), ids.date), see(200)),
  'get /api/v1/rigs/{rigId}/runs/{runId}/series': get(
    () => `${nightPaths.series(rig(), ids.run)}?channels=raError`,
    see(200),
  ),
  'get /api/v1/rigs/{rigId}/runs/{runId}/spectrum': get(
    () => nightPaths.spectrum(rig(), ids.run),
    see(200),
  ),
  'get /api/v1/rigs/{rigId}/runs/{runId}/by-hand': get(
    () => byHandPaths.of(rig(), ids.run),
    see(200),
  ),
  'post /api/v1/rigs/{rigId}/runs/{runId}/by-hand': {
    expected: edit(202),
    send: (agent) =>
      agent
        .post(byHandPaths.of(rig(), ids.run))
        .send({ action: 'set aside', fromSeconds: 0, toSeconds: 10, reason: 'Clouds' }),
  },
  'get /api/v1/rigs/{rigId}/imports/{importId}/frames': get(onImport(exportPaths.frames), see(200)),
  'get /api/v1/rigs/{rigId}/nights/{date}/archive': get(
    () => exportPaths.night(rig(), ids.date),
    see(200),
  ),
  'get /api/v1/rigs/{rigId}/archive': get(() => exportPaths.rig(rig()), see(200)),
  'delete /api/v1/rigs/{rigId}': {
    expected: own(204),
    send: (agent) => agent.delete(rigPaths.one(rig())),
  },
};

it('every route of the description has a rule here, and every rule a route', async () => {
  const { body } = await app.agent().get('/api/v1/openapi.json').expect(200);
  const paths = (body as { paths: Record<string, Record<string, unknown>> }).paths;
  const routes = Object.entries(paths).flatMap(([path, methods]) =>
    Object.keys(methods).map((method) => `${method} ${path}`),
  );
  expect(routes.sort()).toEqual(Object.keys(RULES).sort());
});

/** The weakest first: what the owner deletes is gone for those who come after. */
const ORDER = [...PARTS].reverse();
const cases = Object.entries(RULES).flatMap(([route, { send, expected }]) =>
  send ? [[route, send, expected] as const] : [],
);

describe('who may do what', () => {
  it.each(cases)('%s', async (_route, send, expected) => {
    const answered: Partial<Record<Part, number>> = {};
    for (const part of ORDER) answered[part] = (await send(cast[part])).status;
    expect(answered).toEqual(expected);
  });
});
