import { BaseModel } from '../database/base-model';

/** Somebody who has confirmed an e-mail address. */
export class AccountModel extends BaseModel {
  static override readonly tableName = 'accounts';

  declare email: string;
  declare name: string;
  declare kind: 'member' | 'steward';
  declare passwordHash: string;
  declare createdAt: Date;
}
