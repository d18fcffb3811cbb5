import type { Task } from 'graphile-worker';
import type { Knex } from 'knex';
import { writeAccountMail } from '../accounts/account-mails';
import { writeImportMail } from '../imports/import-mails';
import { type LaidOutMail, layOutMail, type Letter } from './mail-layout';
import { type MailJob, mailJobSchema } from './mail-queue';

export interface OutgoingMail extends LaidOutMail {
  readonly from: string;
  readonly to: string;
}

export interface MailParts {
  readonly knex: Knex;
  /** As nodemailer makes it. */
  readonly transport: { sendMail(mail: OutgoingMail): Promise<unknown> };
  /** Where the links lead to. */
  readonly publicUrl: string;
  readonly sender: string;
}

/** The `send-mail` task of the queue. A mail server that is away makes the queue try again. */
export function sendMailTask({ knex, transport, publicUrl, sender }: MailParts): Task {
  return async (payload) => {
    const letter = await writeLetter(knex, publicUrl, mailJobSchema.parse(payload));
    if (!letter) return;
    await transport.sendMail({ from: sender, to: letter.to, ...layOutMail(letter) });
  };
}

function writeLetter(knex: Knex, publicUrl: string, job: MailJob): Promise<Letter | null> {
  return job.kind === 'import-ended'
    ? writeImportMail(knex, publicUrl, job)
    : writeAccountMail(knex, publicUrl, job);
}

/** The sender that stands in the environment, or one that is made from the public address. */
export function senderOf(publicUrl: string, mailFrom: string | undefined): string {
  const { hostname } = new URL(publicUrl);
  const domain = /[a-z]/i.test(hostname) && !hostname.startsWith('[') ? hostname : 'localhost';
  return mailFrom ?? `Stillpier <no-reply@${domain}>`;
}
