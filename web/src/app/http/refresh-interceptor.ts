import type { HttpInterceptorFn } from '@angular/common/http';
import { HttpErrorResponse } from '@angular/common/http';
import { inject } from '@angular/core';
import { catchError, of, switchMap, throwError } from 'rxjs';
import { CurrentUser } from '../sign-in/current-user';
import { ProblemError } from './problem-error';

/** Requests that are themselves about signing in: a 401 there is an answer, not an ended session. */
const OWN_ANSWER = /\/api\/v1\/(session\/refresh|welcome|first-person)$/;

/**
 * When the short access token has ended, fetches a new one once for all waiting requests and sends
 * the request again, once. When that fails too the person is asked to sign in, and comes back here.
 */
export const refreshInterceptor: HttpInterceptorFn = (request, next) => {
  const user = inject(CurrentUser);
  const signingIn = request.url === '/api/v1/session' && request.method === 'POST';
  if (signingIn || OWN_ANSWER.test(request.url)) return next(request);
  return next(request).pipe(
    catchError((error: unknown) => {
      if (!(error instanceof HttpErrorResponse) || error.status !== 401) {
        return throwError(() => error);
      }
      return user.refresh().pipe(
        catchError((failure: unknown) => {
          // Another page of this browser was faster: its new cookies serve this one too.
          if (isJustRenewed(failure)) return of(undefined);
          user.sessionEnded();
          return throwError(() => error);
        }),
        switchMap(() => next(request)),
      );
    }),
  );
};

function isJustRenewed(failure: unknown): boolean {
  return failure instanceof ProblemError && failure.code === 'session-just-renewed';
}
