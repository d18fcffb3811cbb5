import { type BY_HAND_ACTIONS } from '@stillpier/contract';
import { BaseModel } from '../database/base-model';

/** That somebody set a stretch of a log aside, or took it back. Rows are written once and never changed. */
export class ByHandEntryModel extends BaseModel {
  static override readonly tableName = 'by_hand_entries';
  declare importId: string;
  declare action: (typeof BY_HAND_ACTIONS)[number];
  /** Seconds since the first frame of the log. */
  declare fromLogSeconds: number;
  declare toLogSeconds: number;
  declare reason: string;
  declare madeBy: string | null;
  /** The order in which entries were made. */
  declare position: number;
  declare createdAt: Date;
}
