import knexFactory, { type Knex } from 'knex';
import { knexSnakeCaseMappers } from 'objection';
import pg from 'pg';

// int8 comes as a string; every count and size here fits a double.
pg.types.setTypeParser(pg.types.builtins.INT8, Number);
// A date is a day of the calendar and no instant of this process's time zone.
pg.types.setTypeParser(pg.types.builtins.DATE, String);

/** Queries in camelCase, columns in snake_case: the mapping stands here and nowhere else. */
export function makeKnex(databaseUrl: string, maxConnections: number): Knex {
  return knexFactory({
    client: 'pg',
    connection: { connectionString: databaseUrl, application_name: 'stillpier' },
    pool: { min: 0, max: maxConnections },
    asyncStackTraces: false,
    ...knexSnakeCaseMappers(),
  });
}

/** For what speaks plain SQL: the session store, the limits and the queue. */
export function makePool(databaseUrl: string, maxConnections: number): pg.Pool {
  const pool = new pg.Pool({
    connectionString: databaseUrl,
    max: maxConnections,
    application_name: 'stillpier',
  });
  // Without these handlers a connection that the server drops takes the process down.
  pool.on('error', (error) => {
    console.error('A database connection was lost.', error.message);
  });
  pool.on('connect', (client) => {
    client.on('error', () => undefined);
  });
  return pool;
}
