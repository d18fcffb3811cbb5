import type { PageQuery } from '@stillpier/contract';
import type { Knex } from 'knex';
import { badInput } from '../http/app-error';
import { importsOf, type ImportWithNights } from './import-query';

const CURSOR = /^(\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d\.\d{3}Z)_([0-9a-f-]{36})$/;

/**
 * A page of a rig's imports, newest first. The cursor names the last one that was seen by moment and id, so that what
 * comes or goes meanwhile neither repeats nor hides another; `created_at` is kept to the millisecond for that.
 */
export async function importPage(
  knex: Knex,
  rigId: string,
  { limit, cursor }: PageQuery,
): Promise<{ rows: ImportWithNights[]; next: string | null }> {
  const query = importsOf(knex, rigId);
  if (cursor !== undefined) {
    const [, createdAt, id] = CURSOR.exec(cursor) ?? [];
    if (createdAt === undefined || id === undefined) {
      throw badInput('The cursor is not one of ours.');
    }
    void query.whereRaw('(imports.created_at, imports.id) < (?, ?)', [createdAt, id]);
  }
  const rows = await query
    .orderBy('imports.createdAt', 'desc')
    .orderBy('imports.id', 'desc')
    .limit(limit + 1)
    .castTo<ImportWithNights[]>();
  const shown = rows.slice(0, limit);
  const last = shown.at(-1);
  const next = rows.length > limit && last ? `${last.createdAt.toISOString()}_${last.id}` : null;
  return { rows: shown, next };
}
