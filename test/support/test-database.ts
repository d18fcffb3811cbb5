import { randomBytes } from 'node:crypto';
import pg from 'pg';
import { inject } from 'vitest';

export interface TestDatabase {
  readonly url: string;
  drop(): Promise<void>;
}

/** A database of one test file's own: a clone of the migrated template. */
export async function createTestDatabase(): Promise<TestDatabase> {
  const name = `test_${randomBytes(6).toString('hex')}`;
  await run(`CREATE DATABASE ${name} TEMPLATE template_stillpier STRATEGY file_copy`);
  return { url: urlOf(name), drop: () => run(`DROP DATABASE ${name} WITH (FORCE)`) };
}

function urlOf(database: string): string {
  return inject('databaseUrlPattern').replace('DATABASE', database);
}

async function run(sql: string): Promise<void> {
  const client = new pg.Client({ connectionString: urlOf('stillpier') });
  await client.connect();
  try {
    await client.query(sql);
  } finally {
    await client.end();
  }
}
