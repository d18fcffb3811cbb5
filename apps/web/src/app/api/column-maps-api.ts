import { HttpClient, httpResource, type HttpResourceRef } from '@angular/common/http';
import { computed, inject, Injectable, type Signal } from '@angular/core';
import {
  type ColumnMap,
  columnMapPathsOf,
  type CreateColumnMap,
  ownColumnMapPaths,
  type OwnColumnMap,
  ownColumnMapSchema,
  savedColumnMapSchema,
} from '@stillpier/contract';
import { firstValueFrom } from 'rxjs';
import * as z from 'zod';

/** A map of the person has no rig. */
const anyColumnMapSchema = z.union([savedColumnMapSchema, ownColumnMapSchema]);
const columnMapListSchema = z.array(anyColumnMapSchema);

/** Whose maps: those of a rig, by its id; null: those of the person, for all their rigs. */
export type MapOwner = string | null;

const pathsOf = (owner: MapOwner) => (owner === null ? ownColumnMapPaths : columnMapPathsOf(owner));

@Injectable({ providedIn: 'root' })
export class ColumnMapsApi {
  private readonly http = inject(HttpClient);

  /** Newest first. */
  list(owner: Signal<MapOwner>): HttpResourceRef<OwnColumnMap[] | undefined> {
    return httpResource(() => pathsOf(owner()).all, {
      parse: (body) => columnMapListSchema.parse(body),
    });
  }

  /** What is tried on a file of a rig, in the order of trying: the maps of the rig, then those of the person. */
  known(rigId: Signal<string>): { maps: Signal<OwnColumnMap[]>; reload: () => void } {
    const ofRig = this.list(rigId);
    const own = this.list(computed(() => null));
    return {
      maps: computed(() => [
        ...(ofRig.hasValue() ? ofRig.value() : []),
        ...(own.hasValue() ? own.value() : []),
      ]),
      reload: () => {
        ofRig.reload();
        own.reload();
      },
    };
  }

  async create(owner: MapOwner, body: CreateColumnMap): Promise<OwnColumnMap> {
    const answer = await firstValueFrom(this.http.post(pathsOf(owner).all, body));
    return anyColumnMapSchema.parse(answer);
  }

  /** A MAP.json, as it came. */
  async createFromFile(owner: MapOwner, name: string, map: ColumnMap): Promise<OwnColumnMap> {
    const answer = await firstValueFrom(
      this.http.post(pathsOf(owner).files, map, { params: { name } }),
    );
    return anyColumnMapSchema.parse(answer);
  }

  /** The new name first, then the old one goes: a break in between leaves both, never none. */
  async rename(owner: MapOwner, known: OwnColumnMap, name: string): Promise<void> {
    await this.create(owner, { name, headerCells: known.headerCells, map: known.map });
    await this.remove(owner, known);
  }

  async remove(owner: MapOwner, { id }: OwnColumnMap): Promise<void> {
    await firstValueFrom(this.http.delete(pathsOf(owner).one(id)));
  }

  /** Where it can be taken along as MAP.json. */
  fileAddress(owner: MapOwner, { id }: OwnColumnMap): string {
    return pathsOf(owner).file(id);
  }
}
