import nodemailer from 'nodemailer';
import { pino } from 'pino';
import { configurationOrExit } from './configuration';
import { makeKnex } from './database/connection';
import { startWorker } from './jobs/start-worker';
import { taskList } from './jobs/task-list';
import { onStop } from './lifecycle';
import { senderOf } from './mail/send-mail-task';

const SWEEP_MS = 1000;
const GRACE_MS = 2000;

const configuration = configurationOrExit();
const { DATABASE_URL, SMTP_URL, PUBLIC_URL, MAIL_FROM, LOG_LEVEL } = configuration;
const logger = pino({ level: LOG_LEVEL });
const log = (message: string, error?: unknown): void => {
  if (error === undefined) logger.warn(message);
  else logger.error({ err: error }, message);
};
const knex = makeKnex(DATABASE_URL, 4);
const mail = {
  knex,
  transport: nodemailer.createTransport(SMTP_URL),
  publicUrl: PUBLIC_URL,
  sender: senderOf(PUBLIC_URL, MAIL_FROM),
};
const limits = {
  unpackedMib: configuration.UNPACKED_LIMIT_MIB,
  lines: configuration.LINE_LIMIT,
};
const worker = await startWorker({
  databaseUrl: DATABASE_URL,
  knex,
  tasks: taskList({ mail, limits, log }),
  sweepMs: SWEEP_MS,
  graceMs: GRACE_MS,
  log,
});
logger.info('the worker is ready');
process.send?.({ ready: true });

onStop(async () => {
  await worker.stop();
  await knex.destroy();
});
