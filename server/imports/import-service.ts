import type { AnalysisDocument, LogImport, PageQuery, RetryImport } from '@stillpier/contract';
import type { Knex } from 'knex';
import { conflict, notFound } from '../http/app-error';
import { holdRig, recomputeNights } from '../nights/recompute-nights';
import { rigFor } from '../rigs/rig-access';
import { readChunks } from './import-chunks';
import { ImportModel } from './import-model';
import { importPage } from './import-page';
import { asLogImport, importById, importsOf, type ImportWithNights } from './import-query';
import { chooseSetup, startReading } from './start-reading';

const RECENT = 50;

export interface Original {
  readonly fileName: string;
  readonly sizeBytes: number;
  readonly bytes: AsyncIterable<Buffer>;
}

export class ImportService {
  constructor(private readonly knex: Knex) {}

  async list(
    accountId: string,
    rigId: string,
    query: PageQuery,
  ): Promise<{ items: LogImport[]; next: string | null }> {
    await rigFor(this.knex, accountId, rigId, 'see');
    const { rows, next } = await importPage(this.knex, rigId, query);
    return { items: rows.map((row) => asLogImport(row, false)), next };
  }

  /** What the import page shows when it opens: all that is unfinished, and the latest. */
  async recent(accountId: string, rigId: string): Promise<LogImport[]> {
    await rigFor(this.knex, accountId, rigId, 'see');
    const latest = ImportModel.query(this.knex)
      .where({ rigId })
      .orderBy('createdAt', 'desc')
      .limit(RECENT)
      .select('id');
    const rows = await importsOf(this.knex, rigId)
      .where((either) => {
        void either.whereIn('state', ['waiting', 'running']).orWhereIn('imports.id', latest);
      })
      .orderBy('createdAt')
      .castTo<ImportWithNights[]>();
    return rows.map((row) => asLogImport(row, false));
  }

  async some(accountId: string, rigId: string, importIds: string[]): Promise<LogImport[]> {
    await rigFor(this.knex, accountId, rigId, 'see');
    const rows = await importsOf(this.knex, rigId)
      .whereIn('imports.id', importIds)
      .castTo<ImportWithNights[]>();
    return rows.map((row) => asLogImport(row, false));
  }

  async one(accountId: string, rigId: string, importId: string): Promise<LogImport> {
    await rigFor(this.knex, accountId, rigId, 'see');
    return asLogImport(await importById(this.knex, rigId, importId), false);
  }

  /** Its original and its runs go with it, and its nights are summed up anew. */
  async remove(accountId: string, rigId: string, importId: string): Promise<void> {
    await rigFor(this.knex, accountId, rigId, 'upload');
    await this.knex.transaction(async (trx) => {
      await holdRig(trx, rigId);
      const { nights } = await importById(trx, rigId, importId);
      await ImportModel.query(trx).deleteById(importId);
      await recomputeNights(trx, rigId, nights);
    });
  }

  /** Reads the kept original again; what is not given stays as it was. The old runs stay until the new ones stand. */
  async readAgain(
    accountId: string,
    rigId: string,
    importId: string,
    changes: RetryImport,
  ): Promise<LogImport> {
    await rigFor(this.knex, accountId, rigId, 'upload');
    await this.knex.transaction(async (trx) => {
      const row = await ImportModel.query(trx).findOne({ id: importId, rigId }).forUpdate();
      if (!row) throw notFound('import');
      if (row.state === 'waiting' || row.state === 'running') {
        throw conflict('being-read', 'This file is being read already.');
      }
      const { setupId = row.setupId, map = row.map } = changes;
      const chosen = await chooseSetup(trx, rigId, setupId);
      await startReading(trx, row, { setupId: chosen, map, mail: null });
    });
    return this.one(accountId, rigId, importId);
  }

  async original(accountId: string, rigId: string, importId: string): Promise<Original> {
    const { fileName, sizeBytes } = await this.one(accountId, rigId, importId);
    return { fileName, sizeBytes, bytes: readChunks(this.knex, { id: importId, sizeBytes }) };
  }

  async document(
    accountId: string,
    rigId: string,
    importId: string,
  ): Promise<{ fileName: string; document: AnalysisDocument }> {
    await rigFor(this.knex, accountId, rigId, 'see');
    const row = await ImportModel.query(this.knex)
      .findOne({ id: importId, rigId })
      .select('fileName', 'document');
    if (!row?.document) throw notFound('document');
    return { fileName: row.fileName, document: row.document };
  }
}
