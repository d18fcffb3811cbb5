import { readdirSync } from 'node:fs';
import path from 'node:path';
import { expect, it } from 'vitest';
import { makeKnex } from '../../server/database/connection';
import { migrateDatabase } from '../../server/database/migrate-database';
import { migrations } from '../../server/database/migration-index';
import { createTestDatabase } from '../support/test-database';

const names = readdirSync(path.resolve('migrations')).map((file) => path.parse(file).name);

it('are all in the index', () => {
  expect(Object.keys(migrations).sort()).toEqual(names.sort());
});

it('can be taken back and applied again, by two starts at once', async () => {
  const database = await createTestDatabase();
  const knex = makeKnex(database.url, 2);
  try {
    expect(await migrateDatabase(database.url)).toEqual([]);
    for (const name of [...names].sort().reverse()) await migrations[name]?.down?.(knex);
    await knex('knexMigrations').delete();
    const applied = await Promise.all([
      migrateDatabase(database.url),
      migrateDatabase(database.url),
    ]);
    expect(applied.map((list) => list.length).sort()).toEqual([0, names.length].sort());
  } finally {
    await knex.destroy();
    await database.drop();
  }
});
