import { pipeline } from 'node:stream';
import { createGunzip } from 'node:zlib';

/** What the reader of logs looks at to understand a file. */
const HEAD_BYTES = 64 * 1024;

/** The bytes of a log, plain or compressed by gzip (told by its first two bytes). The first piece holds the whole head. */
export async function* unpacked(bytes: AsyncIterable<Uint8Array>): AsyncGenerator<Uint8Array> {
  const whole = withFirst(bytes, 2);
  const first = await whole.next();
  if (first.done) return;
  const [one, two] = first.value;
  const rest = startingWith(first.value, whole);
  if (one === 0x1f && two === 0x8b) yield* withFirst(gunzipped(rest), HEAD_BYTES);
  else yield* withFirst(rest, HEAD_BYTES);
}

/** The same bytes; the first piece has at least so many, or all that there are. */
async function* withFirst(
  bytes: AsyncIterable<Uint8Array>,
  atLeast: number,
): AsyncGenerator<Uint8Array> {
  let held: Uint8Array[] | null = [];
  let heldBytes = 0;
  for await (const piece of bytes) {
    if (!held) {
      yield piece;
      continue;
    }
    held.push(piece);
    heldBytes += piece.length;
    if (heldBytes < atLeast) continue;
    yield Buffer.concat(held);
    held = null;
  }
  if (held && heldBytes > 0) yield Buffer.concat(held);
}

async function* startingWith(
  first: Uint8Array,
  rest: AsyncIterable<Uint8Array>,
): AsyncGenerator<Uint8Array> {
  yield first;
  yield* rest;
}

async function* gunzipped(bytes: AsyncIterable<Uint8Array>): AsyncGenerator<Uint8Array> {
  // The callback has nothing to do: whoever reads on from the stream gets the error.
  yield* pipeline(bytes, createGunzip(), () => undefined) as AsyncIterable<Uint8Array>;
}

/** Whether the bytes were no whole gzip file. */
export function isDamagedGzip(error: unknown): boolean {
  return (
    error instanceof Error &&
    'code' in error &&
    typeof error.code === 'string' &&
    error.code.startsWith('Z_')
  );
}
