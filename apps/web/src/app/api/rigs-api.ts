import { HttpClient, httpResource, type HttpResourceRef } from '@angular/common/http';
import { computed, inject, Injectable, type Signal } from '@angular/core';
import { type CreateRig, type Rig, rigPaths, rigSchema } from '@stillpier/contract';
import { firstValueFrom } from 'rxjs';
import * as z from 'zod';
import { SessionApi } from './session-api';

// The form of every file here: one resource a file, paths and schemas from the contract, each answer parsed on arrival.
// Reads are resources (httpResource is experimental in Angular 21 and stays inside this folder), writes are promises
// that reject with ProblemError.

const rigListSchema = z.array(rigSchema);

@Injectable({ providedIn: 'root' })
export class RigsApi {
  private readonly http = inject(HttpClient);
  private readonly session = inject(SessionApi);

  /** The rigs of the account: shared by the rig picker and the pages, so reload it after a change. */
  readonly list: HttpResourceRef<Rig[] | undefined> = httpResource(
    () => (this.session.account() ? rigPaths.all : undefined),
    { parse: (body) => rigListSchema.parse(body) },
  );

  one(rigId: Signal<string>): HttpResourceRef<Rig | undefined> {
    return httpResource(() => rigPaths.one(rigId()), { parse: (body) => rigSchema.parse(body) });
  }

  /** Whether the account is the rig's owner or an operator: not before the list has come. */
  mayEdit(rigId: Signal<string>): Signal<boolean> {
    return computed(() => {
      const rigs = this.list.hasValue() ? this.list.value() : [];
      const role = rigs.find(({ id }) => id === rigId())?.role;
      return role === 'owner' || role === 'operator';
    });
  }

  async create(body: CreateRig): Promise<Rig> {
    const rig = rigSchema.parse(await firstValueFrom(this.http.post(rigPaths.all, body)));
    this.list.reload();
    return rig;
  }

  /** Refused with status 412 when the rig is no longer at `version`. */
  async update(rigId: string, version: number, body: CreateRig): Promise<Rig> {
    const headers = { 'If-Match': `"${version}"` };
    const answer = await firstValueFrom(this.http.put(rigPaths.one(rigId), body, { headers }));
    this.list.reload();
    return rigSchema.parse(answer);
  }

  async remove(rigId: string): Promise<void> {
    await firstValueFrom(this.http.delete(rigPaths.one(rigId)));
    this.list.reload();
  }
}
