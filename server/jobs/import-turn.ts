import type { Job } from 'graphile-worker';
import type { Knex } from 'knex';
import type { PartialModelObject } from 'objection';
import { mailImportEnd } from '../imports/import-mails';
import { ImportModel } from '../imports/import-model';
import { announceImport } from '../imports/import-notices';
import { MOST_TRIES } from '../imports/start-reading';

const MS_BETWEEN_REPORTS = 200;

type ImportEnd = PartialModelObject<ImportModel> & { readonly state: 'done' | 'failed' };

/** Another worker has taken the import over, or it was removed or started anew: this run has no more say. */
export class TakenOverError extends Error {}

/**
 * One try of one worker at one import. Every write names the job and the try that it belongs to, so that a run which
 * was taken over, however late it wakes, changes nothing.
 */
export class ImportTurn {
  #reportedAt = -Infinity;
  #stage = '';

  private constructor(
    private readonly knex: Knex,
    readonly row: ImportModel,
  ) {}

  /** null when there is nothing to do: done already, removed, or the job of an earlier start. */
  static async begin(knex: Knex, importId: string, job: Job): Promise<ImportTurn | null> {
    const row = await ImportModel.query(knex)
      .where({ id: importId, jobId: job.id })
      .where('attempt', '<=', job.attempts)
      .whereIn('state', ['waiting', 'running'])
      .patch({ state: 'running', attempt: job.attempts, stage: 'Opening the file', progress: 0 })
      .returning('*')
      .first();
    if (!row) return null;
    await announceImport(knex, { rigId: row.rigId, importId: row.id });
    return new ImportTurn(knex, row);
  }

  get isLast(): boolean {
    return this.row.attempt >= MOST_TRIES;
  }

  /** Writes in the transaction of the caller. */
  async write(knex: Knex, changes: PartialModelObject<ImportModel>): Promise<void> {
    const { id, rigId, jobId, attempt } = this.row;
    const written = await ImportModel.query(knex)
      .where({ id, jobId, attempt, state: 'running' })
      .patch(changes);
    if (written === 0) throw new TakenOverError(`import ${id}, try ${attempt}`);
    await announceImport(knex, { rigId, importId: id });
  }

  /** Says how far the work is, at most five times a second unless a new stage begins. */
  async report(progress: number, stage: string): Promise<void> {
    const isSoon = performance.now() - this.#reportedAt < MS_BETWEEN_REPORTS;
    if (isSoon && stage === this.#stage) return;
    this.#stage = stage;
    this.#reportedAt = performance.now();
    await this.write(this.knex, { progress, stage });
  }

  async fail(sentence: string): Promise<void> {
    await this.knex.transaction(async (trx) => {
      await this.end(trx, { state: 'failed', stage: 'Failed', error: sentence });
    });
  }

  /** The last write: whoever is to be told that the import ended is told once, if and only if this stands. */
  async end(trx: Knex.Transaction, changes: ImportEnd): Promise<void> {
    await this.write(trx, changes);
    await mailImportEnd(trx, this.row, changes.state);
  }

  async waitAgain(stage: string): Promise<void> {
    await this.write(this.knex, { state: 'waiting', stage, progress: 0 });
  }
}
