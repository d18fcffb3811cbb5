import type { LogImport } from '@stillpier/contract';
import type { Knex } from 'knex';
import { raw } from 'objection';
import { notFound } from '../http/app-error';
import { ImportModel } from './import-model';

/** An import with the evenings that its runs belong to. */
export type ImportWithNights = ImportModel & { readonly nights: string[] };

/** The imports of a rig, without their documents. */
export function importsOf(knex: Knex, rigId: string) {
  return ImportModel.query(knex)
    .where('imports.rigId', rigId)
    .modify('withoutDocument')
    .select(
      raw(`ARRAY(SELECT DISTINCT night::text FROM runs
                  WHERE runs.import_id = imports.id ORDER BY 1)`).as('nights'),
    );
}

export async function importById(
  knex: Knex,
  rigId: string,
  importId: string,
): Promise<ImportWithNights> {
  const found = await importsOf(knex, rigId)
    .findOne('imports.id', importId)
    .castTo<ImportWithNights | undefined>();
  if (!found) throw notFound('import');
  return found;
}

export function asLogImport(row: ImportWithNights, duplicate: boolean): LogImport {
  const { id, rigId, setupId, fileName, sizeBytes, sha256 } = row;
  const { state, progress, stage, error, attempt, refusedCount, nights } = row;
  return {
    ...{ id, rigId, setupId, fileName, sizeBytes, sha256 },
    ...{ state, progress, stage, error, attempt, refusedCount, nights, duplicate },
    lines: row.lineCount,
    frames: row.frameCount,
    createdAt: row.createdAt.toISOString(),
  };
}
