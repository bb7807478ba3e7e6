import { HttpClient } from '@angular/common/http';
import { TestBed } from '@angular/core/testing';
import { Router } from '@angular/router';
import { firstValueFrom } from 'rxjs';
import { CurrentUser } from '../sign-in/current-user';
import { aProblem, aSession } from '../testing/records';
import { setUp, settle, signInAs } from '../testing/set-up';

const ENDED = { status: 401, statusText: 'Unauthorized' };
const ended = aProblem({ status: 401, code: 'not-signed-in', detail: 'Not signed in.' });

describe('refreshInterceptor', () => {
  it('fetches a new token once for two requests and sends each again', async () => {
    const http = setUp();
    const client = TestBed.inject(HttpClient);
    const both = Promise.all([
      firstValueFrom(client.get('/api/v1/bench')),
      firstValueFrom(client.get('/api/v1/tools')),
    ]);
    http.expectOne('/api/v1/bench').flush(ended, ENDED);
    http.expectOne('/api/v1/tools').flush(ended, ENDED);
    http.expectOne('/api/v1/session/refresh').flush(aSession());
    http.expectOne('/api/v1/bench').flush('bench');
    http.expectOne('/api/v1/tools').flush('tools');
    expect(await both).toEqual(['bench', 'tools']);
    http.verify();
  });

  it('asks to sign in and comes back here when no new token is given', async () => {
    const http = setUp();
    await signInAs(http, 'operator');
    const router = TestBed.inject(Router);
    await router.navigateByUrl('/programs?search=door');
    const asked = firstValueFrom(TestBed.inject(HttpClient).get('/api/v1/bench'));
    const refused = expect(asked).rejects.toMatchObject({ status: 401 });
    http.expectOne('/api/v1/bench').flush(ended, ENDED);
    http.expectOne('/api/v1/session/refresh').flush(ended, ENDED);
    await refused;
    await settle();
    expect(TestBed.inject(CurrentUser).person()).toBeNull();
    expect(router.parseUrl(router.url).queryParams['then']).toBe('/programs?search=door');
  });

  it('does not sign anyone out because the server is away', async () => {
    const http = setUp();
    await signInAs(http, 'operator');
    const asked = firstValueFrom(TestBed.inject(HttpClient).get('/api/v1/bench'));
    const failed = expect(asked).rejects.toMatchObject({ status: 503 });
    http.expectOne('/api/v1/bench').flush(ended, ENDED);
    const away = aProblem({ status: 503, code: 'not-ready' });
    http.expectOne('/api/v1/session/refresh').flush(away, { status: 503, statusText: 'Not ready' });
    await failed;
    expect(TestBed.inject(CurrentUser).person()).not.toBeNull();
  });

  it('takes the session another tab has just renewed', async () => {
    vi.useFakeTimers();
    const http = setUp();
    const asked = firstValueFrom(TestBed.inject(HttpClient).get('/api/v1/bench'));
    http.expectOne('/api/v1/bench').flush(ended, ENDED);
    const twin = aProblem({ code: 'session-just-renewed' });
    http.expectOne('/api/v1/session/refresh').flush(twin, { status: 409, statusText: 'Conflict' });
    await vi.advanceTimersByTimeAsync(1_000);
    vi.useRealTimers();
    http.expectOne('/api/v1/session').flush(aSession());
    http.expectOne('/api/v1/bench').flush('bench');
    expect(await asked).toBe('bench');
  });

  it('does not try again when the request is refused a second time', async () => {
    const http = setUp();
    const asked = firstValueFrom(TestBed.inject(HttpClient).get('/api/v1/bench'));
    const refused = expect(asked).rejects.toMatchObject({ status: 401 });
    http.expectOne('/api/v1/bench').flush(ended, ENDED);
    http.expectOne('/api/v1/session/refresh').flush(aSession());
    http.expectOne('/api/v1/bench').flush(ended, ENDED);
    await refused;
    http.verify();
  });

  it('leaves a wrong password alone', async () => {
    const http = setUp();
    const body = { email: 'pia@example.com', password: 'wrong' };
    const asked = firstValueFrom(TestBed.inject(CurrentUser).signIn(body));
    const refused = expect(asked).rejects.toMatchObject({ status: 401 });
    http.expectOne('/api/v1/session').flush(ended, ENDED);
    await refused;
    http.verify();
  });

  it('passes other refusals on as they are', async () => {
    const http = setUp();
    const asked = firstValueFrom(TestBed.inject(HttpClient).get('/api/v1/bench'));
    const refused = expect(asked).rejects.toMatchObject({ code: 'not-possible-now' });
    http.expectOne('/api/v1/bench').flush(aProblem(), { status: 409, statusText: 'Conflict' });
    await refused;
    http.verify();
  });
});
