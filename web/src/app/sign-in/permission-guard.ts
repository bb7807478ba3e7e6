import { inject } from '@angular/core';
import type { CanActivateFn } from '@angular/router';
import { Router } from '@angular/router';
import type { Permission } from '#contracts';
import { CurrentUser } from './current-user';

/** Opens a page only to those the role table lets in; others land on the bench. */
export function mayGuard(...anyOf: readonly Permission[]): CanActivateFn {
  return () => {
    const user = inject(CurrentUser);
    if (anyOf.some((permission) => user.may(permission))) return true;
    return inject(Router).createUrlTree(['/bench']);
  };
}
