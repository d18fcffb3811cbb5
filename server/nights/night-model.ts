import { type Finding } from '@stillpier/contract';
import { Model } from 'objection';

/** The measures of one night of a rig, written anew whenever its runs change. */
export class NightModel extends Model {
  static override readonly tableName = 'nights';
  static override readonly idColumn = ['rigId', 'date'];
  static override readonly jsonAttributes = ['targets'];
  declare rigId: string;
  declare date: string;
  declare startsAt: Date;
  declare endsAt: Date;
  declare targets: string[];
  declare runCount: number;
  declare guidedHours: number;
  declare frames: number;
  declare used: number;
  declare raRmsArcsec: number | null;
  declare decRmsArcsec: number | null;
  declare totalRmsArcsec: number | null;
  declare aspect: number | null;
  declare positionAngleDegrees: number | null;
  declare keptShare: number | null;
  declare mainLimitCode: Finding['code'] | null;
  declare mainLimitSeverity: Finding['severity'] | null;
}
