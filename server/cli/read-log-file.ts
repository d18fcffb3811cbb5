import { createReadStream } from 'node:fs';
import { type Readable } from 'node:stream';
import { type ColumnMap, createLogReader, type GuideLog } from '@stillpier/guide-log';
import { unpacked } from '../imports/unpacked';
import { instantOfWallClock } from '../nights/night-date';
import { whyUnreadable } from './why-unreadable';

/**
 * Reads a log, plain or compressed by gzip (told by its first two bytes), piece by piece.
 *
 * @param timeZone Of the clock that wrote times without a zone; undefined: not known.
 */
export async function readLogFile(
  file: string,
  input: Readable,
  map: ColumnMap | undefined,
  timeZone: string | undefined,
): Promise<GuideLog> {
  const source = file === '-' ? input : createReadStream(file);
  const reader = createLogReader({
    map,
    instantOfLocalTime:
      timeZone === undefined
        ? undefined
        : (seconds) => instantOfWallClock(seconds * 1000, timeZone).getTime() / 1000,
  });
  try {
    for await (const chunk of unpacked(source)) reader.push(chunk);
  } catch (error) {
    throw whyUnreadable(file === '-' ? 'standard input' : file, error);
  }
  return reader.finish();
}
