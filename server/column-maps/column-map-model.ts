import { type ColumnMap } from '@stillpier/contract';
import { BaseModel } from '../database/base-model';

/** How one kind of file is read on a rig. */
export class ColumnMapModel extends BaseModel {
  static override readonly tableName = 'column_maps';
  static override readonly jsonAttributes = ['headerCells', 'map'];
  declare rigId: string;
  declare name: string;
  declare headerCells: string[];
  declare map: ColumnMap;
  declare createdAt: Date;
}
