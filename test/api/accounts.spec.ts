import {
  accountPaths,
  accountSchema,
  mailSentSchema,
  problemSchema,
  sessionSchema,
} from '@stillpier/contract';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makeApp, PASSWORD, PUBLIC_URL, type TestApp, tokenIn } from '../support/api-app';

let app: TestApp;
beforeAll(async () => {
  app = await makeApp();
  await app.signedUp('steward@stillpier.test');
});
afterAll(() => app.close());

const signUpOf = (email: string, password = PASSWORD) => ({ email, name: 'A tester', password });
const sessionIds = () => app.knex('sessions').orderBy('sid').pluck<string[]>('sid');

describe('signing up', () => {
  it('makes the account once its address is confirmed, and then lets it in', async () => {
    const email = 'ada@stillpier.test';
    const agent = app.agent();
    await agent.post(accountPaths.accounts).send(signUpOf('Ada@Stillpier.test')).expect(202);

    const refused = await agent
      .post(accountPaths.session)
      .send({ email, password: PASSWORD })
      .expect(403);
    expect(problemSchema.parse(refused.body)).toMatchObject({ type: 'not-confirmed' });

    const token = await app.tokenFor(email);
    const confirmed = await agent.post(accountPaths.confirmations).send({ token }).expect(201);
    expect(accountSchema.parse(confirmed.body)).toMatchObject({ email, kind: 'member' });

    await agent.post(accountPaths.session).send({ email, password: PASSWORD }).expect(200);
    const session = await agent.get(accountPaths.session).expect(200);
    expect(sessionSchema.parse(session.body).account?.email).toBe(email);
  });

  it('makes the first account of an installation its steward', async () => {
    const agent = app.agent();
    const body = { email: 'steward@stillpier.test', password: PASSWORD };
    const session = await agent.post(accountPaths.session).send(body).expect(200);
    expect(sessionSchema.parse(session.body).account?.kind).toBe('steward');
  });

  it('has one steward even when two first accounts are confirmed at once', async () => {
    const empty = await makeApp();
    try {
      const emails = ['first@stillpier.test', 'second@stillpier.test'];
      for (const email of emails)
        await empty.agent().post(accountPaths.accounts).send(signUpOf(email)).expect(202);
      const tokens = await Promise.all(emails.map((email) => empty.tokenFor(email)));
      const answers = await Promise.all(
        tokens.map((token) => empty.agent().post(accountPaths.confirmations).send({ token })),
      );
      const kinds = answers.map(({ body }) => accountSchema.parse(body).kind);
      expect(kinds.sort()).toEqual(['member', 'steward']);
    } finally {
      await empty.close();
    }
  });

  it('takes a confirmation once only, also when it comes twice at once', async () => {
    const email = 'twice@stillpier.test';
    await app.agent().post(accountPaths.accounts).send(signUpOf(email)).expect(202);
    const token = await app.tokenFor(email);
    const confirm = () => app.agent().post(accountPaths.confirmations).send({ token });
    const statuses = (await Promise.all([confirm(), confirm()])).map(({ status }) => status);
    expect(statuses.sort()).toEqual([201, 422]);
    expect((await confirm()).status).toBe(422);
  });

  it('refuses a confirmation after its time', async () => {
    const email = 'late@stillpier.test';
    await app.agent().post(accountPaths.accounts).send(signUpOf(email)).expect(202);
    const token = await app.tokenFor(email);
    const past = new Date(Date.now() - 1000);
    await app.knex('signUps').where({ email }).update({ expiresAt: past });
    const late = await app.agent().post(accountPaths.confirmations).send({ token }).expect(422);
    expect(problemSchema.parse(late.body).type).toBe('spent-link');
  });

  it('confirms what was typed with the link, whoever else used the address', async () => {
    const email = 'squatted@stillpier.test';
    await app.agent().post(accountPaths.accounts).send(signUpOf(email)).expect(202);
    const ownToken = await app.tokenFor(email);
    const foreign = signUpOf(email, 'what a stranger typed');
    await app.agent().post(accountPaths.accounts).send(foreign).expect(202);
    const foreignToken = await app.tokenFor(email);
    expect(foreignToken).not.toBe(ownToken);

    await app.agent().post(accountPaths.confirmations).send({ token: ownToken }).expect(201);
    await app.agent().post(accountPaths.confirmations).send({ token: foreignToken }).expect(422);
    const stranger = { email, password: 'what a stranger typed' };
    await app.agent().post(accountPaths.session).send(stranger).expect(401);
    await app.agent().post(accountPaths.session).send({ email, password: PASSWORD }).expect(200);
  });

  it('answers alike for an address that has an account, and tells only its owner', async () => {
    const known = await app
      .agent()
      .post(accountPaths.accounts)
      .send(signUpOf('steward@stillpier.test'));
    const unknown = await app
      .agent()
      .post(accountPaths.accounts)
      .send(signUpOf('new@stillpier.test'));
    expect([known.status, mailSentSchema.parse(known.body)]).toEqual([
      unknown.status,
      mailSentSchema.parse(unknown.body),
    ]);
    const mail = (await app.mailsTo('steward@stillpier.test')).at(-1);
    expect(mail?.subject).toContain('You have an account already');
    expect(mail?.text).not.toContain('#token=');
  });

  it('names each field that cannot be used', async () => {
    const body = { email: 'nobody', name: ' ', password: 'short', kind: 'steward' };
    const refused = await app.agent().post(accountPaths.accounts).send(body).expect(400);
    expect(refused.type).toBe('application/problem+json');
    const paths = problemSchema.parse(refused.body).errors?.map(({ path }) => path);
    expect(paths?.sort()).toEqual(['', 'email', 'name', 'password']);
  });
});

