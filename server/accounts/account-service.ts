import type { Account } from '@stillpier/contract';
import type { Knex } from 'knex';
import type { Transaction } from 'objection';
import { AppError, badInput, unprocessable } from '../http/app-error';
import type { SignedInAccount } from '../http/signed-in';
import { enqueueMail } from '../mail/mail-queue';
import { AccountModel } from './account-model';
import { CONFIRM_HOURS, hoursFromNow, sha256Of } from './mail-token';
import type { Passwords } from './passwords';
import { PasswordResetModel } from './password-reset-model';
import { SignUpModel } from './sign-up-model';

interface SignUpFields {
  readonly email: string;
  readonly name: string;
  readonly password: string;
}

/** Accounts, from the sign-up to the new password. */
export class AccountService {
  constructor(
    private readonly knex: Knex,
    private readonly passwords: Passwords,
  ) {}

  /**
   * Keeps a sign-up and has its e-mail sent. Whether the address has an account already is looked
   * up by the worker that writes the e-mail: neither the answer nor its time can tell it.
   */
  async signUp({ email, name, password }: SignUpFields): Promise<void> {
    const passwordHash = await this.passwords.hash(password);
    await SignUpModel.transaction(this.knex, async (trx) => {
      await SignUpModel.query(trx).delete().where('expiresAt', '<', new Date());
      const expiresAt = hoursFromNow(CONFIRM_HOURS);
      const signUp = await SignUpModel.query(trx).insert({ email, name, passwordHash, expiresAt });
      await enqueueMail(trx, { kind: 'sign-up', signUpId: signUp.id });
    });
  }

  /** Makes the account of a sign-up. The first account of an installation becomes its steward. */
  async confirm(token: string): Promise<Account> {
    return SignUpModel.transaction(this.knex, async (trx) => {
      // One confirmation at a time: two at once could both find no account yet.
      await trx.raw('SELECT pg_advisory_xact_lock(7200, 2)');
      const signUp = await takeSignUp(trx, token);
      await SignUpModel.query(trx).delete().where('email', signUp.email);
      const first = (await AccountModel.query(trx).resultSize()) === 0;
      const account = await AccountModel.query(trx).insertAndFetch({
        email: signUp.email,
        name: signUp.name,
        passwordHash: signUp.passwordHash,
        kind: first ? 'steward' : 'member',
      });
      return toAccount(account);
    });
  }

  /** The account with this address and password; null when they do not belong together. */
  async checkPassword(email: string, password: string): Promise<SignedInAccount | null> {
    const [account, signUp] = await Promise.all([
      AccountModel.query(this.knex).findOne({ email }),
      SignUpModel.query(this.knex)
        .where({ email })
        .where('expiresAt', '>', new Date())
        .orderBy('createdAt', 'desc')
        .first(),
    ]);
    const hash = account?.passwordHash ?? signUp?.passwordHash;
    if (!(await this.passwords.matches(password, hash))) return null;
    if (account) return account;
    throw new AppError(
      403,
      'not-confirmed',
      'This address is not confirmed yet: open the link in the e-mail that was sent to it.',
    );
  }

  async rename(accountId: string, name: string): Promise<Account> {
    const account = await AccountModel.query(this.knex)
      .patchAndFetchById(accountId, { name })
      .throwIfNotFound();
    return toAccount(account);
  }

  /** Sets a new password; every session of the account but `keptSessionId` ends. */
  async changePassword(
    account: SignedInAccount,
    { currentPassword, newPassword }: { currentPassword: string; newPassword: string },
    keptSessionId: string,
  ): Promise<void> {
    if (!(await this.checkPassword(account.email, currentPassword))) {
      const message = 'is not the password of this account';
      throw badInput('The password was not changed.', [{ path: 'currentPassword', message }]);
    }
    const passwordHash = await this.passwords.hash(newPassword);
    await AccountModel.transaction(this.knex, async (trx) => {
      await AccountModel.query(trx).findById(account.id).patch({ passwordHash });
      await PasswordResetModel.query(trx).delete().where('accountId', account.id);
      await endSessions(trx, account.id).whereNot('sid', keptSessionId);
    });
  }

  /** As with a sign-up, the worker finds out whether there is such an account. */
  async requestPasswordReset(email: string): Promise<void> {
    await enqueueMail(this.knex, { kind: 'password-reset', email });
  }

  /** Sets the password of the account that the link was sent to, and ends all its sessions. */
  async resetPassword(token: string, password: string): Promise<void> {
    const passwordHash = await this.passwords.hash(password);
    await PasswordResetModel.transaction(this.knex, async (trx) => {
      const reset = await PasswordResetModel.query(trx)
        .findById(sha256Of(token))
        .where('expiresAt', '>', new Date())
        .forUpdate();
      if (!reset) throw spentLink('ask for a new one');
      const { accountId } = reset;
      await PasswordResetModel.query(trx).delete().where({ accountId });
      await AccountModel.query(trx).findById(accountId).patch({ passwordHash });
      await endSessions(trx, accountId);
    });
  }
}

export function toAccount({ id, email, name, kind, createdAt }: SignedInAccount): Account {
  return { id, email, name, kind, createdAt: createdAt.toISOString() };
}

async function takeSignUp(trx: Transaction, token: string): Promise<SignUpModel> {
  const signUp = await SignUpModel.query(trx)
    .findOne('tokenSha256', sha256Of(token))
    .where('expiresAt', '>', new Date());
  const known = signUp && (await AccountModel.query(trx).findOne('email', signUp.email));
  if (!signUp || known) throw spentLink('sign in, or sign up again');
  return signUp;
}

function spentLink(wayOn: string): AppError {
  return unprocessable('spent-link', `This link was used already or is too old: ${wayOn}.`);
}

function endSessions(trx: Transaction, accountId: string): Knex.QueryBuilder {
  return trx('sessions').where({ accountId }).delete();
}
