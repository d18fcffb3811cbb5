import {
  type AnalysisDocument,
  type ColumnMap,
  type IMPORT_STATES,
  type TOKEN_MAILS,
} from '@stillpier/contract';
import { type QueryBuilder } from 'objection';
import { BaseModel } from '../database/base-model';

/** A log file of a rig and what became of it. Its bytes are in `import_chunks`. */
export class ImportModel extends BaseModel {
  static override readonly tableName = 'imports';
  static override readonly jsonAttributes = ['map', 'document'];
  declare rigId: string;
  declare setupId: string | null;
  declare uploadedBy: string | null;
  /** Who is written to when it is read, and when: a log that a person sends is watched and tells nobody. */
  declare mailTo: string | null;
  declare mails: (typeof TOKEN_MAILS)[number] | null;
  declare fileName: string;
  declare sizeBytes: number;
  declare sha256: string;
  declare map: ColumnMap | null;
  declare state: (typeof IMPORT_STATES)[number];
  declare progress: number;
  declare stage: string;
  declare error: string | null;
  /** Of the queue: only this job may write results. */
  declare jobId: number | null;
  declare attempt: number;
  declare lineCount: number | null;
  declare frameCount: number | null;
  declare refusedCount: number | null;
  declare document: AnalysisDocument | null;
  declare analysisVersion: string | null;
  declare createdAt: Date;

  static override readonly modifiers = {
    /** Leaves the document in the database. */
    withoutDocument: (query: QueryBuilder<ImportModel>) =>
      query.select(
        ...[
          'id',
          'rigId',
          'setupId',
          'fileName',
          'sizeBytes',
          'sha256',
          'map',
          'state',
          'progress',
          'stage',
          'error',
          'attempt',
          'lineCount',
          'frameCount',
          'refusedCount',
          'createdAt',
        ].map((column) => `imports.${column}`),
      ),
  };
}
