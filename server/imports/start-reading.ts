import type { ColumnMap, TOKEN_MAILS } from '@stillpier/contract';
import type { Knex } from 'knex';
import { badInput } from '../http/app-error';
import { SetupModel } from '../setups/setup-model';
import { ImportModel } from './import-model';
import { announceImport } from './import-notices';

export const READ_LOG_TASK = 'read-log';
export const MOST_TRIES = 3;

/** The state of an import that waits for a worker. */
export const WAITING = {
  state: 'waiting',
  stage: 'Waiting for its turn',
  progress: 0,
  error: null,
  attempt: 0,
} as const;

/** Who is written to when a log that came by a token is read. */
export interface EndMail {
  readonly to: string;
  readonly when: (typeof TOKEN_MAILS)[number];
}

export interface ReadingChoice {
  readonly setupId: string | null;
  readonly map: ColumnMap | null;
  /** null: nobody, since who asked for it watches. */
  readonly mail: EndMail | null;
}

/**
 * Puts an import into the queue, in the transaction of the caller: the job exists if and only if the import stands. A
 * job of an earlier start that still runs may write no more, since the import names the new one.
 */
export async function startReading(
  trx: Knex.Transaction,
  { id, rigId }: Pick<ImportModel, 'id' | 'rigId'>,
  { setupId, map, mail }: ReadingChoice,
): Promise<void> {
  const jobs = await trx.raw<{ rows: { id: number }[] }>(
    'SELECT id FROM graphile_worker.add_job(?, ?::json, max_attempts => ?)',
    [READ_LOG_TASK, JSON.stringify({ importId: id }), MOST_TRIES],
  );
  const jobId = jobs.rows[0]?.id;
  if (jobId === undefined) throw new Error('The queue answered no job');
  await ImportModel.query(trx)
    .findById(id)
    .patch({
      ...WAITING,
      setupId,
      map,
      jobId,
      mailTo: mail?.to ?? null,
      mails: mail?.when ?? null,
    });
  await announceImport(trx, { rigId, importId: id });
}

/** The setup that was named, or the first of the rig; null when the rig has none. */
export async function chooseSetup(
  trx: Knex.Transaction,
  rigId: string,
  setupId: string | null,
): Promise<string | null> {
  const setups = SetupModel.query(trx).where({ rigId }).orderBy('createdAt').orderBy('id');
  if (setupId === null) return (await setups.first())?.id ?? null;
  if (!(await setups.findOne({ id: setupId }))) {
    const message = 'is not a setup of this rig';
    throw badInput('The setup cannot be used.', [{ path: 'setupId', message }]);
  }
  return setupId;
}
