import { type ImportOptions, importOptionsSchema } from '@stillpier/contract';
import type { Request, Response } from 'express';
import type { Knex } from 'knex';
import multer from 'multer';
import { badInput, tooLarge } from '../http/app-error';
import { readRequest } from '../http/read-request';
import { storeChunks } from './import-chunks';

const BYTES_PER_MIB = 1024 * 1024;
const OPTIONS_BYTES = 128 * 1024;
/** What a multipart body holds beside the file itself, generously. */
const ENVELOPE_BYTES = OPTIONS_BYTES + 64 * 1024;
const NAME_LENGTH = 200;

export interface ReceivedFile {
  readonly options: ImportOptions;
  readonly fileName: string;
  readonly sizeBytes: number;
  readonly sha256: string;
}

/** Refuses by the announced length, before a byte is read: multer would read a refused body to its end. */
export function refuseTooLarge(req: Request, limitMib: number): void {
  const announced = Number(req.get('content-length') ?? 0);
  if (announced > limitMib * BYTES_PER_MIB + ENVELOPE_BYTES) throw tooLarge(tooLargeText(limitMib));
}

/** Reads a multipart upload; the file goes to the database as it comes, as the chunks of `importId`. */
export async function receiveFile(
  trx: Knex.Transaction,
  importId: string,
  limitMib: number,
  req: Request,
  res: Response,
): Promise<ReceivedFile> {
  const storage = new ChunkStorage(trx, importId);
  const middleware = multer({
    storage,
    defParamCharset: 'utf8', // multer's own, latin1, spoils names
    limits: {
      fileSize: limitMib * BYTES_PER_MIB,
      files: 1,
      fields: 1,
      parts: 2,
      fieldSize: OPTIONS_BYTES,
      fieldNestingDepth: 0,
    },
  }).single('file');
  try {
    await new Promise<void>((resolve, reject) => {
      void middleware(req, res, (error: unknown) => {
        if (error === undefined || error === null) resolve();
        else reject(error instanceof Error ? error : new Error('upload failed', { cause: error }));
      });
    });
  } catch (error) {
    if (error === storage.failure) throw error;
    if (error instanceof multer.MulterError) {
      if (error.code === 'LIMIT_FILE_SIZE') throw tooLarge(tooLargeText(limitMib));
      throw error;
    }
    throw badInput('The upload is cut off or is not multipart/form-data.'); // busboy has no class
  }
  if (!storage.received) throw badInput('The upload needs a CSV file in its field "file".');
  return storage.received;
}

class ChunkStorage implements multer.StorageEngine {
  received: ReceivedFile | undefined;
  /** What went wrong on our side, to be told from what is wrong with the upload. */
  failure: unknown;

  constructor(
    private readonly trx: Knex.Transaction,
    private readonly importId: string,
  ) {}

  _handleFile(
    req: Request,
    file: Express.Multer.File,
    done: (error?: unknown, info?: Partial<Express.Multer.File>) => void,
  ): void {
    this.store(req, file).then(
      (received) => {
        this.received = received;
        done(null, { size: received.sizeBytes });
      },
      (error: unknown) => {
        if (!file.stream.errored) this.failure = error;
        done(error);
      },
    );
  }

  /** Nothing to do: an upload that fails is rolled back. */
  _removeFile(
    _req: Request,
    _file: Express.Multer.File,
    done: (error: Error | null) => void,
  ): void {
    done(null);
  }

  private async store(req: Request, file: Express.Multer.File): Promise<ReceivedFile> {
    const options = readOptions((req.body as { options?: unknown }).options);
    const stored = await storeChunks(this.trx, this.importId, file.stream);
    return { options, fileName: baseName(file.originalname), ...stored };
  }
}

/** No `options` field is the plainest choice: the first setup, and the headers of the file. */
function readOptions(field: unknown): ImportOptions {
  if (field === undefined) return { setupId: null, map: null };
  return readRequest(importOptionsSchema, parseJson(field));
}

function parseJson(field: unknown): unknown {
  try {
    return JSON.parse(String(field));
  } catch {
    throw badInput('The field "options" is not JSON.'); // JSON.parse has no other way to say so
  }
}

/** Some programs send the whole path; what is kept is a name that no system misreads. */
export function baseName(path: string): string {
  const name = (path.split(/[/\\]/).at(-1) ?? '').replace(/\p{Cc}/gu, '').trim();
  return name === '' || /^\.+$/.test(name) ? 'log.csv' : name.slice(-NAME_LENGTH);
}

function tooLargeText(limitMib: number): string {
  return `The file is larger than ${limitMib} MiB, which is the most that is taken.`;
}
