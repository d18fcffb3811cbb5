import { type ColumnMap } from '@stillpier/contract';
import { BaseModel } from '../database/base-model';

/** How one kind of file is read, on a rig or by a person: one of the two owns it. */
export class ColumnMapModel extends BaseModel {
  static override readonly tableName = 'column_maps';
  static override readonly jsonAttributes = ['headerCells', 'map'];
  declare rigId: string | null;
  declare accountId: string | null;
  declare name: string;
  /** null: every header line that has the columns which the map names. */
  declare headerCells: string[] | null;
  declare map: ColumnMap;
  declare createdAt: Date;
}
