// npm start: everything from nothing to one address. Node's own modules only: node_modules may be missing.
import { randomBytes } from 'node:crypto';
import { chmodSync, existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { freePort, startCluster } from './cluster.mjs';
import { ensureDependencies } from './dependencies.mjs';
import { explain, log, UserError } from './log.mjs';
import { ensurePostgres } from './postgres-programs.mjs';
import { runOnce, Services } from './services.mjs';

const PREFERRED_PORT = 3000;
const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../..');
const localFolder = path.join(root, '.local');
const services = new Services(root);
let cluster;
let stopping = false;

function sessionSecret() {
  const file = path.join(localFolder, 'session-secret');
  if (!existsSync(file))
    writeFileSync(file, randomBytes(32).toString('base64url'), { mode: 0o600 });
  return readFileSync(file, 'utf8');
}

async function databaseUrl() {
  if (process.env.DATABASE_URL) return process.env.DATABASE_URL;
  const base = path.join(localFolder, 'database');
  cluster = await startCluster({ base, programs: ensurePostgres() });
  return cluster.url;
}

/** The port that was asked for, or the usual one, or (only where none was asked for) a free one. */
async function webPort() {
  const wanted = Number(process.env.PORT ?? PREFERRED_PORT);
  const port = await freePort(wanted);
  if (process.env.PORT && wanted !== 0 && port !== wanted)
    throw new UserError(
      `Port ${wanted} is in use: set PORT to another one, or leave it out to get a free one.`,
    );
  if (port !== wanted) log(`port ${wanted} is in use: taking ${port}`);
  return port;
}

async function start() {
  mkdirSync(localFolder, { recursive: true });
  chmodSync(localFolder, 0o711); // the database's account passes through
  await ensureDependencies(root);
  const { buildAll } = await import('./build.mjs');
  const building = buildAll(root);
  building.catch(() => undefined); // it is awaited below, after the database
  const url = await databaseUrl();
  await building;

  const port = await webPort();
  const publicUrl = process.env.PUBLIC_URL ?? `http://127.0.0.1:${port}`;
  const env = {
    NODE_ENV: 'production',
    LOG_LEVEL: 'warn',
    ...process.env,
    DATABASE_URL: url,
    SESSION_SECRET: process.env.SESSION_SECRET ?? sessionSecret(),
    PORT: String(port),
    PUBLIC_URL: publicUrl,
  };
  await runOnce(services, 'dist/server/migrate.js', env);
  if (!env.SMTP_URL) {
    const mail = await services.start('mail catcher', 'dist/server/mail-catcher.js', {
      ...env,
      MAIL_FOLDER: path.join(localFolder, 'mails'),
      MAIL_SMTP_PORT: String(await freePort(1025)),
      MAIL_PAGE_PORT: String(await freePort(1080)),
    });
    env.SMTP_URL = `smtp://127.0.0.1:${mail.smtpPort}`;
    env.LOCAL_MAIL_URL = `http://127.0.0.1:${mail.pagePort}`;
  }
  const workers = Number(process.env.WORKERS ?? 1);
  await Promise.all([
    services.start('web', 'dist/server/main.js', env),
    ...Array.from({ length: workers }, (_, i) =>
      services.start(`worker ${i + 1}`, 'dist/server/worker.js', env),
    ),
  ]);
  if (!stopping) process.stdout.write(`Stillpier is ready: ${publicUrl}\n`);
}

async function stop(code, why) {
  if (stopping) {
    services.kill(); // a second Ctrl-C
    return;
  }
  stopping = true;
  log(`stopping (${why})`);
  await services.stop();
  try {
    cluster?.stop();
  } catch (error) {
    log(`the database could not be stopped: ${error.message}`);
    process.exit(1);
  }
  log('stopped');
  process.exit(code);
}

services.onFailure = (why) => void stop(1, why);
for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'])
  process.on(signal, () => void stop(0, signal));
// when npm itself is killed with -9 only the change of parent shows it
if (process.env.npm_lifecycle_event) {
  const parent = process.ppid;
  setInterval(() => {
    if (process.ppid !== parent) void stop(0, 'npm is gone');
  }, 500).unref();
}

try {
  await start();
} catch (error) {
  if (!stopping) {
    log(explain(error));
    await stop(1, 'the start failed');
  }
}
