import type { Knex } from 'knex';
import * as accounts from '../../migrations/20260901090000-create-accounts';

/**
 * Every migration by name. Static imports, since they work alike from TypeScript and from the
 * bundle, and names without an extension, since knex stores them. A test compares the list with
 * the folder.
 */
export const migrations: Record<string, Knex.Migration> = {
  '20260901090000-create-accounts': accounts,
};
