import { accountPages } from '@stillpier/contract';
import type { Knex } from 'knex';
import type { Letter } from '../mail/mail-layout';
import type { MailJob } from '../mail/mail-queue';
import { AccountModel } from './account-model';
import { CONFIRM_HOURS, makeMailToken, RESET_HOURS } from './mail-token';
import { PasswordResetModel } from './password-reset-model';
import { SignUpModel } from './sign-up-model';

/** The letter of a job, with a token of its own; null when there is nobody to write to any more. */
export function writeAccountMail(
  knex: Knex,
  publicUrl: string,
  job: Exclude<MailJob, { kind: 'import-ended' }>,
): Promise<Letter | null> {
  return job.kind === 'sign-up'
    ? writeSignUpMail(knex, publicUrl, job.signUpId)
    : writePasswordResetMail(knex, publicUrl, job.email);
}

async function writeSignUpMail(
  knex: Knex,
  publicUrl: string,
  signUpId: string,
): Promise<Letter | null> {
  const signUp = await SignUpModel.query(knex).findById(signUpId);
  if (!signUp) return null;
  const { email } = signUp;
  const account = await AccountModel.query(knex).findOne({ email });
  if (account) {
    await SignUpModel.query(knex).deleteById(signUpId);
    return alreadyHasAccount(email, `${publicUrl}${accountPages.signIn}`);
  }
  const { token, sha256, expiresAt } = makeMailToken(CONFIRM_HOURS);
  await SignUpModel.query(knex).findById(signUpId).patch({ tokenSha256: sha256, expiresAt });
  return confirmAddress(email, `${publicUrl}${accountPages.confirm(token)}`);
}

async function writePasswordResetMail(
  knex: Knex,
  publicUrl: string,
  email: string,
): Promise<Letter | null> {
  const account = await AccountModel.query(knex).findOne({ email });
  if (!account) return null;
  const { token, sha256, expiresAt } = makeMailToken(RESET_HOURS);
  await PasswordResetModel.query(knex).delete().where('expiresAt', '<', new Date());
  await PasswordResetModel.query(knex).insert({
    tokenSha256: sha256,
    accountId: account.id,
    expiresAt,
  });
  return resetPassword(email, `${publicUrl}${accountPages.resetPassword(token)}`);
}

function confirmAddress(to: string, url: string): Letter {
  return {
    to,
    subject: 'Confirm your address',
    paragraphs: [
      `Somebody signed up to Stillpier with ${to}. The account is ready once the address is confirmed.`,
      'The link works once, within three days.',
    ],
    action: { label: 'Confirm the address', url },
    closing: 'If it was not you, leave the link alone: nothing comes of it.',
  };
}

function alreadyHasAccount(to: string, url: string): Letter {
  return {
    to,
    subject: 'You have an account already',
    paragraphs: [
      `Somebody signed up to Stillpier with ${to}, and this address has an account.`,
      'Nothing was changed. If the password is lost, ask for a new one on the sign-in page.',
    ],
    action: { label: 'Sign in', url },
    closing: 'If it was not you, there is nothing to do.',
  };
}

function resetPassword(to: string, url: string): Letter {
  return {
    to,
    subject: 'Set a new password',
    paragraphs: [
      `Somebody asked for a new password for the account of ${to}.`,
      'The link works once, within one hour. A new password ends every session of the account.',
    ],
    action: { label: 'Set a new password', url },
    closing: 'If it was not you, leave the link alone: the old password stays.',
  };
}
