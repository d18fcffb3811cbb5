import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { accountPaths, problemSchema } from '@stillpier/contract';
import { pino } from 'pino';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makeApp, PASSWORD, PUBLIC_URL, type TestApp } from '../support/api-app';

const logLines: string[] = [];
const webFolder = mkdtempSync(path.join(os.tmpdir(), 'stillpier-web-'));
let app: TestApp;
beforeAll(async () => {
  writeFileSync(path.join(webFolder, 'index.html'), '<html><app-root></app-root></html>');
  writeFileSync(path.join(webFolder, 'main-ABCD1234.js'), '/* a script */'.repeat(200));
  writeFileSync(path.join(webFolder, 'theme-boot.js'), '/* a script */');
  const logger = pino({}, { write: (line) => logLines.push(line) });
  app = await makeApp({ webFolder, logger });
});
afterAll(async () => {
  await app.close();
  rmSync(webFolder, { recursive: true });
});

describe('requests of other sites', () => {
  const signOutWith = async (headers: Record<string, string>) =>
    (await app.agent().delete(accountPaths.session).set(headers)).status;

  it.each([
    ['a program, which names no origin', {}, 204],
    ['a page of ours', { 'sec-fetch-site': 'same-origin', origin: PUBLIC_URL }, 204],
    ['an address typed by hand', { 'sec-fetch-site': 'none' }, 204],
    ['a page of ours behind a proxy that renames the host', { origin: PUBLIC_URL }, 204],
    ['another port of the host', { 'sec-fetch-site': 'same-site', origin: 'http://x:1' }, 403],
    ['another site', { 'sec-fetch-site': 'cross-site', origin: 'http://x.test' }, 403],
    ['another site, by an old browser', { origin: 'http://x.test' }, 403],
    ['a page without an origin', { origin: 'null' }, 403],
  ])('are told apart: %s', async (_who, headers, status) => {
    expect(await signOutWith(headers)).toBe(status);
  });

  it('are let through over plain http when the origin is the host that was asked', async () => {
    expect(await signOutWith({ origin: app.baseUrl })).toBe(204);
  });

  it('are refused before their body is read', async () => {
    const refused = await app
      .agent()
      .post(accountPaths.session)
      .set({ 'sec-fetch-site': 'cross-site', 'content-type': 'application/json' })
      .send('{ not JSON');
    expect(refused.status).toBe(403);
  });

  it('may read nothing: no answer allows another origin', async () => {
    const answer = await app.agent().get(accountPaths.session).set('origin', 'http://x.test');
    expect(answer.headers).not.toHaveProperty('access-control-allow-origin');
  });
});

describe('answers', () => {
  it.each([
    ['an address of the API that is not there', 404, 'not-found', '/api/v1/nothing', 'get', ''],
    ['a body that is not JSON', 400, 'bad-request', accountPaths.session, 'post', '{'],
    ['a body that is missing', 400, 'bad-input', accountPaths.session, 'post', undefined],
    ['a body that is too large', 413, 'too-large', accountPaths.session, 'post', 'x'.repeat(3e5)],
  ] as const)('to %s are problems', async (_what, status, type, url, method, body) => {
    const answer = await app.agent()[method](url).type('application/json').send(body);
    expect(answer.status).toBe(status);
    expect(answer.type).toBe('application/problem+json');
    expect(problemSchema.parse(answer.body)).toMatchObject({ status, type });
  });

  it('to a failure tell the caller nothing and the log everything', async () => {
    const broken = await makeApp({
      logger: pino({}, { write: (line) => logLines.push(line) }),
    });
    try {
      await broken.knex.raw('ALTER TABLE accounts RENAME TO elsewhere');
      const body = { email: 'who@stillpier.test', password: PASSWORD };
      const answer = await broken.agent().post(accountPaths.session).send(body).expect(500);
      expect(problemSchema.parse(answer.body).type).toBe('internal');
      expect(JSON.stringify(answer.body)).not.toContain('relation');
      expect(logLines.join('')).toContain('relation \\"accounts\\" does not exist');
    } finally {
      await broken.close();
    }
  });

  it('allow pages to load from us alone', async () => {
    const { headers } = await app.agent().get('/rigs').set('accept', 'text/html');
    const policy = String(headers['content-security-policy']);
    expect(policy).toContain("default-src 'self';script-src 'self';");
    expect(policy).not.toMatch(/script-src[^;]*unsafe/);
    expect(policy).not.toMatch(/https?:|\*/);
    expect(headers).not.toHaveProperty('x-powered-by');
  });

  it('are kept by no shared cache', async () => {
    const { headers } = await app.agent().get(accountPaths.session);
    expect(headers['cache-control']).toBe('private, no-cache');
  });

  it('leave cookies and bodies out of the log', async () => {
    const agent = await app.signedIn('log@stillpier.test');
    await agent.get(accountPaths.account).expect(200);
    const log = logLines.join('');
    expect(log).toContain(`"method":"GET","url":"${accountPaths.account}"`);
    expect(log).toContain('"res":{"status":200}');
    expect(log).not.toContain('stillpier-session=');
    expect(log).not.toContain(PASSWORD);
  });
});

