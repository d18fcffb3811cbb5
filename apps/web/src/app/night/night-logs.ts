import { effect, inject, Injectable, signal } from '@angular/core';
import type { LogImport } from '@stillpier/contract';
import { ImportsApi } from '../api/imports-api';

/** How the logs of the shown night stand, as the server tells: somebody may have them read again. One a page. */
@Injectable()
export class NightLogs {
  private readonly importsApi = inject(ImportsApi);

  readonly rigId = signal<string | null>(null);
  private readonly known = signal<ReadonlyMap<string, LogImport>>(new Map());

  constructor() {
    effect((onCleanup) => {
      const rigId = this.rigId();
      if (rigId === null) return;
      const following = this.importsApi.follow(rigId).subscribe((each) => {
        this.known.update((known) => new Map(known).set(each.id, each));
      });
      onCleanup(() => {
        following.unsubscribe();
      });
    });
  }

  /** undefined until the server has told of it. */
  of(importId: string): LogImport | undefined {
    return this.known().get(importId);
  }
}

/** Whether its figures are on the way. */
export function isBeingRead(log: LogImport | undefined): boolean {
  return log?.state === 'waiting' || log?.state === 'running';
}
