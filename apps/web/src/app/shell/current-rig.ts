import { computed, inject, Injectable } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { type ActivatedRouteSnapshot, NavigationEnd, Router } from '@angular/router';
import { filter, map } from 'rxjs';
import { RigsApi } from '../api/rigs-api';

/** The rig that the address speaks of. */
@Injectable({ providedIn: 'root' })
export class CurrentRig {
  private readonly router = inject(Router);
  private readonly rigs = inject(RigsApi).list;
  private readonly id = toSignal(
    this.router.events.pipe(
      filter((event) => event instanceof NavigationEnd),
      map(() => rigIdOf(this.router.routerState.snapshot.root)),
    ),
    { initialValue: null },
  );

  readonly rig = computed(() => {
    if (!this.rigs.hasValue()) return null;
    return this.rigs.value().find((rig) => rig.id === this.id()) ?? null;
  });
}

function rigIdOf(route: ActivatedRouteSnapshot): string | null {
  return route.firstChild ? rigIdOf(route.firstChild) : route.paramMap.get('rigId');
}
