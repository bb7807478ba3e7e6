import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { MatRadioButtonHarness } from '@angular/material/radio/testing';
import { CurrentUser } from '../sign-in/current-user';
import { aPerson, aProblem } from '../testing/records';
import { setUp, settle, signInAs } from '../testing/set-up';
import { YouPage } from './you-page';

async function open() {
  const http = setUp();
  await signInAs(http, 'operator');
  const fixture = TestBed.createComponent(YouPage);
  await fixture.whenStable();
  const loader = TestbedHarnessEnvironment.loader(fixture);
  const passwords = async (...values: string[]): Promise<void> => {
    const fields = await loader.getAllHarnesses(
      MatInputHarness.with({ selector: '[type=password]' }),
    );
    for (const [index, value] of values.entries()) await fields[index]?.setValue(value);
    await (await loader.getHarness(MatButtonHarness.with({ text: 'Change the password' }))).click();
  };
  const text = (): string => (fixture.nativeElement as HTMLElement).textContent ?? '';
  return { http, fixture, loader, passwords, text };
}

describe('YouPage', () => {
  it('changes the units at once, for every page', async () => {
    const { http, fixture, loader } = await open();
    await (await loader.getHarness(MatRadioButtonHarness.with({ label: 'inches' }))).check();
    const request = http.expectOne('/api/v1/session/person');
    expect(request.request.body).toEqual({ units: 'inch' });
    request.flush(aPerson({ units: 'inch' }));
    await settle(fixture);
    expect(TestBed.inject(CurrentUser).units()).toBe('inch');
  });

  it('keeps the theme in this browser', async () => {
    const { loader } = await open();
    await (await loader.getHarness(MatRadioButtonHarness.with({ label: 'light' }))).check();
    expect(document.documentElement.getAttribute('data-theme')).toBe('light');
    expect(localStorage.getItem('nightlatch.theme')).toBe('light');
    await (await loader.getHarness(MatRadioButtonHarness.with({ label: /system/ }))).check();
    expect(document.documentElement.hasAttribute('data-theme')).toBe(false);
  });

  it('does not send a new password that was typed two ways', async () => {
    const { http, passwords, text } = await open();
    await passwords('the present one', 'twelve letters', 'twelve latters');
    http.expectNone('/api/v1/session/person');
    expect(text()).toContain('not the same as the new password');
  });

  it('says so when the present password is wrong', async () => {
    const { http, fixture, passwords, text } = await open();
    await passwords('wrong', 'twelve letters', 'twelve letters');
    const refusal = aProblem({ status: 400, detail: 'The present password is not right.' });
    http
      .expectOne('/api/v1/session/person')
      .flush(refusal, { status: 400, statusText: 'Bad Request' });
    await settle(fixture);
    expect(text()).toContain('The present password is not right.');
  });
});
