import { setTimeout as sleep } from 'node:timers/promises';
import pg from 'pg';

/** Class of the advisory locks that living worker pools hold, each on its own id. */
const LOCK_CLASS = 7201;

const POOLS_WITHOUT_LOCK = `
  SELECT DISTINCT jobs.locked_by AS "poolId"
    FROM graphile_worker.jobs
   WHERE jobs.locked_by IS NOT NULL AND NOT EXISTS (
     SELECT 1 FROM pg_locks
      WHERE locktype = 'advisory' AND granted AND objsubid = 2
        AND database = (SELECT oid FROM pg_database WHERE datname = current_database())
        AND classid::bigint = ${LOCK_CLASS}
        AND objid::bigint = (hashtext(jobs.locked_by)::bigint & 4294967295))`;

export interface PresenceOptions {
  readonly databaseUrl: string;
  readonly poolId: string;
  readonly sweepMs: number;
  readonly log: (message: string) => void;
  /** Called after each sweep. */
  readonly afterSweep: () => Promise<void>;
}

/**
 * Shows that this worker lives, and gives back the jobs of those that do not. The queue itself would keep a killed
 * worker's job for four hours. Each worker process holds an advisory lock that PostgreSQL drops with its connection; a
 * pool that has jobs and no lock, twice running, is dead. The lock hangs on a connection and not on a timer: a process
 * that computes for seconds stays present.
 */
export class WorkerPresence {
  #stopped = false;
  #running: Promise<void> | undefined;

  constructor(private readonly options: PresenceOptions) {}

  start(): void {
    this.#running = this.#keepPresent();
  }

  async stop(): Promise<void> {
    this.#stopped = true;
    await this.#running;
  }

  async #keepPresent(): Promise<void> {
    while (!this.#stopped) {
      try {
        await this.#watch();
      } catch (error) {
        this.options.log(`Presence was interrupted: ${String(error)}`);
        await sleep(100); // soon: the other workers are counting
      }
    }
  }

  /** One connection's life: the lock, then sweep after sweep. */
  async #watch(): Promise<void> {
    const client = new pg.Client({
      connectionString: this.options.databaseUrl,
      keepAlive: true,
      application_name: 'stillpier-presence',
    });
    const lost = new Promise<void>((resolve) => {
      client.on('error', () => {
        resolve();
      });
      client.on('end', resolve);
    });
    try {
      await client.connect();
      await client.query('SELECT pg_advisory_lock($1::int, hashtext($2))', [
        LOCK_CLASS,
        this.options.poolId,
      ]);
      let suspects = new Set<string>();
      while (!this.#stopped) {
        suspects = await this.#sweep(client, suspects);
        await this.options.afterSweep();
        await Promise.race([sleep(this.options.sweepMs), lost]);
      }
    } finally {
      await client.end().catch(() => undefined); // it may be what was lost
    }
  }

  /** Once may be a worker that is reconnecting or was just born; twice running is none. */
  async #sweep(client: pg.Client, suspects: ReadonlySet<string>): Promise<Set<string>> {
    const { rows } = await client.query<{ poolId: string }>(POOLS_WITHOUT_LOCK);
    const now = rows.map(({ poolId }) => poolId);
    const dead = now.filter((poolId) => suspects.has(poolId));
    if (dead.length > 0) {
      await client.query('SELECT graphile_worker.force_unlock_workers($1::text[])', [dead]);
      // Wakes idle workers at once, as the queue does for a new job.
      await client.query(`SELECT pg_notify('jobs:insert', '{"r":"sweep","count":1}')`);
      this.options.log(`Gave back the jobs of ${dead.join(', ')}`);
    }
    return new Set(now);
  }
}
