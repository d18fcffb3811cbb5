import { Model } from 'objection';

/** A link that was sent to somebody who has forgotten the password. */
export class PasswordResetModel extends Model {
  static override readonly tableName = 'password_resets';
  static override readonly idColumn = 'tokenSha256';

  declare tokenSha256: Buffer;
  declare accountId: string;
  declare expiresAt: Date;
}
