import {
  HttpClient,
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
} from '@stillpier/contract';
import { filter, firstValueFrom, map, Observable } from 'rxjs';

const importPageSchema = pageOf(logImportSchema);

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

  /** Reads the kept original again, as it was read before. */
  async retry({ rigId, id }: LogImport): Promise<LogImport> {
    const answer = await firstValueFrom(this.http.post(importPaths.retries(rigId, id), {}));
    return logImportSchema.parse(answer);
  }

  async remove({ rigId, id }: LogImport): Promise<void> {
    await firstValueFrom(this.http.delete(importPaths.one(rigId, id)));
  }
}
