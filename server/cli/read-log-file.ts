import { createReadStream } from 'node:fs';
import { pipeline, type Readable } from 'node:stream';
import { createGunzip } from 'node:zlib';
import { type ColumnMap, createLogReader, type GuideLog } from '@stillpier/guide-log';
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

async function* unpacked(bytes: AsyncIterable<Uint8Array>): AsyncGenerator<Uint8Array> {
  const chunks = bytes[Symbol.asyncIterator]();
  let head = new Uint8Array(0);
  while (head.length < 2) {
    const next = await chunks.next();
    if (next.done) break;
    head = Buffer.concat([head, next.value]);
  }
  const whole = rejoined(head, chunks);
  if (head[0] === 0x1f && head[1] === 0x8b) yield* gunzipped(whole);
  else yield* whole;
}

async function* rejoined(
  head: Uint8Array,
  rest: AsyncIterator<Uint8Array>,
): AsyncGenerator<Uint8Array> {
  yield head;
  for (let next = await rest.next(); !next.done; next = await rest.next()) yield next.value;
}

async function* gunzipped(bytes: AsyncIterable<Uint8Array>): AsyncGenerator<Uint8Array> {
  // The callback has nothing to do: whoever reads on from the stream gets the error.
  yield* pipeline(bytes, createGunzip(), () => undefined) as AsyncIterable<Uint8Array>;
}
