import { inspect } from 'node:util';
import { setTimeout as sleep } from 'node:timers/promises';
import { importPaths, type LogImport, logImportSchema } from '@stillpier/contract';
import { makeKnex } from '../../server/database/connection';
import { startWorker } from '../../server/jobs/start-worker';
import { READ_LOG_TASK } from '../../server/imports/start-reading';
import { readLogTask } from '../../server/jobs/read-log-task';
import type { ReadingLimits } from '../../server/jobs/reading-limits';
import { type Agent, type TestApp } from './api-app';

const STANDARD_LIMITS: ReadingLimits = { unpackedMib: 800, lines: 2_000_000 };

export interface TestWorker {
  readonly logged: string[];
  stop(): Promise<void>;
}

/** The real worker within the process of the spec; what it logs is kept. Mails are left to `TestApp.mailsTo`. */
export async function startTestWorker(
  app: TestApp,
  limits: ReadingLimits = STANDARD_LIMITS,
): Promise<TestWorker> {
  const logged: string[] = [];
  const log = (message: string, error?: unknown): void => {
    logged.push(error === undefined ? message : `${message}: ${inspect(error)}`);
  };
  const knex = makeKnex(app.databaseUrl, 4);
  const worker = await startWorker({
    databaseUrl: app.databaseUrl,
    knex,
    tasks: { [READ_LOG_TASK]: readLogTask({ knex, limits, log }) },
    sweepMs: 200,
    graceMs: 1,
    log,
  });
  return {
    logged,
    stop: async () => {
      await worker.stop();
      await knex.destroy();
    },
  };
}

/** Sends a file as a browser does; options go before it. */
export function upload(
  agent: Agent,
  rigId: string,
  name: string,
  file: string | Buffer,
  options?: object,
) {
  const request = agent.post(importPaths.all(rigId));
  if (options) void request.field('options', JSON.stringify(options));
  return request.attach('file', Buffer.from(file), name);
}

/** The import once it is done or failed. */
export async function finished(agent: Agent, rigId: string, importId: string): Promise<LogImport> {
  for (;;) {
    const answer = await agent.get(importPaths.one(rigId, importId)).expect(200);
    const now = logImportSchema.parse(answer.body);
    if (now.state === 'done' || now.state === 'failed') return now;
    await sleep(50);
  }
}

export async function uploaded(
  agent: Agent,
  rigId: string,
  name: string,
  file: string | Buffer,
  options?: object,
) {
  const answer = await upload(agent, rigId, name, file, options).expect(202);
  return finished(agent, rigId, logImportSchema.parse(answer.body).id);
}
