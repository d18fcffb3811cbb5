import {
  type AccessToken,
  accessTokenPaths,
  accessTokenSchema,
  accountPaths,
  type CreateAccessToken,
  importPaths,
  logImportSchema,
  type NewAccessToken,
  newAccessTokenSchema,
  problemSchema,
  rigPaths,
  setupPaths,
} from '@stillpier/contract';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import * as z from 'zod';
import { failAbandonedImports } from '../../server/jobs/abandoned-imports';
import { makeApp, type TestApp } from '../support/api-app';
import { EXAMPLE_RIG, EXAMPLE_SETUP, guideCsv } from '../support/example-rig';
import { type Cast, castOf } from '../support/rig-members';
import { finished, startTestWorker, type TestWorker } from '../support/test-worker';

const TOMORROW = new Date(Date.now() + 86_400_000).toISOString();
const OWNER = 'owner@stillpier.test';

let app: TestApp;
let cast: Cast;
let worker: TestWorker;
beforeAll(async () => {
  app = await makeApp({ allowances: { wrongTokenByAddress: { tries: 6, seconds: 600 } } });
  cast = await castOf(app);
  worker = await startTestWorker(app);
  await cast.owner.post(setupPaths.all(cast.rigId)).send(EXAMPLE_SETUP).expect(201);
});
afterAll(async () => {
  await worker.stop();
  await app.close();
});

async function tokenWith(
  fields: Partial<CreateAccessToken>,
  agent = cast.owner,
): Promise<NewAccessToken> {
  const body = { name: 'Observatory', scope: 'upload', expiresAt: TOMORROW, ...fields };
  const made = await agent.post(accessTokenPaths.all).send(body).expect(201);
  return newAccessTokenSchema.parse(made.body);
}
/** A program: no cookie, and the browser's headers only where a test sets them. */
const by = (token: string) => ({
  get: (path: string) => request(app.baseUrl).get(path).set('Authorization', `Bearer ${token}`),
  post: (path: string) => request(app.baseUrl).post(path).set('Authorization', `Bearer ${token}`),
  delete: (path: string) =>
    request(app.baseUrl).delete(path).set('Authorization', `Bearer ${token}`),
});
const send = (token: string, csv: string, name = 'night.csv') =>
  by(token).post(importPaths.all(cast.rigId)).attach('file', Buffer.from(csv), name);
const tokensOf = async (agent = cast.owner): Promise<AccessToken[]> =>
  z.array(accessTokenSchema).parse((await agent.get(accessTokenPaths.all).expect(200)).body);
const importMails = async () =>
  (await app.mailsTo(OWNER)).filter(({ subject }) => subject.startsWith(EXAMPLE_RIG.name));

describe('a token', () => {
  it('is shown once and kept as its hash', async () => {
    const made = await tokenWith({ name: 'Shown once' });
    expect(made).toMatchObject({ mails: 'failed', lastUsedAt: null });
    expect(JSON.stringify(await tokensOf())).not.toContain(made.token);
    const row = await app.knex('accessTokens').where({ id: made.id }).first<object>();
    expect(JSON.stringify(row)).not.toContain(made.token);
    await cast.stranger.delete(accessTokenPaths.one(made.id)).expect(404);
  });

  it('is renamed, and revoked at once', async () => {
    const { id, token } = await tokenWith({ scope: 'read' });
    const changed = await cast.owner
      .patch(accessTokenPaths.one(id))
      .send({ name: 'Dome', mails: 'always' })
      .expect(200);
    expect(changed.body).toMatchObject({ name: 'Dome', mails: 'always', scope: 'read' });
    await by(token).get(rigPaths.all).expect(200);
    await cast.owner.delete(accessTokenPaths.one(id)).expect(204);
    const refused = await by(token).get(rigPaths.all).expect(401);
    expect(problemSchema.parse(refused.body).type).toBe('wrong-token');
  });

  it('notes its last use, and ends when its time is over', async () => {
    const { id, token } = await tokenWith({ scope: 'read' });
    await by(token).get(rigPaths.all).expect(200);
    const used = (await tokensOf()).find((each) => each.id === id);
    expect(Date.parse(used?.lastUsedAt ?? '')).toBeGreaterThan(Date.now() - 60_000);
    await app
      .knex('accessTokens')
      .where({ id })
      .update({ expiresAt: new Date(0) });
    await by(token).get(rigPaths.all).expect(401);
  });

  it('needs a time to end that is still to come', async () => {
    const body = { name: 'Late', scope: 'read', expiresAt: '2020-01-01T00:00:00Z' };
    await cast.owner.post(accessTokenPaths.all).send(body).expect(400);
  });

  it('of a session in the same request counts in place of the session', async () => {
    const { token } = await tokenWith({ scope: 'read' }, cast.stranger);
    const answer = await cast.owner
      .get(rigPaths.one(cast.rigId))
      .set('Authorization', `Bearer ${token}`);
    expect(answer.status).toBe(404);
    expect(answer.headers['set-cookie']).toBeUndefined();
  });
});

