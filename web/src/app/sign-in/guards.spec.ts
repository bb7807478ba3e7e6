import { TestBed } from '@angular/core/testing';
import type { ActivatedRouteSnapshot, RouterStateSnapshot } from '@angular/router';
import type { UrlTree } from '@angular/router';
import type { Role } from '#contracts';
import { aProblem, aSession } from '../testing/records';
import { setUp, signInAs } from '../testing/set-up';
import { mayGuard } from './permission-guard';
import { signedInGuard } from './signed-in-guard';

const route = {} as ActivatedRouteSnapshot;
const at = (url: string) => ({ url }) as RouterStateSnapshot;

describe('signedInGuard', () => {
  it('lets a person with a session through', async () => {
    const http = setUp();
    const passed = TestBed.runInInjectionContext(() => signedInGuard(route, at('/bench')));
    http.expectOne('/api/v1/session').flush(aSession());
    expect(await passed).toBe(true);
  });

  it('sends others to sign in and names the page they wanted', async () => {
    const http = setUp();
    const passed = TestBed.runInInjectionContext(() => signedInGuard(route, at('/tools')));
    const ended = [aProblem({ status: 401 }), { status: 401, statusText: 'Unauthorized' }] as const;
    http.expectOne('/api/v1/session').flush(...ended);
    http.expectOne('/api/v1/session/refresh').flush(...ended);
    const tree = (await passed) as UrlTree;
    expect(tree.toString()).toBe('/sign-in?then=%2Ftools');
  });
});

describe('mayGuard', () => {
  const people = mayGuard('manage-people');
  const ask = async (role: Role): Promise<unknown> => {
    const http = setUp();
    await signInAs(http, role);
    return TestBed.runInInjectionContext(() => people(route, at('/shop/people')));
  };
  it('opens a page to those the role table lets in', async () => {
    expect(await ask('admin')).toBe(true);
  });
  it('sends the others to the bench', async () => {
    expect(String(await ask('lead'))).toBe('/bench');
  });
});
