import type { Knex } from 'knex';
import * as z from 'zod';

export const SEND_MAIL_TASK = 'send-mail';
/** With the waits of the queue, each longer than the one before, about a day of trying. */
const MAX_ATTEMPTS = 14;

/**
 * What the queue keeps of an e-mail: whom it is about, and never what is in it. Tokens are made
 * by the task that writes the e-mail, so that none lies in the queue.
 */
export const mailJobSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('sign-up'), signUpId: z.uuid() }),
  z.strictObject({ kind: z.literal('password-reset'), email: z.string() }),
  z.strictObject({ kind: z.literal('import-ended'), importId: z.uuid(), accountId: z.uuid() }),
]);
export type MailJob = z.infer<typeof mailJobSchema>;

/** Queues an e-mail; within a transaction it is sent if and only if that is kept. */
export async function enqueueMail(knex: Knex, job: MailJob): Promise<void> {
  await knex.raw('SELECT graphile_worker.add_job(?, ?::json, max_attempts => ?)', [
    SEND_MAIL_TASK,
    JSON.stringify(job),
    MAX_ATTEMPTS,
  ]);
}