describe('the e-mails', () => {
  it('say the same as text and as HTML, and fetch nothing', async () => {
    const email = 'mail@stillpier.test';
    await app.agent().post(accountPaths.accounts).send(signUpOf(email)).expect(202);
    const mail = (await app.mailsTo(email)).at(-1);
    const link = `${PUBLIC_URL}/confirm#token=${tokenIn(mail)}`;
    expect(mail?.text).toContain(link);
    expect(mail?.html).toContain(`href="${link}"`);
    expect(mail?.html).not.toMatch(/<img|<link|<script|url\(|@import/);
  });

  it('leave no token in the database or the queue', async () => {
    const email = 'secret@stillpier.test';
    await app.agent().post(accountPaths.accounts).send(signUpOf(email)).expect(202);
    const jobs = await app.knex.raw<{ rows: object[] }>(
      'SELECT payload FROM graphile_worker._private_jobs',
    );
    expect(jobs.rows).toHaveLength(1);
    expect(JSON.stringify(jobs.rows)).not.toContain('token');
    const token = await app.tokenFor(email);
    const rows = await app.knex('signUps').where({ email });
    expect(rows).toHaveLength(1);
    expect(JSON.stringify(rows)).not.toContain(token);
  });
});

describe('signing in', () => {
  it('gives a new session id, and ends the session before it', async () => {
    const agent = await app.signedIn('ids@stillpier.test');
    const before = await sessionIds();
    const body = { email: 'ids@stillpier.test', password: PASSWORD };
    await agent.post(accountPaths.session).send(body).expect(200);
    const after = await sessionIds();
    expect(after).toHaveLength(before.length);
    expect(after.filter((id) => !before.includes(id))).toHaveLength(1);
  });

  it('answers alike for a wrong password and for an unknown address', async () => {
    await app.signedUp('alike@stillpier.test');
    const agent = app.agent();
    const wrong = { email: 'alike@stillpier.test', password: 'not the password' };
    const unknown = { ...wrong, email: 'no-such@stillpier.test' };
    const answers = [
      await agent.post(accountPaths.session).send(wrong).expect(401),
      await agent.post(accountPaths.session).send(unknown).expect(401),
    ];
    expect(answers[0]!.body).toEqual(answers[1]!.body);
    expect(answers.map(({ headers }) => headers['set-cookie'])).toEqual([undefined, undefined]);
  });

  it('does not tell a wrong password that the address waits for its confirmation', async () => {
    const email = 'waiting@stillpier.test';
    await app.agent().post(accountPaths.accounts).send(signUpOf(email)).expect(202);
    const wrong = { email, password: 'not the password' };
    const refused = await app.agent().post(accountPaths.session).send(wrong).expect(401);
    expect(problemSchema.parse(refused.body).type).toBe('wrong-credentials');
  });

  it('keeps the cookie from scripts and from other sites, and 30 days only when asked', async () => {
    const agent = await app.signedUp('cookie@stillpier.test');
    const body = { email: 'cookie@stillpier.test', password: PASSWORD };
    const cookieOf = async (stay: boolean) => {
      const answer = await agent.post(accountPaths.session).send({ ...body, stay });
      return String(answer.headers['set-cookie']);
    };
    const short = await cookieOf(false);
    expect(short).toMatch(/; HttpOnly; SameSite=Lax$/);
    expect(short).not.toContain('Expires');
    const expires = /Expires=([^;]+)/.exec(await cookieOf(true))?.[1] ?? '';
    const days = (Date.parse(expires) - Date.now()) / 86_400_000;
    expect(days).toBeGreaterThan(29.9);
    expect(days).toBeLessThan(30.1);
  });

  it('ends with signing out, for the cookie of before as well', async () => {
    const agent = await app.signedUp('out@stillpier.test');
    const body = { email: 'out@stillpier.test', password: PASSWORD };
    const signedIn = await agent.post(accountPaths.session).send(body).expect(200);
    const cookie = String(signedIn.headers['set-cookie']).split(';')[0]!;
    await agent.delete(accountPaths.session).expect(204);
    await agent.get(accountPaths.account).expect(401);
    await app.agent().get(accountPaths.account).set('Cookie', cookie).expect(401);
  });
});

describe('the own account', () => {
  it('is refused to who is not signed in', async () => {
    const agent = app.agent();
    expect((await agent.get(accountPaths.session).expect(200)).body).toEqual({ account: null });
    await agent.get(accountPaths.account).expect(401);
    await agent.patch(accountPaths.account).send({ name: 'x' }).expect(401);
    const change = { currentPassword: PASSWORD, newPassword: PASSWORD };
    await agent.put(accountPaths.password).send(change).expect(401);
  });

  it('can be renamed', async () => {
    const agent = await app.signedIn('name@stillpier.test');
    await agent.patch(accountPaths.account).send({ name: ' A new name ' }).expect(200);
    const account = accountSchema.parse((await agent.get(accountPaths.account)).body);
    expect(account.name).toBe('A new name');
  });

  it('keeps its password when the current one is wrong', async () => {
    const agent = await app.signedIn('keep@stillpier.test');
    const change = { currentPassword: 'not the password', newPassword: 'another long one' };
    const refused = await agent.put(accountPaths.password).send(change).expect(400);
    expect(problemSchema.parse(refused.body).errors?.[0]?.path).toBe('currentPassword');
  });

  it('ends its other sessions when its password changes', async () => {
    const email = 'change@stillpier.test';
    const agent = await app.signedIn(email);
    const other = app.agent();
    await other.post(accountPaths.session).send({ email, password: PASSWORD }).expect(200);
    const change = { currentPassword: PASSWORD, newPassword: 'another long one' };
    await agent.put(accountPaths.password).send(change).expect(204);
    await agent.get(accountPaths.account).expect(200);
    await other.get(accountPaths.account).expect(401);
    await other.post(accountPaths.session).send({ email, password: PASSWORD }).expect(401);
  });

  it('takes its sessions with it when it goes', async () => {
    const agent = await app.signedIn('gone@stillpier.test');
    await app.knex('accounts').where({ email: 'gone@stillpier.test' }).delete();
    await agent.get(accountPaths.account).expect(401);
  });
});

describe('resetting a password', () => {
  const newPassword = 'the new password';

  it('sets it once by the link, and ends every session', async () => {
    const email = 'reset@stillpier.test';
    const agent = await app.signedIn(email);
    await app.agent().post(accountPaths.passwordResets).send({ email }).expect(202);
    const body = { token: await app.tokenFor(email), password: newPassword };
    await app.agent().put(accountPaths.passwordResets).send(body).expect(204);
    await agent.get(accountPaths.account).expect(401);
    await agent.post(accountPaths.session).send({ email, password: PASSWORD }).expect(401);
    await agent.post(accountPaths.session).send({ email, password: newPassword }).expect(200);
    await app.agent().put(accountPaths.passwordResets).send(body).expect(422);
  });

  it('refuses a link after its time', async () => {
    const email = 'reset-late@stillpier.test';
    await app.signedUp(email);
    await app.agent().post(accountPaths.passwordResets).send({ email }).expect(202);
    const token = await app.tokenFor(email);
    await app.knex('passwordResets').update({ expiresAt: new Date(Date.now() - 1000) });
    const body = { token, password: newPassword };
    await app.agent().put(accountPaths.passwordResets).send(body).expect(422);
  });

  it('answers alike for an unknown address, and sends nothing', async () => {
    await app.signedUp('reset-known@stillpier.test');
    const ask = (email: string) => app.agent().post(accountPaths.passwordResets).send({ email });
    const known = await ask('reset-known@stillpier.test');
    const unknown = await ask('reset-unknown@stillpier.test');
    expect([known.status, known.body]).toEqual([unknown.status, unknown.body]);
    expect(await app.mailsTo('reset-unknown@stillpier.test')).toEqual([]);
  });
});
