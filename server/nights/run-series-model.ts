import { type SeriesChannel } from '@stillpier/contract';
import { Model } from 'objection';

/** One channel of a run, packed little-endian: Float64 for `time`, Float32 for every other. */
export class RunSeriesModel extends Model {
  static override readonly tableName = 'run_series';
  static override readonly idColumn = ['runId', 'channel'];
  declare runId: string;
  declare channel: 'time' | SeriesChannel;
  declare samples: Buffer;
}
