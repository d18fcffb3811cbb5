import { type TOKEN_MAILS, type TOKEN_SCOPES } from '@stillpier/contract';
import { BaseModel } from '../database/base-model';

/** A key that a program of its owner's signs in with. The key itself is kept nowhere. */
export class AccessTokenModel extends BaseModel {
  static override readonly tableName = 'access_tokens';

  declare accountId: string;
  declare name: string;
  declare scope: (typeof TOKEN_SCOPES)[number];
  declare mails: (typeof TOKEN_MAILS)[number];
  declare tokenSha256: Buffer;
  declare expiresAt: Date;
  declare lastUsedAt: Date | null;
  declare createdAt: Date;
}
