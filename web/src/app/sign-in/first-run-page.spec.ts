import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { Router } from '@angular/router';
import { aProblem, aSession } from '../testing/records';
import { setUp, settle } from '../testing/set-up';
import { FirstRunPage } from './first-run-page';

async function open(needsFirstPerson = true) {
  const http = setUp();
  const fixture = TestBed.createComponent(FirstRunPage);
  http.expectOne('/api/v1/welcome').flush({ needsFirstPerson, demo: [] });
  await fixture.whenStable();
  const loader = TestbedHarnessEnvironment.loader(fixture);
  const fill = async (...values: string[]): Promise<void> => {
    const inputs = await loader.getAllHarnesses(MatInputHarness);
    for (const [index, value] of values.entries()) await inputs[index]?.setValue(value);
  };
  const submit = await loader.getHarness(MatButtonHarness.with({ text: 'Set up the shop' }));
  return { http, fixture, fill, submit };
}

describe('FirstRunPage', () => {
  it('makes the shop and its first person', async () => {
    const { http, fill, submit } = await open();
    await fill('A shop', 'Ana', 'ana@example.com', 'twelve letters');
    await submit.click();
    const request = http.expectOne('/api/v1/first-person');
    expect(request.request.body).toEqual({
      shopName: 'A shop',
      name: 'Ana',
      email: 'ana@example.com',
      password: 'twelve letters',
    });
    request.flush(aSession(['admin', 'lead']));
    await settle();
    expect(TestBed.inject(Router).url).toBe('/bench');
  });

  it('does not send a password that is too short', async () => {
    const { http, fixture, fill, submit } = await open();
    await fill('A shop', 'Ana', 'ana@example.com', 'eleven char');
    await submit.click();
    http.expectNone('/api/v1/first-person');
    expect((fixture.nativeElement as HTMLElement).textContent).toContain('at least 12 characters');
  });

  it('says so when someone else was first', async () => {
    const { http, fixture, fill, submit } = await open();
    await fill('A shop', 'Ana', 'ana@example.com', 'twelve letters');
    await submit.click();
    const refusal = aProblem({ detail: 'The shop is set up already.' });
    http.expectOne('/api/v1/first-person').flush(refusal, { status: 409, statusText: 'Conflict' });
    await settle(fixture);
    expect((fixture.nativeElement as HTMLElement).textContent).toContain('set up already');
  });

  it('leaves for the sign-in page once a person exists', async () => {
    await open(false);
    await settle();
    expect(TestBed.inject(Router).url).toBe('/sign-in');
  });
});
