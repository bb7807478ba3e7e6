import type { HttpTestingController } from '@angular/common/http/testing';
import type { Role, Units } from '#contracts';
import type { CurrentUser } from '../../sign-in/current-user';

/** Signs a person with these roles in, as the session route would. */
export async function signInAs(
  user: CurrentUser,
  http: HttpTestingController,
  roles: readonly Role[],
  units: Units = 'mm',
): Promise<void> {
  const resumed = user.resume();
  http.expectOne('/api/v1/session').flush({
    person: {
      id: '33333333-3333-4333-8333-333333333333',
      email: 'ana@example.test',
      name: 'Ana',
      roles: [...roles],
      units,
      active: true,
    },
    shop: { id: '44444444-4444-4444-8444-444444444444', name: 'Shop', uploadLimitBytes: 1 },
    expiresAt: '2026-12-01T20:00:00Z',
  });
  await resumed;
}