describe('a token for reading', () => {
  it('sees what the account sees, and changes nothing', async () => {
    const { token } = await tokenWith({ scope: 'read' });
    const account = await by(token).get(accountPaths.account).expect(200);
    expect(account.body).toMatchObject({ email: OWNER });
    await by(token).get(rigPaths.one(cast.rigId)).expect(200);
    await by(token).get(importPaths.all(cast.rigId)).expect(200);
    for (const refused of [
      by(token).post(rigPaths.all).send(EXAMPLE_RIG),
      send(token, guideCsv(40, 50)),
      by(token).delete(rigPaths.one(cast.rigId)),
      by(token).post(accessTokenPaths.all).send({}),
    ]) {
      const { status, body } = await refused;
      expect(status).toBe(403);
      expect(problemSchema.parse(body).detail).toMatch(/^This token may read.*\.$/);
    }
  });
});

describe('a token for uploads', () => {
  it('sends a log, whatever origin it names, and follows it to its end', async () => {
    const { token } = await tokenWith({});
    const sent = await send(token, guideCsv(60, 1)).set('Origin', 'https://elsewhere.test');
    expect(sent.status).toBe(202);
    const { id } = logImportSchema.parse(sent.body);
    expect(sent.headers['location']).toBe(importPaths.one(cast.rigId, id));
    await finished(cast.owner, cast.rigId, id);
    const state = await by(token)
      .get(sent.headers['location'] ?? '')
      .expect(200);
    expect(state.body).toMatchObject({ state: 'done', frames: 60 });
  });

  it('may do nothing else', async () => {
    const { token } = await tokenWith({});
    for (const refused of [
      by(token).get(rigPaths.all),
      by(token).get(importPaths.all(cast.rigId)),
      by(token).get(accessTokenPaths.all),
      by(token).post(rigPaths.all).send(EXAMPLE_RIG),
    ]) {
      const { status, body } = await refused;
      expect(status).toBe(403);
      expect(problemSchema.parse(body).detail).toMatch(/^This token may send logs.*\.$/);
    }
  });

  it('gets no further than its account', async () => {
    const advisors = await tokenWith({}, cast.advisor);
    expect((await send(advisors.token, guideCsv(40, 51))).status).toBe(403);
    const strangers = await tokenWith({}, cast.stranger);
    expect((await send(strangers.token, guideCsv(40, 52))).status).toBe(404);
  });
});

describe('an e-mail about a log that a token sent', () => {
  const sent = async (mails: AccessToken['mails'], csv: string, name: string) => {
    const { token } = await tokenWith({ mails });
    const before = (await importMails()).length;
    const answer = await send(token, csv, name).expect(202);
    const ended = await finished(cast.owner, cast.rigId, logImportSchema.parse(answer.body).id);
    return { ended, mails: (await importMails()).slice(before) };
  };

  it('comes once for one that failed, with the reason', async () => {
    const { ended, mails } = await sent('failed', 'a,b,c\n1,2,3\n', 'unknown.csv');
    expect(mails).toHaveLength(1);
    expect(mails[0]?.text).toContain(ended.error);
    expect(mails[0]?.text).toContain(`/rigs/${cast.rigId}/import`);
  });

  it('comes for one that was read only where that was asked for', async () => {
    expect((await sent('failed', guideCsv(60, 10), 'quiet.csv')).mails).toEqual([]);
    const { mails } = await sent('always', guideCsv(60, 11), 'told.csv');
    expect(mails).toHaveLength(1);
    expect(mails[0]?.text).toContain('told.csv was read: 60 frames.');
    expect(mails[0]?.text).toContain(`/rigs/${cast.rigId}/nights/2026-03-14`);
  });

  it('does not come again when somebody reads the log again by hand', async () => {
    const { ended } = await sent('always', guideCsv(60, 12), 'again.csv');
    const before = (await importMails()).length;
    await cast.owner.post(importPaths.retries(cast.rigId, ended.id)).send({}).expect(202);
    await finished(cast.owner, cast.rigId, ended.id);
    expect(await importMails()).toHaveLength(before);
  });

  it('comes once for one that no worker could finish', async () => {
    const { ended } = await sent('failed', guideCsv(60, 13), 'killed.csv');
    const before = (await importMails()).length;
    const mailTo = app.knex('accounts').where({ email: OWNER }).select('id');
    await app
      .knex('imports')
      .where({ id: ended.id })
      .update({ state: 'running', mailTo, mails: 'failed' });
    await failAbandonedImports(app.knex);
    await failAbandonedImports(app.knex);
    expect(await importMails()).toHaveLength(before + 1);
  });
});

it('guesses at tokens are limited for the network address', async () => {
  const { token } = await tokenWith({ scope: 'read' });
  const answers: number[] = [];
  for (let count = 0; count < 7; count++)
    answers.push((await by('guess').get(rigPaths.all)).status);
  expect(answers.at(-1)).toBe(429);
  await by(token).get(rigPaths.all).expect(200);
});
