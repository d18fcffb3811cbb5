import { BaseModel } from '../database/base-model';

/** A sign-up whose address is not confirmed yet. */
export class SignUpModel extends BaseModel {
  static override readonly tableName = 'sign_ups';

  declare email: string;
  declare name: string;
  declare passwordHash: string;
  /** null until its e-mail is written: the token itself stands nowhere else. */
  declare tokenSha256: Buffer | null;
  declare expiresAt: Date;
  declare createdAt: Date;
}
