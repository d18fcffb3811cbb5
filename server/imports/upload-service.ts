import { randomUUID } from 'node:crypto';
import type { LogImport } from '@stillpier/contract';
import type { Request, Response } from 'express';
import type { Knex } from 'knex';
import { conflict } from '../http/app-error';
import { rigFor } from '../rigs/rig-access';
import { removeChunks } from './import-chunks';
import { ImportModel } from './import-model';
import { asLogImport, importById } from './import-query';
import { receiveFile, type ReceivedFile, refuseTooLarge } from './receive-file';
import { chooseSetup, type EndMail, startReading, WAITING } from './start-reading';
import { Turns } from './turns';

/** An upload holds a connection as long as it lasts: slow ones must leave some for everybody else. */
const UPLOADS_AT_ONCE = 4;

export interface Sender {
  readonly accountId: string;
  /** When to write to them: null for a person, who watches the page. */
  readonly mails: EndMail['when'] | null;
}

export class UploadService {
  private readonly turns = new Turns(UPLOADS_AT_ONCE);

  constructor(
    private readonly knex: Knex,
    private readonly limitMib: number,
  ) {}

  /**
   * Takes a file in: original, import and job in one transaction. A file that the rig has already answers the import
   * of then as a duplicate; if that one failed it is tried anew with the new options.
   */
  async receive(
    { accountId, mails }: Sender,
    rigId: string,
    req: Request,
    res: Response,
  ): Promise<LogImport> {
    await rigFor(this.knex, accountId, rigId, 'upload');
    refuseTooLarge(req, this.limitMib);
    const outcome = await this.turns.take(() =>
      this.knex.transaction(async (trx) => {
        const id = randomUUID();
        const file = await receiveFile(trx, id, this.limitMib, req, res);
        const mail = mails && { to: accountId, when: mails };
        return this.keep(trx, { id, rigId, uploadedBy: accountId }, mail, file);
      }),
    );
    return asLogImport(await importById(this.knex, rigId, outcome.importId), outcome.duplicate);
  }

  private async keep(
    trx: Knex.Transaction,
    owner: Pick<ImportModel, 'id' | 'rigId' | 'uploadedBy'>,
    mail: EndMail | null,
    { options, ...file }: ReceivedFile,
  ): Promise<{ importId: string; duplicate: boolean }> {
    const setupId = await chooseSetup(trx, owner.rigId, options.setupId);
    // Of two uploads of one file at once the second waits here until the first stands.
    const kept: unknown[] = await trx('imports')
      .insert({ ...owner, ...file, ...WAITING })
      .onConflict(['rigId', 'sha256'])
      .ignore()
      .returning('id');
    if (kept.length > 0) {
      await startReading(trx, owner, { setupId, map: options.map, mail });
      return { importId: owner.id, duplicate: false };
    }
    await removeChunks(trx, owner.id);
    const earlier = await ImportModel.query(trx)
      .findOne({ rigId: owner.rigId, sha256: file.sha256 })
      .forUpdate();
    if (!earlier) throw conflict('import-removed', 'This file was just removed: send it again.');
    if (earlier.state !== 'failed') return { importId: earlier.id, duplicate: true };
    await startReading(trx, earlier, { setupId, map: options.map, mail });
    return { importId: earlier.id, duplicate: false };
  }
}
