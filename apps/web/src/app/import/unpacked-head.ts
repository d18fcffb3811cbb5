/** More than the reader looks at to understand a file. */
const ENOUGH_BYTES = 262_144;

/** The first bytes of a file as its reader sees them: what gzip packed is unpacked as far as it came. */
export async function unpackedHead(first: Uint8Array<ArrayBuffer>): Promise<Uint8Array> {
  if (first[0] !== 0x1f || first[1] !== 0x8b) return first;
  const packed = new ReadableStream<Uint8Array<ArrayBuffer>>({
    start: (controller) => {
      controller.enqueue(first);
      controller.close();
    },
  });
  const reader = packed.pipeThrough(new DecompressionStream('gzip')).getReader();
  const pieces: Uint8Array[] = [];
  let length = 0;
  try {
    while (length < ENOUGH_BYTES) {
      const { done, value } = await reader.read();
      if (done) break;
      pieces.push(value);
      length += value.length;
    }
    await reader.cancel();
  } catch (error) {
    if (length === 0) throw error; // else it is the cut at the end of the first bytes, and what came is good
  }
  const all = new Uint8Array(length);
  let at = 0;
  for (const piece of pieces) {
    all.set(piece, at);
    at += piece.length;
  }
  return all;
}
