import { HttpClient, httpResource, type HttpResourceRef } from '@angular/common/http';
import { inject, Injectable, type Signal } from '@angular/core';
import { type ByHand, byHandPaths, byHandSchema, type ChangeByHand } from '@stillpier/contract';
import { firstValueFrom } from 'rxjs';

@Injectable({ providedIn: 'root' })
export class ByHandApi {
  private readonly http = inject(HttpClient);

  of(rigId: Signal<string>, runId: Signal<string>): HttpResourceRef<ByHand | undefined> {
    return httpResource(() => byHandPaths.of(rigId(), runId()), {
      parse: (body) => byHandSchema.parse(body),
    });
  }

  async change(rigId: string, runId: string, change: ChangeByHand): Promise<ByHand> {
    const answer = await firstValueFrom(this.http.post(byHandPaths.of(rigId, runId), change));
    return byHandSchema.parse(answer);
  }
}
