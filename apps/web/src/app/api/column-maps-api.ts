import { HttpClient, httpResource, type HttpResourceRef } from '@angular/common/http';
import { inject, Injectable, type Signal } from '@angular/core';
import {
  columnMapPaths,
  type CreateColumnMap,
  type SavedColumnMap,
  savedColumnMapSchema,
} from '@stillpier/contract';
import { firstValueFrom } from 'rxjs';
import * as z from 'zod';

const columnMapListSchema = z.array(savedColumnMapSchema);

@Injectable({ providedIn: 'root' })
export class ColumnMapsApi {
  private readonly http = inject(HttpClient);

  list(rigId: Signal<string>): HttpResourceRef<SavedColumnMap[] | undefined> {
    return httpResource(() => columnMapPaths.all(rigId()), {
      parse: (body) => columnMapListSchema.parse(body),
    });
  }

  async create(rigId: string, body: CreateColumnMap): Promise<SavedColumnMap> {
    const answer = await firstValueFrom(this.http.post(columnMapPaths.all(rigId), body));
    return savedColumnMapSchema.parse(answer);
  }

  async remove({ rigId, id }: SavedColumnMap): Promise<void> {
    await firstValueFrom(this.http.delete(columnMapPaths.one(rigId, id)));
  }
}