describe('the client', () => {
  const page = (url: string) => app.agent().get(url).set('accept', 'text/html,*/*;q=0.8');

  it('gets its first page for every address of a page, with a nonce of that answer', async () => {
    const answers = [await page('/'), await page('/rigs/1/nights'), await page('/index.html')];
    const nonces = answers.map(({ status, text, headers }) => {
      expect(status).toBe(200);
      const nonce = /<app-root ngCspNonce="([^"]+)">/.exec(text)?.[1];
      expect(headers['content-security-policy']).toContain(`'nonce-${String(nonce)}'`);
      return nonce;
    });
    expect(new Set(nonces).size).toBe(nonces.length);
  });

  it('keeps files with a hash in their name for a year, and asks again for the others', async () => {
    const hashed = await app.agent().get('/main-ABCD1234.js').expect(200);
    expect(hashed.headers['cache-control']).toBe('public, max-age=31536000, immutable');
    expect(hashed.headers['content-encoding']).toBe('gzip');
    const other = await app.agent().get('/theme-boot.js').expect(200);
    expect(other.headers['cache-control']).toBe('no-cache');
  });

  it('gets no page in the place of a missing file or of an address of the API', async () => {
    expect((await page('/main-00000000.js')).status).toBe(404);
    expect((await page('/api/v1/nothing')).status).toBe(404);
    expect((await page('/../server/main.ts')).status).toBe(404);
    await app.agent().post('/rigs').expect(404);
  });
});

describe('the health of the process', () => {
  it('is alive, and ready while its database answers', async () => {
    expect((await app.agent().get('/healthz').expect(200)).body).toEqual({ alive: true });
    expect((await app.agent().get('/readyz').expect(200)).body).toEqual({ ready: true });
  });

  it('is not ready when its database is gone', async () => {
    const lost = await makeApp();
    await lost.knex.destroy();
    expect((await lost.agent().get('/readyz').expect(503)).body).toEqual({ ready: false });
    await lost.close();
  });
});

describe('sessions', () => {
  const expiry = async () => {
    const [row] = await app.knex('sessions').orderBy('expire', 'desc').limit(1);
    return (row as { expire: Date }).expire.getTime();
  };

  it('are prolonged by use, at most once an hour', async () => {
    const agent = await app.signedIn('hourly@stillpier.test');
    await app.knex('sessions').delete().where('accountId', 'is', null);
    const first = await expiry();
    const halfAnHourAgo = new Date(first - 1_800_000);
    await app.knex('sessions').update({ expire: halfAnHourAgo });
    await agent.get(accountPaths.account).expect(200);
    expect(await expiry()).toBe(halfAnHourAgo.getTime());

    const twoHoursAgo = new Date(first - 7_200_000);
    await app.knex('sessions').update({ expire: twoHoursAgo });
    await agent.get(accountPaths.account).expect(200);
    expect(await expiry()).toBeGreaterThanOrEqual(first);
  });

  it('end with their time', async () => {
    const agent = await app.signedIn('ended@stillpier.test');
    await app.knex('sessions').update({ expire: new Date(Date.now() - 1000) });
    await agent.get(accountPaths.account).expect(401);
  });

  it('are not made for who does not sign in', async () => {
    await app.knex('sessions').delete();
    await app.agent().get(accountPaths.session).expect(200);
    expect(await app.knex('sessions')).toEqual([]);
  });
});
