import { setImmediate as letOthersRun } from 'node:timers/promises';
import {
  type ColumnMap,
  createLogReader,
  type GuideLog,
  type LogReader,
} from '@stillpier/guide-log';
import type { Knex } from 'knex';
import { columnMapsFor } from '../column-maps/column-map-service';
import { readChunks } from '../imports/import-chunks';
import type { ImportModel } from '../imports/import-model';
import { unpacked } from '../imports/unpacked';
import { instantOfWallClock } from '../nights/night-date';
import { chooseMap } from './choose-map';
import { LimitedReading, type ReadingLimits } from './reading-limits';

/** Larger pieces are slower to read, and would keep the process from hearing that it should stop. */
const PIECE_BYTES = 64 * 1024;

/**
 * Reads the original of an import, plain or compressed by gzip, into frames: never more than a chunk of it in memory.
 *
 * @param onPiece Called after every piece with the share of the file that is read; throws to stop.
 * @throws {GuideLogError} When the file cannot be used as a guide log.
 * @throws {UnusableLogError} When it is more than the limits allow.
 */
export async function readOriginal(
  knex: Knex,
  row: ImportModel,
  timeZone: string,
  limits: ReadingLimits,
  onPiece: (share: number) => Promise<void>,
): Promise<GuideLog> {
  let reader: LogReader | undefined;
  let readBytes = 0;
  const counted = async function* (): AsyncGenerator<Uint8Array> {
    for await (const chunk of readChunks(knex, row)) {
      readBytes += chunk.length;
      yield chunk;
    }
  };
  const reading = new LimitedReading(limits);
  for await (const chunk of unpacked(counted())) {
    reader ??= createLogReader({
      map: await mapFor(knex, row, chunk),
      instantOfLocalTime: (seconds) =>
        instantOfWallClock(seconds * 1000, timeZone).getTime() / 1000,
    });
    for (let at = 0; at < chunk.length; at += PIECE_BYTES) {
      const piece = chunk.subarray(at, at + PIECE_BYTES);
      reading.take(piece);
      reader.push(piece);
      await letOthersRun();
      await onPiece(readBytes / row.sizeBytes);
    }
  }
  const log = (reader ?? createLogReader({})).finish();
  reading.checkLines(log.reading.lines);
  return log;
}

async function mapFor(knex: Knex, row: ImportModel, firstBytes: Uint8Array): Promise<ColumnMap> {
  const saved = await columnMapsFor(knex, row.rigId, row.uploadedBy);
  return chooseMap(firstBytes, row.map, saved);
}
