import { inject } from '@angular/core';
import { type CanActivateFn, Router } from '@angular/router';
import { SessionApi } from '../api/session-api';

/** Leads to the sign-in page, and back afterwards. */
export const signedIn: CanActivateFn = async (_route, state) => {
  const session = inject(SessionApi);
  const router = inject(Router);
  if (await session.ready()) return true;
  return router.createUrlTree(['/sign-in'], { queryParams: { returnTo: state.url } });
};
