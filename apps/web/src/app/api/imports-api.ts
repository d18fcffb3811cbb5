import {
  HttpClient,
  HttpErrorResponse,
  HttpEventType,
  httpResource,
  type HttpResourceRef,
} from '@angular/common/http';
import { inject, Injectable, type Signal } from '@angular/core';
import {
  importEventSchema,
  type ImportOptions,
  importPaths,
  type LogImport,
  logImportSchema,
  pageOf,
  type Reading,
  readingSchema,
  type RetryImport,
} from '@stillpier/contract';
import { filter, firstValueFrom, map, Observable } from 'rxjs';
import * as z from 'zod';
import { problemErrorOf } from './problem-error';

const importPageSchema = pageOf(logImportSchema);
/** The part of the document that tells of the file. */
const readingOfDocumentSchema = z.object({ reading: readingSchema });

/** How far an upload has come; at its end what the server made of it. */
export type UploadStep =
  { readonly share: number } | { readonly share: 1; readonly received: LogImport };

@Injectable({ providedIn: 'root' })
export class ImportsApi {
  private readonly http = inject(HttpClient);

  /** Newest first; at most a hundred. */
  list(rigId: Signal<string>): HttpResourceRef<LogImport[] | undefined> {
    return httpResource(() => importPaths.all(rigId()), {
      parse: (body) => importPageSchema.parse(body).items,
    });
  }

  /** Unsubscribing breaks the upload off. */
  upload(rigId: string, file: File, options: ImportOptions): Observable<UploadStep> {
    const body = new FormData();
    body.append('options', JSON.stringify(options)); // the server reads it before the file
    body.append('file', file, file.name);
    return this.http
      .post(importPaths.all(rigId), body, { observe: 'events', reportProgress: true })
      .pipe(
        map((event): UploadStep | null => {
          if (event.type === HttpEventType.UploadProgress) {
            return { share: event.loaded / (event.total ?? file.size) };
          }
          if (event.type === HttpEventType.Response) {
            return { share: 1, received: logImportSchema.parse(event.body) };
          }
          return null;
        }),
        filter((step) => step !== null),
      );
  }

  /** The rig's latest imports as they stand, then each change. The browser connects again by itself. */
  follow(rigId: string): Observable<LogImport> {
    return new Observable((subscriber) => {
      const source = new EventSource(importPaths.events(rigId));
      source.addEventListener('import', (event: MessageEvent<string>) => {
        const parsed = importEventSchema.safeParse(JSON.parse(event.data));
        if (parsed.success) subscriber.next(parsed.data);
        else subscriber.error(parsed.error);
      });
      return () => {
        source.close();
      };
    });
  }

  one(rigId: Signal<string>, importId: Signal<string>): HttpResourceRef<LogImport | undefined> {
    return httpResource(() => importPaths.one(rigId(), importId()), {
      parse: (body) => logImportSchema.parse(body),
    });
  }

  /** What was read and what was not; nothing is asked for while there is no import that has been read. */
  reading(log: Signal<LogImport | undefined>): HttpResourceRef<Reading | undefined> {
    return httpResource(
      () => {
        const of = log();
        return of && importPaths.document(of.rigId, of.id);
      },
      { parse: (body) => readingOfDocumentSchema.parse(body).reading },
    );
  }

  /** The first bytes of the kept original: the rest is not fetched. */
  async originalHead(
    { rigId, id }: Pick<LogImport, 'rigId' | 'id'>,
    mostBytes: number,
  ): Promise<Uint8Array<ArrayBuffer>> {
    const answer = await fetch(importPaths.original(rigId, id));
    if (!answer.ok || !answer.body) {
      throw problemErrorOf(new HttpErrorResponse({ status: answer.status }));
    }
    return firstOf(answer.body, mostBytes);
  }

  /** Reads the kept original again; what is not given stays as it was. */
  async retry({ rigId, id }: LogImport, changes: RetryImport): Promise<LogImport> {
    const answer = await firstValueFrom(this.http.post(importPaths.retries(rigId, id), changes));
    return logImportSchema.parse(answer);
  }

  async remove({ rigId, id }: LogImport): Promise<void> {
    await firstValueFrom(this.http.delete(importPaths.one(rigId, id)));
  }
}

async function firstOf(
  body: ReadableStream<Uint8Array<ArrayBuffer>>,
  mostBytes: number,
): Promise<Uint8Array<ArrayBuffer>> {
  const reader = body.getReader();
  const first = new Uint8Array(mostBytes);
  let length = 0;
  while (length < mostBytes) {
    const { done, value } = await reader.read();
    if (done) break;
    const taken = value.subarray(0, mostBytes - length);
    first.set(taken, length);
    length += taken.length;
  }
  await reader.cancel();
  return first.subarray(0, length);
}
