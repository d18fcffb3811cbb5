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
import { instantOfWallClock } from '../nights/night-date';
import { chooseMap } from './choose-map';

/** Larger pieces are slower to read, and would keep the process from hearing that it should stop. */
const PIECE_BYTES = 64 * 1024;

/**
 * Reads the original of an import into frames, never more than a chunk of it in memory.
 *
 * @param onPiece Called after every piece with the share of the file that is read; throws to stop.
 * @throws {GuideLogError} When the file cannot be used as a guide log.
 */
export async function readOriginal(
  knex: Knex,
  row: ImportModel,
  timeZone: string,
  onPiece: (share: number) => Promise<void>,
): Promise<GuideLog> {
  let reader: LogReader | undefined;
  let readBytes = 0;
  for await (const chunk of readChunks(knex, row)) {
    reader ??= createLogReader({
      map: await mapFor(knex, row, chunk),
      instantOfLocalTime: (seconds) =>
        instantOfWallClock(seconds * 1000, timeZone).getTime() / 1000,
    });
    for (let at = 0; at < chunk.length; at += PIECE_BYTES) {
      const piece = chunk.subarray(at, at + PIECE_BYTES);
      reader.push(piece);
      readBytes += piece.length;
      await letOthersRun();
      await onPiece(readBytes / row.sizeBytes);
    }
  }
  return (reader ?? createLogReader({})).finish();
}

async function mapFor(knex: Knex, row: ImportModel, firstBytes: Buffer): Promise<ColumnMap> {
  const saved = await columnMapsFor(knex, row.rigId, row.uploadedBy);
  return chooseMap(firstBytes, row.map, saved);
}
