import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatCheckboxHarness } from '@angular/material/checkbox/testing';
import { MatDialogHarness } from '@angular/material/dialog/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { MatSnackBarHarness } from '@angular/material/snack-bar/testing';
import { aPerson, aProblem } from '../testing/records';
import { setUp, settle, signInAs } from '../testing/set-up';
import { PeoplePage } from './people-page';

const LEN_ID = '00000000-0000-4000-8000-0000000000e2';
const ADA = aPerson({ name: 'Ada', roles: ['admin'] });
const LEN = aPerson({ id: LEN_ID, name: 'Len', email: 'len@example.com', roles: ['lead'] });

async function open() {
  const http = setUp();
  await signInAs(http, 'admin');
  const fixture = TestBed.createComponent(PeoplePage);
  http.expectOne('/api/v1/people').flush({ people: [LEN, ADA] });
  await settle(fixture);
  const root = TestbedHarnessEnvironment.documentRootLoader(fixture);
  const press = async (text: string | RegExp): Promise<void> =>
    (await root.getHarness(MatButtonHarness.with({ text }))).click();
  const text = (): string => (fixture.nativeElement as HTMLElement).textContent ?? '';
  return { http, fixture, root, press, text };
}

describe('PeoplePage', () => {
  it('lists everyone by name and offers nobody to deactivate themselves', async () => {
    const { root, text } = await open();
    expect(text()).toMatch(/Ada.*Len/s);
    const buttons = await root.getAllHarnesses(MatButtonHarness.with({ text: /^Deactivate/ }));
    expect(buttons).toHaveLength(1);
  });

  it('adds a person with a role and a first password', async () => {
    const { http, fixture, root, press, text } = await open();
    await press(/Add a person/);
    const dialog = await root.getHarness(MatDialogHarness);
    const [name, email, password] = await dialog.getAllHarnesses(MatInputHarness);
    await name?.setValue('Ode');
    await email?.setValue('ode@example.com');
    await password?.setValue('rack before router');
    await (await dialog.getHarness(MatCheckboxHarness.with({ label: /^operator/ }))).check();
    await press('Add the person');
    const request = http.expectOne({ method: 'POST', url: '/api/v1/people' });
    expect(request.request.body).toEqual({
      name: 'Ode',
      email: 'ode@example.com',
      password: 'rack before router',
      roles: ['operator'],
    });
    request.flush(aPerson({ id: LEN_ID, name: 'Ode' }), { status: 201, statusText: 'Created' });
    await settle(fixture);
    expect(text()).toContain('Ode');
  });

  it('asks for a role before it sends, and keeps what was typed when the server refuses', async () => {
    const { http, fixture, root, press } = await open();
    await press(/Add a person/);
    const dialog = await root.getHarness(MatDialogHarness);
    const [name, email, password] = await dialog.getAllHarnesses(MatInputHarness);
    await name?.setValue('Len');
    await email?.setValue('len@example.com');
    await password?.setValue('rack before router');
    await press('Add the person');
    http.expectNone({ method: 'POST', url: '/api/v1/people' });
    expect(await dialog.getText()).toContain('Tick at least one role.');
    await (await dialog.getHarness(MatCheckboxHarness.with({ label: /^lead/ }))).check();
    await press('Add the person');
    const taken = aProblem({ code: 'already-there', detail: 'len@example.com is here already.' });
    http
      .expectOne({ method: 'POST', url: '/api/v1/people' })
      .flush(taken, { status: 409, statusText: 'Conflict' });
    await settle(fixture);
    expect(await dialog.getText()).toContain('len@example.com is here already.');
    expect(await email?.getValue()).toBe('len@example.com');
  });

  it('deactivates only after a yes', async () => {
    const { http, fixture, press, text } = await open();
    await press(/^Deactivate/);
    await press('Leave as it is');
    await settle(fixture);
    http.expectNone(`/api/v1/people/${LEN_ID}`);
    await press(/^Deactivate/);
    await press('Deactivate');
    await settle(fixture);
    const request = http.expectOne(`/api/v1/people/${LEN_ID}`);
    expect(request.request.body).toEqual({ active: false });
    request.flush({ ...LEN, active: false });
    await settle(fixture);
    expect(text()).toContain('Let in again');
  });

  it('says why the last admin stays', async () => {
    const { http, fixture, root, press } = await open();
    await press(/^Deactivate/);
    await press('Deactivate');
    await settle(fixture);
    const refusal = aProblem({ detail: 'This would leave the shop without an active admin.' });
    http
      .expectOne(`/api/v1/people/${LEN_ID}`)
      .flush(refusal, { status: 409, statusText: 'Conflict' });
    await settle(fixture);
    const said = await root.getHarness(MatSnackBarHarness);
    expect(await said.getMessage()).toContain('without an active admin');
  });
});
