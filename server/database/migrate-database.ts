import { runMigrations } from 'graphile-worker';
import type { Knex } from 'knex';
import pg from 'pg';
import { makeKnex, makePool } from './connection';
import { migrations } from './migration-index';

class IndexedMigrations implements Knex.MigrationSource<string> {
  getMigrations(): Promise<string[]> {
    return Promise.resolve(Object.keys(migrations).sort());
  }

  getMigrationName(name: string): string {
    return name;
  }

  getMigration(name: string): Promise<Knex.Migration> {
    const migration = migrations[name];
    if (!migration) throw new Error(`There is no migration ${name}`);
    return Promise.resolve(migration);
  }
}

/** Brings the database to the newest version and answers the names of what was applied. */
export async function migrateDatabase(databaseUrl: string): Promise<string[]> {
  const knex = makeKnex(databaseUrl, 2);
  const pool = makePool(databaseUrl, 2);
  const holder = new pg.Client({ connectionString: databaseUrl });
  try {
    // Two starts at once take turns. This lock dies with its connection, so that a migration that
    // was killed never leaves the database locked: knex's own lock, a row, is freed behind it.
    await holder.connect();
    await holder.query('SELECT pg_advisory_lock(7200, 1)');
    await runMigrations({ pgPool: pool }); // the queue first: ours may use it
    const config = { migrationSource: new IndexedMigrations() };
    await knex.migrate.list(config); // makes the bookkeeping tables
    await knex.migrate.forceFreeMigrationsLock(config);
    const [, applied] = (await knex.migrate.latest(config)) as [number, string[]];
    return applied;
  } finally {
    await Promise.all([holder.end(), pool.end(), knex.destroy()]);
  }
}
