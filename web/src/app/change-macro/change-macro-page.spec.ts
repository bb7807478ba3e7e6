import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { provideRouter } from '@angular/router';
import type { Role } from '#contracts';
import { problemInterceptor } from '../http/problem-interceptor';
import { awaitRequest, settle } from '../machines/testing/await-request';
import { signInAs } from '../machines/testing/sign-in-as';
import { testMachine } from '../machines/testing/test-shop';
import { CurrentUser } from '../sign-in/current-user';
import { ChangeMacroPage } from './change-macro-page';

const MACRO = { name: 'change.ngc', text: 'M5\r\nG53 G0 Z0\r\nM30\r\n' };
const MACHINE = testMachine({ macro: MACRO });
const PATH = `/api/v1/machines/${MACHINE.id}`;

async function open(role: Role, machine = MACHINE) {
  TestBed.configureTestingModule({
    providers: [
      provideRouter([]),
      provideHttpClient(withInterceptors([problemInterceptor])),
      provideHttpClientTesting(),
    ],
  });
  const http = TestBed.inject(HttpTestingController);
  await signInAs(TestBed.inject(CurrentUser), http, [role]);
  const fixture = TestBed.createComponent(ChangeMacroPage);
  fixture.componentRef.setInput('machineId', MACHINE.id);
  (await awaitRequest(http, '/api/v1/machines')).flush({ machines: [] });
  (await awaitRequest(http, PATH)).flush(machine);
  (await awaitRequest(http, `${PATH}/macro/revisions`)).flush({ revisions: [] });
  await settle(fixture);
  return { http, fixture, loader: TestbedHarnessEnvironment.loader(fixture) };
}
type Opened = Awaited<ReturnType<typeof open>>;

async function press({ loader }: Opened, text: string): Promise<void> {
  await (await loader.getHarness(MatButtonHarness.with({ text }))).click();
}
async function type({ fixture }: Opened, text: string): Promise<void> {
  const area = (fixture.nativeElement as HTMLElement).querySelector('textarea');
  if (!area) throw new Error('Nothing to type in');
  area.value = text;
  area.dispatchEvent(new Event('input'));
  await settle(fixture);
}
const words = ({ fixture }: Opened) =>
  (fixture.nativeElement as HTMLElement).textContent?.replace(/\s+/g, ' ') ?? '';

describe('the change macro', () => {
  it('is shown to everyone with the sentence that it is not proven', async () => {
    const page = await open('operator');
    expect(words(page)).toContain('The macro is kept, not proven.');
    expect(words(page)).toContain('G53 G0 Z0');
    expect(words(page)).toContain('3 lines');
    expect(await page.loader.getAllHarnesses(MatButtonHarness)).toHaveLength(0);
  });

  it('says that every check holds where the controller runs the macro', async () => {
    const controller = { ...MACHINE.controller, toolChange: 'macro' };
    const page = await open('lead', testMachine({ macro: MACRO, controller }));
    expect(words(page)).toContain('every check holds at its first change');
  });

  it('is saved as a revision with the line ends it had', async () => {
    const page = await open('lead');
    await press(page, 'Change it');
    expect(page.fixture.componentInstance.hasUnsaved()).toBe(false);
    await type(page, 'M5\nG4 P6\nG53 G0 Z0\nM30\n');
    expect(words(page)).toContain('From line 2: 1 line added.');
    await press(page, 'Save as macro 8');
    const { request } = await awaitRequest(page.http, `${PATH}/macro`, 'PUT');
    expect(request.body).toEqual({
      basedOn: 7,
      reason: '',
      macro: { name: 'change.ngc', text: 'M5\r\nG4 P6\r\nG53 G0 Z0\r\nM30\r\n' },
    });
  });

  it('shows what another person saved first, and keeps mine as typed', async () => {
    const page = await open('lead');
    await press(page, 'Change it');
    await type(page, 'M5\nM30\n');
    await press(page, 'Save as macro 8');
    (await awaitRequest(page.http, `${PATH}/macro`, 'PUT')).flush(
      {
        type: 'about:blank',
        title: 'Changed meanwhile',
        status: 409,
        detail: 'Another revision came first.',
        code: 'changed-meanwhile',
      },
      { status: 409, statusText: 'Conflict' },
    );
    (await awaitRequest(page.http, PATH)).flush(
      testMachine({
        macro: { ...MACRO, text: 'M5\r\nM9\r\nG53 G0 Z0\r\nM30\r\n' },
        macroRevision: { number: 8, madeBy: 'Ben', madeAt: '2026-12-01T09:00:00Z', reason: '' },
      }),
    );
    await settle(page.fixture);
    expect(words(page)).toMatch(/Ben saved macro 8/);
    expect(words(page)).toContain('From line 2: 1 line added.');
    const going = press(page, 'Go on from theirs with my changes');
    (await awaitRequest(page.http, `${PATH}/macro/revisions`)).flush({ revisions: [] });
    await going;
    await press(page, 'Save as macro 9');
    const { request } = await awaitRequest(page.http, `${PATH}/macro`, 'PUT');
    expect(request.body).toMatchObject({ basedOn: 8, macro: { text: 'M5\r\nM30\r\n' } });
  });
});
