import type { Knex } from 'knex';
import * as z from 'zod';

/** PostgreSQL's channel on which every change of an import is told to all web processes. */
export const IMPORT_CHANNEL = 'imports';

export const importNoticeSchema = z.object({ rigId: z.uuid(), importId: z.uuid() });
export type ImportNotice = z.infer<typeof importNoticeSchema>;

/** Tells that an import has changed; inside a transaction it is told when that stands. */
export async function announceImport(knex: Knex, { rigId, importId }: ImportNotice): Promise<void> {
  await knex.raw('SELECT pg_notify(?, ?)', [IMPORT_CHANNEL, JSON.stringify({ rigId, importId })]);
}
