import type { HttpInterceptorFn } from '@angular/common/http';
import { catchError, throwError } from 'rxjs';
import { toProblemError } from './problem-error';

/** Every failed request reaches its caller as a ProblemError. */
export const problemInterceptor: HttpInterceptorFn = (request, next) =>
  next(request).pipe(catchError((error: unknown) => throwError(() => toProblemError(error))));
