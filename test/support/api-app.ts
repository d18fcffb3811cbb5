import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { accountPaths } from '@stillpier/contract';
import type { Express } from 'express';
import { Logger, runOnce } from 'graphile-worker';
import type { Knex } from 'knex';
import { type Logger as Log, pino } from 'pino';
import request from 'supertest';
import { buildApp } from '../../server/app';
import { readConfiguration } from '../../server/configuration';
import { makeKnex, makePool } from '../../server/database/connection';
import { NotifyHub } from '../../server/database/notify-hub';
import { type Allowances, STANDARD_ALLOWANCES } from '../../server/http/limits';
import { SEND_MAIL_TASK } from '../../server/mail/mail-queue';
import { type OutgoingMail, sendMailTask } from '../../server/mail/send-mail-task';
import { createTestDatabase, type TestDatabase } from './test-database';

export const PUBLIC_URL = 'http://stillpier.test';
export const PASSWORD = 'a quiet pier at night';
/** bcrypt's least: the specs test what is done, not how long it takes. */
const PASSWORD_ROUNDS = 4;

export type Agent = ReturnType<typeof request.agent>;

export interface TestApp {
  readonly databaseUrl: string;
  readonly knex: Knex;
  /** Where the application listens. */
  readonly baseUrl: string;
  /** The routes of the application, for the spec that compares them with their description. */
  readonly express: Express;
  /** A browser without a session. */
  agent(): Agent;
  /** Signs up and confirms; answers a browser without a session. */
  signedUp(email: string): Promise<Agent>;
  /** Signs up, confirms and signs in. */
  signedIn(email: string): Promise<Agent>;
  /** Lets the queue send what waits, and answers all mails to this address, oldest first. */
  mailsTo(email: string): Promise<OutgoingMail[]>;
  /** The token in the newest mail to this address. */
  tokenFor(email: string): Promise<string>;
  close(): Promise<void>;
}

export interface TestAppOptions {
  /** Allowances that a spec is about; all others are out of the way. */
  readonly allowances?: Partial<Allowances>;
  readonly webFolder?: string;
  readonly logger?: Log;
  readonly uploadLimitMib?: number;
  /** In place of a new database on the cluster of the run. */
  readonly database?: TestDatabase;
}

/** The real application on a database of its own, listening on a free port of loopback. */
export async function makeApp(options: TestAppOptions = {}): Promise<TestApp> {
  const database = options.database ?? (await createTestDatabase());
  const knex = makeKnex(database.url, 5);
  const pool = makePool(database.url, 3);
  const hub = new NotifyHub(database.url, 'imports');
  await hub.start();
  const app = buildApp({
    configuration: readConfiguration({
      DATABASE_URL: database.url,
      SMTP_URL: 'smtp://127.0.0.1:1',
      PUBLIC_URL,
      SESSION_SECRET: 'only for the tests, and long enough',
      NODE_ENV: 'test',
      UPLOAD_LIMIT_MIB: String(options.uploadLimitMib ?? 200),
    }),
    knex,
    pool,
    hub,
    logger: options.logger ?? pino({ level: 'silent' }),
    allowances: { ...outOfTheWay(), ...options.allowances },
    passwordRounds: PASSWORD_ROUNDS,
    webFolder: options.webFolder ?? null,
  });
  const server = createServer(app.express);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const baseUrl = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  const mails: OutgoingMail[] = [];

  const sendMail = sendMailTask({
    knex,
    publicUrl: PUBLIC_URL,
    sender: 'Stillpier <no-reply@stillpier.test>',
    transport: {
      sendMail: (mail) => Promise.resolve(mails.push(mail)),
    },
  });
  const deliver = () =>
    runOnce({
      pgPool: pool,
      taskList: { [SEND_MAIL_TASK]: sendMail },
      logger: new Logger(() => () => undefined),
      noHandleSignals: true,
    });
  let delivered = Promise.resolve();
  const mailsTo = async (email: string): Promise<OutgoingMail[]> => {
    // One delivery after the other: a job that another one holds would not be waited for.
    delivered = delivered.then(deliver);
    await delivered;
    return mails.filter(({ to }) => to === email);
  };
  const tokenFor = async (email: string): Promise<string> => tokenIn((await mailsTo(email)).at(-1));
  const signedUp = async (email: string): Promise<Agent> => {
    const agent = request.agent(baseUrl);
    const signUp = { email, name: 'A tester', password: PASSWORD };
    await agent.post(accountPaths.accounts).send(signUp).expect(202);
    const token = await tokenFor(email);
    await agent.post(accountPaths.confirmations).send({ token }).expect(201);
    return agent;
  };
  return {
    databaseUrl: database.url,
    knex,
    baseUrl,
    express: app.express,
    mailsTo,
    tokenFor,
    signedUp,
    agent: () => request.agent(baseUrl),
    signedIn: async (email) => {
      const agent = await signedUp(email);
      await agent.post(accountPaths.session).send({ email, password: PASSWORD }).expect(200);
      return agent;
    },
    close: async () => {
      app.close();
      server.closeAllConnections();
      await new Promise((resolve) => server.close(resolve));
      await Promise.all([hub.stop(), pool.end(), knex.destroy()]);
      await database.drop();
    },
  };
}

/** The token in the link of a mail. */
export function tokenIn(mail: OutgoingMail | undefined): string {
  const token = /#token=([\w-]+)/.exec(mail?.text ?? '')?.[1];
  if (token === undefined) throw new Error('There is no link with a token in this mail.');
  return token;
}

function outOfTheWay(): Allowances {
  const entries = Object.keys(STANDARD_ALLOWANCES).map((name) => [
    name,
    { tries: 1_000_000, seconds: 60 },
  ]);
  return Object.fromEntries(entries) as Allowances;
}
