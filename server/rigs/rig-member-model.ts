import { Model } from 'objection';
import { type RigRole } from './rig-model';

export class RigMemberModel extends Model {
  static override readonly tableName = 'rig_members';
  static override readonly idColumn = ['rigId', 'accountId'];
  declare rigId: string;
  declare accountId: string;
  declare role: RigRole;
  declare createdAt: Date;
}
