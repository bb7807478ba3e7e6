import { inject } from '@angular/core';
import type { CanActivateFn } from '@angular/router';
import { Router } from '@angular/router';
import { CurrentUser } from './current-user';

/** Lets a signed-in person through; sends others to sign in and brings them back afterwards. */
export const signedInGuard: CanActivateFn = async (_route, state) => {
  const user = inject(CurrentUser);
  const router = inject(Router);
  if (await user.resume()) return true;
  return router.createUrlTree(['/sign-in'], {
    queryParams: state.url === '/' ? {} : { then: state.url },
  });
};
