import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatFormFieldHarness } from '@angular/material/form-field/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import type { Role, Units } from '#contracts';
import { problemInterceptor } from '../http/problem-interceptor';
import { CurrentUser } from '../sign-in/current-user';
import { MachineOnPage } from './machine-on-page';
import { MachinePartPage } from './machine-part-page';
import type { PartName } from './machine-parts';
import { MACHINE_PARTS } from './machine-parts';
import { awaitRequest, settle } from './testing/await-request';
import { signInAs } from './testing/sign-in-as';
import { testMachine } from './testing/test-shop';

const MACHINE = testMachine();
const PATH = `/api/v1/machines/${MACHINE.id}`;

async function open(part: PartName, role: Role, units: Units = 'mm') {
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(withInterceptors([problemInterceptor])),
      provideHttpClientTesting(),
      MachineOnPage,
    ],
  });
  const http = TestBed.inject(HttpTestingController);
  await signInAs(TestBed.inject(CurrentUser), http, [role], units);
  TestBed.inject(MachineOnPage).open(MACHINE.id);
  const fixture = TestBed.createComponent(MachinePartPage);
  fixture.componentRef.setInput('part', part);
  (await awaitRequest(http, PATH)).flush(MACHINE);
  const subject = part === 'controller' ? 'description' : part;
  (await awaitRequest(http, `${PATH}/${subject}/revisions`)).flush({ revisions: [] });
  await settle(fixture);
  return { http, fixture, loader: TestbedHarnessEnvironment.loader(fixture) };
}
type Opened = Awaited<ReturnType<typeof open>>;

async function field({ loader }: Opened, label: string): Promise<MatInputHarness> {
  const box = await loader.getHarness(MatFormFieldHarness.with({ floatingLabelText: label }));
  const control = await box.getControl(MatInputHarness);
  if (!control) throw new Error(`${label} is no text field`);
  return control;
}
async function press({ loader }: Opened, text: string): Promise<void> {
  await (await loader.getHarness(MatButtonHarness.with({ text }))).click();
}
const words = ({ fixture }: Opened) =>
  (fixture.nativeElement as HTMLElement).textContent?.replace(/\s+/g, ' ') ?? '';

describe('a rack by itself', () => {
  it('is refused with a pocket number that stands twice, as a whole setup would be', () => {
    const { pockets } = MACHINE.rack;
    const twice = { ...MACHINE.rack, pockets: [...pockets, { ...pockets[0]!, number: 2 }] };
    const held = MACHINE_PARTS.rack.validate(twice);
    if (held.success) throw new Error('It was not refused');
    expect(held.error.issues).toEqual([
      expect.objectContaining({
        path: ['pockets', 3, 'number'],
        message: 'pocket 2 stands here twice',
      }),
    ]);
    expect(MACHINE_PARTS.rack.validate(MACHINE.rack).success).toBe(true);
  });
});

describe('the page of one part of a machine', () => {
  it('shows the same facts to everyone, and the way to change them only to those who may', async () => {
    const page = await open('description', 'operator');
    expect(words(page)).toContain('0 to 1300 mm');
    const change = MatButtonHarness.with({ text: 'Change' });
    expect(await page.loader.getAllHarnesses(change)).toHaveLength(0);
  });

  it('marks each wrong entry, says where it is, keeps it and sends nothing', async () => {
    const page = await open('description', 'lead');
    await press(page, 'Change');
    await (await field(page, 'Least speed')).setValue('fast');
    await (await field(page, 'Height of its top')).setValue('');
    await press(page, 'Save as description 4');
    expect(words(page)).toContain('2 entries to put right; nothing was saved, nothing lost.');
    expect(words(page)).toContain('Spindle, Least speed “fast” is not a number.');
    expect(await (await field(page, 'Least speed')).getValue()).toBe('fast');
    const box = await page.loader.getHarness(
      MatFormFieldHarness.with({ floatingLabelText: 'Least speed' }),
    );
    expect(await box.getTextErrors()).toEqual(['“fast” is not a number.']);
    page.http.expectNone(`${PATH}/description`);
  });

  it('makes no revision when nothing was changed', async () => {
    const page = await open('description', 'lead', 'inch');
    await press(page, 'Change');
    await press(page, 'Save as description 4');
    page.http.expectNone(`${PATH}/description`);
    expect(words(page)).not.toContain('Save as description');
  });

  it('saves what was typed in inches as millimetres, on the revision it was read at', async () => {
    const page = await open('description', 'lead', 'inch');
    await press(page, 'Change');
    await (await field(page, 'Height of its top')).setValue('-7 7/8');
    await press(page, 'Save as description 4');
    const request = await awaitRequest(page.http, `${PATH}/description`, 'PUT');
    expect(request.request.body).toMatchObject({
      basedOn: 3,
      machine: {
        // −7.875 in at exactly 25.4 mm an inch; what nobody touched is sent as it was stored.
        spoilboard: { top: -200.025, allowance: 1 },
        travel: { x: [0, 1300], y: [0, 2650], z: [-220, 0] },
      },
      controller: MACHINE.controller,
    });
  });

  it('keeps my change on top of what another person saved first, and names what both changed', async () => {
    const page = await open('description', 'lead');
    await press(page, 'Change');
    await (await field(page, 'Height of its top')).setValue('-199');
    await press(page, 'Save as description 4');
    (await awaitRequest(page.http, `${PATH}/description`, 'PUT')).flush(
      {
        type: 'about:blank',
        title: 'Changed meanwhile',
        status: 409,
        detail: 'Another revision came first.',
        code: 'changed-meanwhile',
      },
      { status: 409, statusText: 'Conflict' },
    );
    const spoilboard = { top: -198, allowance: 2 };
    (await awaitRequest(page.http, PATH)).flush(
      testMachine({
        machine: { ...MACHINE.machine, spoilboard },
        revision: {
          number: 4,
          madeBy: 'Ben',
          madeAt: '2026-12-01T09:00:00Z',
          reason: 'resurfaced',
        },
      }),
    );
    (await awaitRequest(page.http, `${PATH}/description/revisions`)).flush({ revisions: [] });
    await settle(page.fixture);
    expect(words(page)).toMatch(/Ben saved description 4 .* while you were changing it/);
    expect(words(page)).toContain('Spoilboard, Cut into it allowed: 1 mm, now 2 mm');
    expect(words(page)).toMatch(/You both changed this.*Spoilboard, Height of its top: −198 mm/);

    await press(page, 'Go on from theirs with my changes');
    expect(await (await field(page, 'Height of its top')).getValue()).toBe('-199');
    expect(await (await field(page, 'Cut into it allowed')).getValue()).toBe('2');
    await press(page, 'Save as description 5');
    const again = await awaitRequest(page.http, `${PATH}/description`, 'PUT');
    expect(again.request.body).toMatchObject({
      basedOn: 4,
      machine: { spoilboard: { top: -199, allowance: 2 } },
    });
  });
});
