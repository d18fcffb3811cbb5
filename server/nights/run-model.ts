import { type Optics, type Run, type SpectrumCurve } from '@stillpier/contract';
import { BaseModel } from '../database/base-model';

/** A run of a log: the document's run, with the measures that are sorted and filtered as columns. */
export class RunModel extends BaseModel {
  static override readonly tableName = 'runs';
  static override readonly jsonAttributes = ['optics', 'run', 'spectrum'];
  declare rigId: string;
  declare importId: string;
  declare setupId: string | null;
  /** Date of the evening at the site. */
  declare night: string;
  declare runIndex: number;
  declare target: string | null;
  declare startsAt: Date;
  /** Of the first frame, since the first frame of the log. */
  declare logOffsetSeconds: number;
  declare durationSeconds: number;
  declare frames: number;
  declare used: number;
  declare raRmsArcsec: number | null;
  declare decRmsArcsec: number | null;
  declare totalRmsArcsec: number | null;
  declare aspect: number | null;
  declare positionAngleDegrees: number | null;
  declare subs: number | null;
  declare subsWithin: number | null;
  declare seeingFwhmArcsec: number | null;
  /** null: the log has no corrections. */
  declare correctionUnit: 'ms' | 'arcsec' | null;
  declare optics: Optics;
  declare run: Run;
  declare spectrum: SpectrumCurve | null;
}
