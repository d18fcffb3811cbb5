import { importPages } from '@stillpier/contract';
import type { Knex } from 'knex';
import { AccountModel } from '../accounts/account-model';
import type { Letter } from '../mail/mail-layout';
import { enqueueMail } from '../mail/mail-queue';
import { rigsOf } from '../rigs/rig-access';
import type { ImportModel } from './import-model';
import { importsOf, type ImportWithNights } from './import-query';

/** Queues the e-mail that tells who sent a log by a token what became of it, in the transaction of its end. */
export async function mailImportEnd(
  trx: Knex.Transaction,
  { id, mailTo, mails }: Pick<ImportModel, 'id' | 'mailTo' | 'mails'>,
  state: 'done' | 'failed',
): Promise<void> {
  if (mailTo === null || (mails === 'failed' && state === 'done')) return;
  await enqueueMail(trx, { kind: 'import-ended', importId: id, accountId: mailTo });
}

/** null when there is nothing to tell any more: no member, no import, or one that is being read anew. */
export async function writeImportMail(
  knex: Knex,
  publicUrl: string,
  { importId, accountId }: { readonly importId: string; readonly accountId: string },
): Promise<Letter | null> {
  const account = await AccountModel.query(knex).findById(accountId);
  const rig = await rigsOf(knex, accountId)
    .join('imports', 'imports.rigId', 'rigs.id')
    .findOne('imports.id', importId);
  if (!account || !rig) return null;
  const row = await importsOf(knex, rig.id)
    .findOne('imports.id', importId)
    .castTo<ImportWithNights | undefined>();
  const about = { rigId: rig.id, rigName: rig.name, to: account.email, publicUrl };
  if (row?.state === 'done') return wasRead(about, row);
  return row?.state === 'failed' ? couldNotBeRead(about, row) : null;
}

interface About {
  readonly to: string;
  readonly publicUrl: string;
  readonly rigId: string;
  readonly rigName: string;
}

const CLOSING =
  'A token of your account sent this log. The page of your account says when such e-mails come.';

function wasRead({ to, publicUrl, rigId, rigName }: About, row: ImportWithNights): Letter {
  const { fileName, frameCount, refusedCount, nights } = row;
  const refused = refusedCount ? ` ${refusedCount} of its lines could not be used.` : '';
  const night = nights.at(-1);
  const page = night === undefined ? importPages.all(rigId) : importPages.night(rigId, night);
  return {
    to,
    subject: `${rigName}: a log was read`,
    paragraphs: [`${fileName} was read: ${frameCount ?? 0} frames.${refused}`],
    action: { label: 'See the night', url: `${publicUrl}${page}` },
    closing: CLOSING,
  };
}

function couldNotBeRead({ to, publicUrl, rigId, rigName }: About, row: ImportWithNights): Letter {
  return {
    to,
    subject: `${rigName}: a log could not be read`,
    paragraphs: [
      `${row.fileName} could not be read. ${row.error ?? ''}`,
      'The file is kept as it was sent, and can be read again with another column map.',
    ],
    action: { label: 'See the logs of the rig', url: `${publicUrl}${importPages.all(rigId)}` },
    closing: CLOSING,
  };
}
