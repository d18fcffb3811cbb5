import { HttpClient, httpResource, type HttpResourceRef } from '@angular/common/http';
import { inject, Injectable, type Signal } from '@angular/core';
import { type CreateSetup, type Setup, setupPaths, setupSchema } from '@stillpier/contract';
import { firstValueFrom } from 'rxjs';
import * as z from 'zod';

const setupListSchema = z.array(setupSchema);

@Injectable({ providedIn: 'root' })
export class SetupsApi {
  private readonly http = inject(HttpClient);

  list(rigId: Signal<string>): HttpResourceRef<Setup[] | undefined> {
    return httpResource(() => setupPaths.all(rigId()), {
      parse: (body) => setupListSchema.parse(body),
    });
  }

  /** Nothing is asked for while `setupId` is undefined, which stands for a new setup. */
  one(
    rigId: Signal<string>,
    setupId: Signal<string | undefined>,
  ): HttpResourceRef<Setup | undefined> {
    return httpResource(
      () => {
        const id = setupId();
        return id === undefined ? undefined : setupPaths.one(rigId(), id);
      },
      { parse: (body) => setupSchema.parse(body) },
    );
  }

  async create(rigId: string, body: CreateSetup): Promise<Setup> {
    return setupSchema.parse(await firstValueFrom(this.http.post(setupPaths.all(rigId), body)));
  }

  /** Refused with status 412 when the setup is no longer at the version of `known`. */
  async update(known: Setup, body: CreateSetup): Promise<Setup> {
    const headers = { 'If-Match': `"${known.version}"` };
    const path = setupPaths.one(known.rigId, known.id);
    return setupSchema.parse(await firstValueFrom(this.http.put(path, body, { headers })));
  }

  async remove({ rigId, id }: Setup): Promise<void> {
    await firstValueFrom(this.http.delete(setupPaths.one(rigId, id)));
  }
}
