import type { Knex } from 'knex';
import * as accounts from '../../migrations/20260901090000-create-accounts';
import * as rigs from '../../migrations/20260901100000-create-rigs';
import * as imports from '../../migrations/20260901110000-create-imports';
import * as nights from '../../migrations/20260901120000-create-nights';
import * as accessTokens from '../../migrations/20260902090000-create-access-tokens';
import * as byHandEntries from '../../migrations/20260902100000-create-by-hand-entries';
import * as correctionUnit from '../../migrations/20260902110000-keep-the-correction-unit';
import * as ownColumnMaps from '../../migrations/20260902120000-let-people-have-column-maps';

/**
 * Every migration by name. Static imports, since they work alike from TypeScript and from the
 * bundle, and names without an extension, since knex stores them. A test compares the list with
 * the folder.
 */
export const migrations: Record<string, Knex.Migration> = {
  '20260901090000-create-accounts': accounts,
  '20260901100000-create-rigs': rigs,
  '20260901110000-create-imports': imports,
  '20260901120000-create-nights': nights,
  '20260902090000-create-access-tokens': accessTokens,
  '20260902100000-create-by-hand-entries': byHandEntries,
  '20260902110000-keep-the-correction-unit': correctionUnit,
  '20260902120000-let-people-have-column-maps': ownColumnMaps,
};
