import { createHash, randomBytes } from 'node:crypto';
import type {
  AccessToken,
  createAccessTokenSchema,
  NewAccessToken,
  UpdateAccessToken,
} from '@stillpier/contract';
import type { Knex } from 'knex';
import type * as z from 'zod';
import { AccountModel } from '../accounts/account-model';
import { badInput, conflict, notFound } from '../http/app-error';
import type { BearerSignIn } from '../http/bearer';
import { AccessTokenModel } from './access-token-model';

const TOKEN_BYTES = 32;
/** So that a token which turns up where it should not can be recognised as one of ours. */
const PREFIX = 'stillpier_';
const MOST_TOKENS = 50;
/** A last use is noted to the minute: a program that polls must not write with every request. */
const NOTED_EVERY_MS = 60_000;

/** The tokens that an account gives to its programs. */
export class AccessTokenService {
  constructor(private readonly knex: Knex) {}

  async list(accountId: string): Promise<AccessToken[]> {
    const tokens = await AccessTokenModel.query(this.knex)
      .where({ accountId })
      .orderBy('createdAt')
      .orderBy('id');
    return tokens.map(asAccessToken);
  }

  async create(
    accountId: string,
    { expiresAt, ...token }: z.output<typeof createAccessTokenSchema>,
  ): Promise<NewAccessToken> {
    if (Date.parse(expiresAt) <= Date.now()) {
      const message = 'needs a time that is still to come';
      throw badInput('The token cannot be made.', [{ path: 'expiresAt', message }]);
    }
    const key = `${PREFIX}${randomBytes(TOKEN_BYTES).toString('base64url')}`;
    const id = await this.knex.transaction(async (trx) => {
      await AccountModel.query(trx).findById(accountId).forUpdate(); // two at once count each other
      const count = await AccessTokenModel.query(trx).where({ accountId }).resultSize();
      if (count >= MOST_TOKENS) {
        throw conflict(
          'too-many-tokens',
          `An account has at most ${MOST_TOKENS} tokens: revoke one.`,
        );
      }
      const made = await AccessTokenModel.query(trx).insert({
        ...{ ...token, accountId },
        ...{ expiresAt: new Date(expiresAt), tokenSha256: sha256Of(key) },
      });
      return made.id;
    });
    return { ...asAccessToken(await this.token(accountId, id)), token: key };
  }

  async update(
    accountId: string,
    tokenId: string,
    changes: UpdateAccessToken,
  ): Promise<AccessToken> {
    if (Object.keys(changes).length > 0) {
      await AccessTokenModel.query(this.knex).where({ id: tokenId, accountId }).patch(changes);
    }
    return asAccessToken(await this.token(accountId, tokenId));
  }

  async revoke(accountId: string, tokenId: string): Promise<void> {
    const revoked = await AccessTokenModel.query(this.knex)
      .delete()
      .where({ id: tokenId, accountId });
    if (revoked === 0) throw notFound('token');
  }

  /** Who a token speaks for; null for one that was revoked, has expired or never was. */
  async signIn(key: string): Promise<BearerSignIn | null> {
    const token = await AccessTokenModel.query(this.knex)
      .findOne({ tokenSha256: sha256Of(key) })
      .where('expiresAt', '>', new Date());
    const account = token && (await AccountModel.query(this.knex).findById(token.accountId));
    if (!token || !account) return null;
    const noted = token.lastUsedAt?.getTime() ?? -Infinity;
    if (noted < Date.now() - NOTED_EVERY_MS) {
      await AccessTokenModel.query(this.knex).findById(token.id).patch({ lastUsedAt: new Date() });
    }
    const { id, email, name, kind, createdAt } = account;
    const { scope, mails } = token;
    return { account: { id, email, name, kind, createdAt }, tokenId: token.id, scope, mails };
  }

  private async token(accountId: string, tokenId: string): Promise<AccessTokenModel> {
    const token = await AccessTokenModel.query(this.knex).findOne({ id: tokenId, accountId });
    if (!token) throw notFound('token');
    return token;
  }
}

function sha256Of(key: string): Buffer {
  return createHash('sha256').update(key).digest();
}

function asAccessToken(token: AccessTokenModel): AccessToken {
  const { id, name, scope, mails, expiresAt, lastUsedAt, createdAt } = token;
  return {
    ...{ id, name, scope, mails },
    expiresAt: expiresAt.toISOString(),
    lastUsedAt: lastUsedAt?.toISOString() ?? null,
    createdAt: createdAt.toISOString(),
  };
}
