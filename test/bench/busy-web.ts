import { spawn } from 'node:child_process';
import { once } from 'node:events';
import path from 'node:path';
import {
  accountPaths,
  importPaths,
  logImportSchema,
  rigPaths,
  rigSchema,
} from '@stillpier/contract';
import { AccountModel } from '../../server/accounts/account-model';
import { Passwords } from '../../server/accounts/passwords';
import { makeKnex } from '../../server/database/connection';
import { migrateDatabase } from '../../server/database/migrate-database';
import { startThrowawayCluster } from '../../server/local/cluster.mjs';
import { ensurePostgres } from '../../server/local/postgres-programs.mjs';
import { EXAMPLE_RIG, guideCsv } from '../support/example-rig';

// How long a small GET takes while three large logs are sent and read: the web process must stay responsive.
const IMPORTS = 3;
const FRAMES = 200_000;
const BUDGET_MS = 100;
const WORKERS = 1;
const ALONE = 300;
const EMAIL = 'bench@stillpier.test';
const PASSWORD = 'a quiet pier at night';
const KIND = { email: EMAIL, name: 'A bench', kind: 'member' } as const;

/** Made beforehand: while they are made this process hears no answer. */
const logs = Array.from({ length: IMPORTS }, (_, i) => {
  const start = new Date(Date.UTC(2026, 2, 1 + 10 * i)).toISOString();
  return new Blob([guideCsv(FRAMES, i, start)]);
});
const cluster = await startThrowawayCluster(ensurePostgres(), path.resolve('.local'));
process.once('exit', cluster.stop);
await migrateDatabase(cluster.url);
const knex = makeKnex(cluster.url, 1);
const passwordHash = await new Passwords(4).hash(PASSWORD);
await AccountModel.query(knex).insert({ ...KIND, passwordHash });
await knex.destroy();

const children = await Promise.all(['main', ...Array<string>(WORKERS).fill('worker')].map(start));
try {
  const baseUrl = `http://127.0.0.1:${children[0]?.port ?? 0}`;
  const ask = await signedIn(baseUrl);
  const rig = await ask(rigPaths.all, JSON.stringify(EXAMPLE_RIG), 'application/json');
  const rigId = rigSchema.parse(await rig.json()).id;
  for (let count = 0; count < ALONE; count++) await timedGet(ask); // warming up
  const alone: number[] = [];
  for (let count = 0; count < ALONE; count++) alone.push(await timedGet(ask));

  const start = performance.now();
  let seconds: number | undefined;
  void Promise.all(logs.map((log) => imported(ask, rigId, log))).then(() => {
    seconds = (performance.now() - start) / 1000;
  });
  const meanwhile: number[] = [];
  while (seconds === undefined) meanwhile.push(await timedGet(ask));
  console.log(
    `busy-web: ${IMPORTS} imports of ${FRAMES} frames in ${seconds.toFixed(1)} s; small GETs meanwhile (${meanwhile.length}): ` +
      `${spread(meanwhile)} (budget: p99 ${BUDGET_MS} ms); before, alone: ${spread(alone)}`,
  );
} finally {
  for (const { child } of children) {
    child.kill('SIGTERM');
    await once(child, 'exit');
  }
}

/** A process as the start command runs it. */
async function start(entry: string) {
  const child = spawn(process.execPath, ['--import', 'tsx', `server/${entry}.ts`], {
    stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
    env: {
      ...process.env,
      TSX_TSCONFIG_PATH: 'server/tsconfig.json',
      DATABASE_URL: cluster.url,
      SMTP_URL: 'smtp://127.0.0.1:1',
      PUBLIC_URL: 'http://127.0.0.1',
      PORT: '0',
      SESSION_SECRET: 'only for the bench, and long enough',
      LOG_LEVEL: 'error',
    },
  });
  const [message] = (await once(child, 'message')) as [{ readonly port?: number }];
  return { child, port: message.port };
}

type Ask = (address: string, body?: BodyInit, type?: string) => Promise<Response>;

async function signedIn(baseUrl: string): Promise<Ask> {
  const session = await fetch(`${baseUrl}${accountPaths.session}`, {
    method: 'POST',
    headers: { 'Content-Type': 'application/json' },
    body: JSON.stringify({ email: EMAIL, password: PASSWORD }),
  });
  const cookie = session.headers.getSetCookie().map((each) => each.split(';')[0]);
  return (address, body, type) =>
    fetch(`${baseUrl}${address}`, {
      method: body === undefined ? 'GET' : 'POST',
      headers: { Cookie: cookie.join('; '), ...(type !== undefined && { 'Content-Type': type }) },
      ...(body !== undefined && { body }),
    });
}

async function timedGet(ask: Ask): Promise<number> {
  const asked = performance.now();
  await (await ask(rigPaths.all)).json();
  return performance.now() - asked;
}

function spread(milliseconds: readonly number[]): string {
  const sorted = [...milliseconds].sort((a, b) => a - b);
  const at = (share: number) => (sorted[Math.floor(share * (sorted.length - 1))] ?? NaN).toFixed(1);
  return `median ${at(0.5)} ms, p99 ${at(0.99)} ms, longest ${at(1)} ms`;
}

async function imported(ask: Ask, rigId: string, log: Blob): Promise<void> {
  const form = new FormData();
  form.append('file', log, 'night.csv');
  const sent = await ask(importPaths.all(rigId), form);
  const { id } = logImportSchema.parse(await sent.json());
  for (;;) {
    const now = await ask(importPaths.one(rigId, id));
    const { state } = logImportSchema.parse(await now.json());
    if (state === 'done') return;
    if (state === 'failed') throw new Error(`import ${id} failed`);
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
}
