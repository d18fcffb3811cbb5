import type { Knex } from 'knex';
import { conflict, notFound } from '../http/app-error';
import { readChunks } from '../imports/import-chunks';
import { ImportModel } from '../imports/import-model';
import { importById, importsOf, type ImportWithNights } from '../imports/import-query';
import { NightModel } from '../nights/night-model';
import { rigFor } from '../rigs/rig-access';
import { type ArchiveEntry, archiveOf, safeName } from './archive';
import { framesCsv, hasFrames } from './stored-frames';

const ID_LETTERS = 8;

const NO_FRAMES =
  'The errors of this log are in guide pixels, and its setup tells no guide scale: there are no frames in arcseconds.';

export interface Export {
  readonly fileName: string;
  readonly content: AsyncIterable<string | Buffer>;
}

/** What leaves the house: frames as CSV, and whole logs as a ZIP. */
export class ExportService {
  constructor(private readonly knex: Knex) {}

  async frames(accountId: string, rigId: string, importId: string): Promise<Export> {
    await rigFor(this.knex, accountId, rigId, 'see');
    const { fileName, nights } = await importById(this.knex, rigId, importId);
    if (nights.length === 0) throw notFound('set of frames');
    if (!(await hasFrames(this.knex, importId))) throw conflict('no-frames', NO_FRAMES);
    return { fileName: `${stem(fileName)} frames.csv`, content: framesCsv(this.knex, importId) };
  }

  /** The whole logs that gave runs to the night. */
  async night(accountId: string, rigId: string, date: string): Promise<Export> {
    const rig = await rigFor(this.knex, accountId, rigId, 'see');
    const night = await NightModel.query(this.knex).findById([rigId, date]);
    if (!night) throw notFound('night');
    const logs = (await this.logs(rigId)).filter(({ nights }) => nights.includes(date));
    return { fileName: safeName(`${rig.name} ${date}.zip`), content: this.archive(logs) };
  }

  async rig(accountId: string, rigId: string): Promise<Export> {
    const rig = await rigFor(this.knex, accountId, rigId, 'see');
    const content = this.archive(await this.logs(rigId));
    return { fileName: safeName(`${rig.name}.zip`), content };
  }

  private async logs(rigId: string): Promise<ImportWithNights[]> {
    const rows = await importsOf(this.knex, rigId)
      .orderBy('imports.createdAt')
      .orderBy('imports.id')
      .castTo<ImportWithNights[]>();
    return rows.sort((a, b) => (a.nights[0] ?? '').localeCompare(b.nights[0] ?? ''));
  }

  private archive(logs: readonly ImportWithNights[]): AsyncIterable<Buffer> {
    return archiveOf(logs.flatMap((log) => this.entriesOf(log)));
  }

  private entriesOf(log: ImportWithNights): ArchiveEntry[] {
    const { id, fileName, nights, createdAt: changedAt } = log;
    const night = nights[0] ?? 'not read';
    const folder = `${night}/${safeName(fileName)} ${id.slice(0, ID_LETTERS)}`;
    const original = {
      ...{ name: `${folder}/original/${safeName(fileName)}`, changedAt },
      open: () => readChunks(this.knex, log),
    };
    if (nights.length === 0) return [original];
    return [
      original,
      { name: `${folder}/frames.csv`, changedAt, open: () => framesCsv(this.knex, id) },
      { name: `${folder}/analysis.json`, changedAt, open: () => this.document(id) },
    ];
  }

  private async *document(importId: string): AsyncGenerator<string> {
    const row = await ImportModel.query(this.knex).findById(importId).select('document');
    if (!row) throw new Error(`Import ${importId} was removed while it was sent`);
    yield `${JSON.stringify(row.document, null, 2)}\n`;
  }
}

function stem(fileName: string): string {
  return fileName.replace(/(\.(csv|txt|log|tsv))?(\.gz)?$/i, '');
}
