import { type HttpInterceptorFn } from '@angular/common/http';
import { inject } from '@angular/core';
import { Router } from '@angular/router';
import { catchError, throwError } from 'rxjs';
import { ProblemError, problemErrorOf } from './problem-error';
import { SessionApi } from './session-api';

/** Turns error answers into ProblemErrors, and leads to the sign-in page when the session has ended. */
export const problemInterceptor: HttpInterceptorFn = (request, next) => {
  const session = inject(SessionApi);
  const router = inject(Router);
  return next(request).pipe(
    catchError((error: unknown) => {
      const problem = problemErrorOf(error);
      if (problem instanceof ProblemError && problem.status === 401 && session.account()) {
        session.forget();
        void router.navigate(['/sign-in'], { queryParams: { returnTo: router.url } });
      }
      return throwError(() => problem);
    }),
  );
};
