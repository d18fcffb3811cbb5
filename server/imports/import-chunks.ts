import { createHash } from 'node:crypto';
import type { Knex } from 'knex';

const CHUNK_BYTES = 512 * 1024;

interface ChunkRow {
  readonly importId: string;
  readonly position: number;
  readonly bytes: Buffer;
}

/** Writes a stream to the database as it comes, never more than a chunk of it in memory. */
export async function storeChunks(
  trx: Knex.Transaction,
  importId: string,
  stream: AsyncIterable<Buffer>,
): Promise<{ sizeBytes: number; sha256: string }> {
  const hash = createHash('sha256');
  let sizeBytes = 0;
  let position = 0;
  let held: Buffer[] = [];
  let heldBytes = 0;
  const flush = async (): Promise<void> => {
    const row: ChunkRow = { importId, position, bytes: Buffer.concat(held) };
    await trx<ChunkRow>('importChunks').insert(row);
    position += 1;
    held = [];
    heldBytes = 0;
  };
  for await (const bytes of stream) {
    hash.update(bytes);
    sizeBytes += bytes.length;
    held.push(bytes);
    heldBytes += bytes.length;
    if (heldBytes >= CHUNK_BYTES) await flush();
  }
  if (heldBytes > 0) await flush();
  return { sizeBytes, sha256: hash.digest('hex') };
}

export async function removeChunks(trx: Knex.Transaction, importId: string): Promise<void> {
  await trx<ChunkRow>('importChunks').delete().where({ importId });
}

/** The bytes of an original in order. It throws when they end early: half a file must not look whole. */
export async function* readChunks(
  knex: Knex,
  { id, sizeBytes }: { readonly id: string; readonly sizeBytes: number },
): AsyncGenerator<Buffer> {
  let sent = 0;
  for (let position = 0; sent < sizeBytes; position++) {
    const chunk = await knex<ChunkRow>('importChunks')
      .where({ importId: id, position })
      .first('bytes');
    if (!chunk) throw new Error(`Chunk ${position} of import ${id} is gone`);
    sent += chunk.bytes.length;
    yield chunk.bytes;
  }
}
