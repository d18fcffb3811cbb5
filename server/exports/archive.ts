import { PassThrough, Readable } from 'node:stream';
import { ZipFile } from 'yazl';

export interface ArchiveEntry {
  readonly name: string;
  readonly changedAt: Date;
  /** Called when it is this entry's turn, so that one at a time is read. */
  readonly open: () => AsyncIterable<string | Buffer>;
}

/** A ZIP file that is made while it is sent: never more than a piece of it is in memory. */
export async function* archiveOf(entries: readonly ArchiveEntry[]): AsyncGenerator<Buffer> {
  const zip = new ZipFile();
  const output = zip.outputStream.pipe(new PassThrough());
  let current: Readable | undefined;
  output.on('close', () => current?.destroy());
  zip.on('error', (error: Error) => output.destroy(error));
  for (const { name, changedAt, open } of entries) {
    zip.addReadStreamLazy(name, { mtime: changedAt }, (give) => {
      current = Readable.from(open(), { objectMode: false });
      current.on('error', (error) => output.destroy(error));
      give(null, current);
    });
  }
  zip.end();
  for await (const piece of output) yield piece as Buffer;
}

/** A name that can be a folder or file on every system. */
export function safeName(name: string): string {
  return name.replace(/[<>:"/\\|?*\p{Cc}]/gu, '_').replace(/^\.+|[. ]+$/g, '_');
}
