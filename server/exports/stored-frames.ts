import type { Knex } from 'knex';
import { raw } from 'objection';
import { unpackFloat32, unpackFloat64 } from '../nights/packed-series';
import { RunModel } from '../nights/run-model';
import { RunSeriesModel } from '../nights/run-series-model';
import { CSV_CHANNELS, csvHeader, csvLines, type FramesPiece } from './frames-csv';

/** Small enough that the web process answers others between two pieces. */
const PIECE_FRAMES = 4000;
const FLOAT32_BYTES = 4;
const FLOAT64_BYTES = 8;

type StoredRun = Pick<
  RunModel,
  'id' | 'runIndex' | 'target' | 'startsAt' | 'correctionUnit' | 'frames'
>;

/** false for a log in guide pixels without a scale: what is kept is in arcseconds. */
export async function hasFrames(knex: Knex, importId: string): Promise<boolean> {
  const runs = RunModel.query(knex).where({ importId }).select('id');
  return (
    (await RunSeriesModel.query(knex).whereIn('runId', runs).select('runId').limit(1)).length > 0
  );
}

/** The frames of a log as CSV, a piece at a time. */
export async function* framesCsv(knex: Knex, importId: string): AsyncGenerator<string> {
  const runs: StoredRun[] = await RunModel.query(knex)
    .where({ importId })
    .orderBy('runIndex')
    .select('id', 'runIndex', 'target', 'startsAt', 'correctionUnit', 'frames');
  yield csvHeader(runs[0]?.correctionUnit ?? null);
  for (const run of runs) {
    for (let from = 0; from < run.frames; from += PIECE_FRAMES) {
      yield csvLines(run, await pieceOf(knex, run.id, from));
    }
  }
}

async function pieceOf(knex: Knex, runId: string, from: number): Promise<FramesPiece> {
  const rows = await RunSeriesModel.query(knex)
    .where({ runId })
    .whereIn('channel', ['time', ...CSV_CHANNELS])
    .select('channel', pieceBytes(from).as('samples'));
  const bytes = new Map(rows.map(({ channel, samples }) => [channel, samples]));
  const timeSeconds = unpackFloat64(bytes.get('time') ?? Buffer.alloc(0));
  const channels = CSV_CHANNELS.map((channel) => {
    const samples = bytes.get(channel);
    const gap = new Float32Array(timeSeconds.length).fill(NaN);
    return [channel, samples ? unpackFloat32(samples) : gap] as const;
  });
  return { timeSeconds, channels: Object.fromEntries(channels) as FramesPiece['channels'] };
}

/** Only the bytes of the piece leave the database. */
function pieceBytes(from: number) {
  return raw(
    `CASE channel WHEN 'time' THEN substring(samples FROM ?::int FOR ?::int)
                  ELSE substring(samples FROM ?::int FOR ?::int) END`,
    [
      ...[from * FLOAT64_BYTES + 1, PIECE_FRAMES * FLOAT64_BYTES],
      ...[from * FLOAT32_BYTES + 1, PIECE_FRAMES * FLOAT32_BYTES],
    ],
  );
}
