import type { SeriesQuery, SpectrumCurve } from '@stillpier/contract';
import type { Knex } from 'knex';
import { raw } from 'objection';
import { notFound } from '../http/app-error';
import { rigFor } from '../rigs/rig-access';
import { packFloat32, unpackFloat32, unpackFloat64 } from './packed-series';
import { RunModel } from './run-model';
import { RunSeriesModel } from './run-series-model';
import { cutIntoSteps, extremes, type FrameRange, framesWithin } from './series-stretch';

const FLOAT32_BYTES = 4;

/** Answers what the figures of a run draw: its series and its spectrum. */
export class RunSeriesService {
  constructor(private readonly knex: Knex) {}

  /** A stretch of series in the contract's binary form. */
  async series(
    accountId: string,
    rigId: string,
    runId: string,
    { channels, fromSeconds = 0, toSeconds = Infinity, points }: SeriesQuery,
  ): Promise<Buffer> {
    await this.requireRun(accountId, rigId, runId);
    const time = await RunSeriesModel.query(this.knex).findById([runId, 'time']);
    const times = time ? unpackFloat64(time.samples) : new Float64Array();
    const range = framesWithin(times, fromSeconds, toSeconds);
    const stretch = times.subarray(range.from, range.to).map((seconds) => seconds - fromSeconds);
    const samples = await Promise.all(
      channels.map((channel) => this.samples(runId, channel, range)),
    );
    if (stretch.length <= points) return binary(false, stretch, samples);

    const steps = cutIntoSteps(stretch, points);
    const thinned = samples.flatMap((channel) => {
      const { least, greatest } = extremes(channel, steps.frames);
      return [least, greatest];
    });
    return binary(true, steps.timeSeconds, thinned);
  }

  /** Without points for a run that is too short to have a spectrum. */
  async spectrum(accountId: string, rigId: string, runId: string): Promise<SpectrumCurve> {
    const { spectrum } = await this.requireRun(accountId, rigId, runId);
    return spectrum ?? { periodSeconds: [], raAmplitudeArcsec: [], decAmplitudeArcsec: [] };
  }

  private async requireRun(accountId: string, rigId: string, runId: string): Promise<RunModel> {
    await rigFor(this.knex, accountId, rigId, 'see');
    const run = await RunModel.query(this.knex)
      .findOne({ id: runId, rigId })
      .select('id', 'spectrum');
    if (!run) throw notFound('run');
    return run;
  }

  /** Only the bytes of the stretch leave the database; a channel that the log does not have is all gap. */
  private async samples(
    runId: string,
    channel: RunSeriesModel['channel'],
    { from, to }: FrameRange,
  ): Promise<Float32Array> {
    const bytes = [from * FLOAT32_BYTES + 1, (to - from) * FLOAT32_BYTES];
    const row = await RunSeriesModel.query(this.knex)
      .findById([runId, channel])
      .select(raw('substring(samples FROM ?::int FOR ?::int)', bytes).as('samples'));
    return row ? unpackFloat32(row.samples) : new Float32Array(to - from).fill(NaN);
  }
}

function binary(
  isThinned: boolean,
  timeSeconds: ArrayLike<number>,
  columns: readonly Float32Array[],
): Buffer {
  const head = Buffer.alloc(8);
  head.writeUInt32LE(timeSeconds.length, 0);
  head.writeUInt32LE(isThinned ? 1 : 0, 4);
  return Buffer.concat([head, packFloat32(timeSeconds), ...columns.map(packFloat32)]);
}
