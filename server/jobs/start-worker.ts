import { EventEmitter } from 'node:events';
import { Logger, run, type TaskList, type WorkerEvents } from 'graphile-worker';
import type { Knex } from 'knex';
import { makePool } from '../database/connection';
import { failAbandonedImports } from './abandoned-imports';
import { WorkerPresence } from './worker-presence';

/** Of the queue's own messages; the others tell of every job. */
const LOGGED_LEVELS = new Set<string>(['error', 'warning']);

export interface WorkerOptions {
  readonly databaseUrl: string;
  readonly knex: Knex;
  readonly tasks: TaskList;
  /** How often a worker looks for the jobs of the dead. */
  readonly sweepMs: number;
  /** How long a job may go on once the worker is told to stop. */
  readonly graceMs: number;
  readonly log: (message: string, error?: unknown) => void;
}

export interface Worker {
  /** Lets the current job end or gives it back; it is not counted as a try. */
  stop(): Promise<void>;
}

/** One worker: one job at a time, since each keeps a processor busy. More workers are more processes. */
export async function startWorker(options: WorkerOptions): Promise<Worker> {
  const { databaseUrl, knex, tasks, sweepMs, log } = options;
  const pool = makePool(databaseUrl, 4);
  const events = new EventEmitter() as WorkerEvents;
  let poolId = '';
  let isStopping = false;
  /** Jobs that were begun and not ended, by id: how often they had been tried before. */
  const begun = new Map<string, number>();
  events.on('pool:create', ({ workerPool }) => (poolId = workerPool.id));
  events.on('job:start', ({ job }) => begun.set(job.id, job.attempts - 1));
  events.on('job:success', ({ job }) => begun.delete(job.id));
  events.on('job:error', ({ job }) => {
    if (!isStopping) begun.delete(job.id);
  });

  const runner = await run({
    pgPool: pool,
    taskList: tasks,
    concurrency: 1,
    pollInterval: 1000,
    noHandleSignals: true,
    events,
    preset: { worker: { gracefulShutdownAbortTimeout: options.graceMs } },
    logger: new Logger(() => (level, message) => {
      if (LOGGED_LEVELS.has(level)) log(message);
    }),
  });
  runner.promise.catch((error: unknown) => {
    log('The queue ended', error);
  });
  const presence = new WorkerPresence({
    ...{ databaseUrl, poolId, sweepMs, log },
    afterSweep: () => failAbandonedImports(knex),
  });
  presence.start();

  return {
    stop: async () => {
      isStopping = true;
      await runner.stop();
      // The queue counts an interrupted run as a failed try and delays the next one: undo both. Unlocked first, since
      // it may still be about to fail a job that did not hear in time.
      await pool.query('SELECT graphile_worker.force_unlock_workers(ARRAY[$1])', [poolId]);
      for (const [id, attempts] of begun) {
        await pool.query(
          'SELECT graphile_worker.reschedule_jobs(ARRAY[$1::bigint], run_at => now(), attempts => $2::int)',
          [id, attempts],
        );
      }
      await presence.stop();
      await pool.end();
    },
  };
}
