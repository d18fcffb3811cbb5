import type { Knex } from 'knex';
import { mailImportEnd } from '../imports/import-mails';
import { ImportModel } from '../imports/import-model';
import { announceImport } from '../imports/import-notices';

const SENTENCE =
  'The program that read this file was stopped each time before it was done; the file may be too much for it.';

/**
 * Fails the imports that no worker will take up again: their job is gone, or its tries are used up and nobody works on
 * it. That happens when every try ended by the worker's own death, which then could not say so itself.
 */
export async function failAbandonedImports(knex: Knex): Promise<void> {
  await knex.transaction(async (trx) => {
    const abandoned = await ImportModel.query(trx)
      .whereIn('state', ['waiting', 'running'])
      .whereNotExists(
        trx('graphile_worker.jobs')
          .whereRaw('jobs.id = imports.job_id')
          .whereRaw('(jobs.locked_at IS NOT NULL OR jobs.attempts < jobs.max_attempts)')
          .select(trx.raw('1')),
      )
      .patch({ state: 'failed', stage: 'Failed', error: SENTENCE })
      .returning('*');
    for (const row of abandoned) {
      await announceImport(trx, { rigId: row.rigId, importId: row.id });
      await mailImportEnd(trx, row, 'failed');
    }
  });
}
