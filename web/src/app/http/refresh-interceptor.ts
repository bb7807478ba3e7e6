import type { HttpInterceptorFn } from '@angular/common/http';
import { HttpErrorResponse } from '@angular/common/http';
import { inject } from '@angular/core';
import { catchError, switchMap, throwError } from 'rxjs';
import { CurrentUser } from '../sign-in/current-user';
import { NO_REFRESH } from './no-refresh';
import { toProblemError } from './problem-error';

/**
 * When the short access token has ended, fetches a new one once for all waiting requests and sends
 * the request again, once. When that fails too the person is asked to sign in, and comes back here.
 */
export const refreshInterceptor: HttpInterceptorFn = (request, next) => {
  const user = inject(CurrentUser);
  if (request.context.get(NO_REFRESH)) return next(request);
  return next(request).pipe(
    catchError((error: unknown) => {
      if (!(error instanceof HttpErrorResponse) || error.status !== 401) {
        return throwError(() => error);
      }
      return user.refresh().pipe(
        catchError((refused: unknown) => {
          // Only a plain no ends the session; a server that is away must not sign people out.
          if (toProblemError(refused).status !== 401) return throwError(() => refused);
          user.sessionEnded();
          return throwError(() => error);
        }),
        switchMap(() => next(request)),
      );
    }),
  );
};
