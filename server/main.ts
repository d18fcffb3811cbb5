import { createServer } from 'node:http';
import path from 'node:path';
import { pino } from 'pino';
import { buildApp } from './app';
import { configurationOrExit } from './configuration';
import { makeKnex, makePool } from './database/connection';
import { NotifyHub } from './database/notify-hub';
import { STANDARD_ALLOWANCES } from './http/limits';
import { IMPORT_CHANNEL } from './imports/import-notices';
import { onStop } from './lifecycle';

const PASSWORD_ROUNDS = 12;
const CLOSE_TIMEOUT_MS = 5000;
const REQUEST_TIMEOUT_MS = 3_600_000;

const configuration = configurationOrExit();
const logger = pino({ level: configuration.LOG_LEVEL });
const knex = makeKnex(configuration.DATABASE_URL, 10);
const pool = makePool(configuration.DATABASE_URL, 5);
const hub = new NotifyHub(configuration.DATABASE_URL, IMPORT_CHANNEL);
await hub.start();
const app = buildApp({
  configuration,
  knex,
  pool,
  hub,
  logger,
  allowances: STANDARD_ALLOWANCES,
  passwordRounds: PASSWORD_ROUNDS,
  webFolder: path.resolve('dist/web/browser'),
});
// Node's own five minutes are too short for a large log on a slow line.
const server = createServer({ requestTimeout: REQUEST_TIMEOUT_MS }, app.express);
const port = await new Promise<number>((resolve, reject) => {
  server.once('error', reject);
  server.listen(configuration.PORT, configuration.HOST, () => {
    const address = server.address();
    resolve(typeof address === 'object' && address ? address.port : configuration.PORT);
  });
});
logger.info({ port }, 'the web process is ready');
process.send?.({ ready: true, port });

onStop(async () => {
  const closed = new Promise<void>((resolve) => {
    server.close(() => {
      resolve();
    });
  });
  app.close();
  server.closeIdleConnections();
  setTimeout(() => {
    server.closeAllConnections();
  }, CLOSE_TIMEOUT_MS).unref();
  await closed;
  await Promise.all([hub.stop(), pool.end(), knex.destroy()]);
});
