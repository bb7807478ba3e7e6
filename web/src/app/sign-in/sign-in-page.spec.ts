import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import type { ComponentFixture } from '@angular/core/testing';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { Router } from '@angular/router';
import { aProblem, aSession } from '../testing/records';
import { setUp, settle } from '../testing/set-up';
import { SignInPage } from './sign-in-page';

const DEMO = [{ email: 'lead@example.com', password: 'a long password', roles: ['lead' as const] }];

async function open(welcome: object = { needsFirstPerson: false, demo: [] }, then?: string) {
  const http = setUp();
  const fixture: ComponentFixture<SignInPage> = TestBed.createComponent(SignInPage);
  if (then) fixture.componentRef.setInput('then', then);
  http.expectOne('/api/v1/welcome').flush(welcome);
  await fixture.whenStable();
  const loader = TestbedHarnessEnvironment.loader(fixture);
  const [email, password] = await loader.getAllHarnesses(MatInputHarness);
  return {
    http,
    fixture,
    loader,
    email: email!,
    password: password!,
    submit: await loader.getHarness(MatButtonHarness.with({ text: 'Sign in' })),
    text: () => (fixture.nativeElement as HTMLElement).textContent ?? '',
    router: TestBed.inject(Router),
  };
}

describe('SignInPage', () => {
  it('signs in and returns to the page that was left', async () => {
    const page = await open(undefined, '/programs?search=door');
    await page.email.setValue('pia@example.com');
    await page.password.setValue('post then prove');
    await page.submit.click();
    const request = page.http.expectOne('/api/v1/session');
    expect(request.request.body).toEqual({
      email: 'pia@example.com',
      password: 'post then prove',
    });
    request.flush(aSession());
    await settle();
    expect(page.router.url).toBe('/programs?search=door');
  });

  it('sends nothing and says what is missing when a field is empty', async () => {
    const page = await open();
    await page.submit.click();
    page.http.expectNone('/api/v1/session');
    expect(page.text()).toContain('Type your password.');
  });

  it('says how long sign-in is paused and keeps what was typed', async () => {
    const page = await open();
    await page.email.setValue('pia@example.com');
    await page.password.setValue('wrong for the eleventh time');
    await page.submit.click();
    const paused = aProblem({
      status: 429,
      code: 'sign-in-paused',
      detail: 'Sign-in for this address is paused for 14 more minutes.',
    });
    page.http.expectOne('/api/v1/session').flush(paused, { status: 429, statusText: 'Paused' });
    await settle(page.fixture);
    expect(page.text()).toContain('paused for 14 more minutes');
    expect(await page.email.getValue()).toBe('pia@example.com');
    expect(await page.password.getValue()).toBe('wrong for the eleventh time');
  });

  it('lists the demo sign-ins and uses the one chosen', async () => {
    const page = await open({ needsFirstPerson: false, demo: DEMO });
    expect(page.text()).toContain('a long password');
    const lead = await page.loader.getHarness(MatButtonHarness.with({ text: 'lead' }));
    await lead.click();
    const { body } = page.http.expectOne('/api/v1/session').request;
    expect(body).toEqual({ email: 'lead@example.com', password: 'a long password' });
  });

  it('leads to the first set-up while there is nobody', async () => {
    const page = await open({ needsFirstPerson: true, demo: [] });
    await settle();
    expect(page.router.url).toBe('/first-run');
  });

  it('says when a session has ended', async () => {
    const page = await open();
    page.fixture.componentRef.setInput('ended', 'true');
    await page.fixture.whenStable();
    expect(page.text()).toContain('Your session has ended');
  });
});
