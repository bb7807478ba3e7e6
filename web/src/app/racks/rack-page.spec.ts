import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import type { ComponentFixture } from '@angular/core/testing';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MATERIAL_ANIMATIONS } from '@angular/material/core';
import { MatSelectHarness } from '@angular/material/select/testing';
import { provideRouter } from '@angular/router';
import type { Role } from '#contracts';
import { problemInterceptor } from '../http/problem-interceptor';
import { awaitRequest, settle } from '../machines/testing/await-request';
import { signInAs } from '../machines/testing/sign-in-as';
import { testMachine, testTool } from '../machines/testing/test-shop';
import { CurrentUser } from '../sign-in/current-user';
import { RackPage } from './rack-page';

const MACHINE = testMachine();
const PATH = `/api/v1/machines/${MACHINE.id}`;
const TOOLS = [
  testTool(4),
  testTool(7),
  testTool(9, { holder: { taper: 'BT30', diameter: 46, above: 70 } }),
  testTool(30, { gaugeLength: 180 }),
];
const LOADED = {
  pockets: [
    { pocket: 1, tool: 7 },
    { pocket: 5, tool: 4 },
  ],
  inSpindle: null,
  byHand: [],
};

async function open(role: Role) {
  TestBed.configureTestingModule({
    providers: [
      provideRouter([]),
      provideHttpClient(withInterceptors([problemInterceptor])),
      provideHttpClientTesting(),
      { provide: MATERIAL_ANIMATIONS, useValue: { animationsDisabled: true } },
    ],
  });
  const http = TestBed.inject(HttpTestingController);
  await signInAs(TestBed.inject(CurrentUser), http, [role]);
  const fixture = TestBed.createComponent(RackPage);
  fixture.componentRef.setInput('machineId', MACHINE.id);
  TestBed.tick();
  http.expectOne('/api/v1/machines').flush({ machines: [] });
  http.expectOne(PATH).flush(MACHINE);
  http.expectOne('/api/v1/tools').flush({ tools: TOOLS });
  (await awaitRequest(http, `${PATH}/loading/revisions`)).flush({ revisions: [] });
  await fixture.whenStable();
  return { http, fixture, loader: TestbedHarnessEnvironment.documentRootLoader(fixture) };
}
type Opened = Awaited<ReturnType<typeof open>>;

async function press({ loader }: Opened, text: string): Promise<void> {
  await (await loader.getHarness(MatButtonHarness.with({ text }))).click();
}
async function pressLabelled({ loader }: Opened, label: string): Promise<void> {
  const selector = `[aria-label="${label}"]`;
  await (await loader.getHarness(MatButtonHarness.with({ selector }))).click();
}
/** A touch on a tool in the chooser, which stands in an overlay outside the page. */
async function touchTool({ fixture }: Opened, number: number): Promise<void> {
  const offers = [...document.querySelectorAll<HTMLButtonElement>('button.offer')];
  offers.find((each) => each.textContent?.includes(`T${number}`))?.click();
  await fixture.whenStable();
}
async function loadT4IntoPocket5(page: Opened): Promise<void> {
  await pressLabelled(page, 'Load pocket 5');
  await touchTool(page, 4);
}
const words = ({ fixture }: { fixture: ComponentFixture<RackPage> }) =>
  (fixture.nativeElement as HTMLElement).textContent?.replace(/\s+/g, ' ') ?? '';
const conflict = {
  type: 'about:blank',
  title: 'Changed meanwhile',
  status: 409,
  detail: 'Another revision came first.',
  code: 'revision-conflict',
};

describe('the rack page', () => {
  it('loads T4 into pocket 5 in three touches: pocket, tool, save', async () => {
    const page = await open('operator');
    await loadT4IntoPocket5(page);
    expect(words(page)).toContain('T4 (4 mm compression) goes into pocket 5.');

    await press(page, 'Save as loading 42');
    const { request } = await awaitRequest(page.http, `${PATH}/loading`, 'PUT');
    expect(request.body).toEqual({ basedOn: 41, reason: '', loading: LOADED });
  });

  it('shows the saved loading, and that programs are checked again', async () => {
    const page = await open('operator');
    await loadT4IntoPocket5(page);
    await press(page, 'Save as loading 42');
    (await awaitRequest(page.http, `${PATH}/loading`, 'PUT')).flush(
      testMachine({
        loading: LOADED,
        loadingRevision: { ...MACHINE.loadingRevision, number: 42 },
      }),
    );
    (await awaitRequest(page.http, `${PATH}/loading/revisions`)).flush({ revisions: [] });
    (await awaitRequest(page.http, '/api/v1/machines')).flush({ machines: [] });
    (await awaitRequest(page.http, '/api/v1/tools')).flush({ tools: TOOLS });
    await settle(page.fixture);
    expect(words(page)).toContain('loading 42');
    expect(words(page)).not.toContain('goes into pocket 5');
    expect(document.body.textContent).toContain('are checked again');
  });

  it('undoes a change before it is saved', async () => {
    const page = await open('operator');
    await pressLabelled(page, 'Take T7 out of pocket 1');
    expect(words(page)).toContain('Pocket 1 is emptied.');
    await pressLabelled(page, 'Undo: Pocket 1 is emptied.');
    expect(words(page)).not.toContain('Save as loading');
    expect(page.fixture.componentInstance.hasUnsaved()).toBe(false);
  });

  it('tells who saved first and what they changed, and keeps my change on top of theirs', async () => {
    const page = await open('operator');
    await loadT4IntoPocket5(page);
    await press(page, 'Save as loading 42');
    (await awaitRequest(page.http, `${PATH}/loading`, 'PUT')).flush(conflict, {
      status: 409,
      statusText: 'Conflict',
    });
    (await awaitRequest(page.http, PATH)).flush(
      testMachine({
        loading: { pockets: [{ pocket: 2, tool: 7 }], inSpindle: null, byHand: [] },
        loadingRevision: {
          number: 42,
          madeBy: 'Ben',
          madeAt: '2026-11-30T19:00:00Z',
          reason: 'night queue',
        },
      }),
    );
    await settle(page.fixture);
    expect(words(page)).toMatch(/Ben saved loading 42 .* while you were changing it/);
    expect(words(page)).toContain('Their reason: night queue');
    expect(words(page)).toContain('T7 (7 mm compression) went from pocket 1 into pocket 2.');
    expect(words(page)).toContain('T4 (4 mm compression) goes into pocket 5.');

    const going = press(page, 'Go on from theirs with my changes');
    (await awaitRequest(page.http, `${PATH}/loading/revisions`)).flush({ revisions: [] });
    await going;
    await press(page, 'Save as loading 43');
    const { request } = await awaitRequest(page.http, `${PATH}/loading`, 'PUT');
    expect(request.body).toMatchObject({
      basedOn: 42,
      loading: {
        pockets: [
          { pocket: 2, tool: 7 },
          { pocket: 5, tool: 4 },
        ],
      },
    });
  });

  it('shows what the server says when it refuses, and keeps the change', async () => {
    const page = await open('operator');
    await loadT4IntoPocket5(page);
    await press(page, 'Save as loading 42');
    (await awaitRequest(page.http, `${PATH}/loading`, 'PUT')).flush(
      { ...conflict, status: 422, detail: 'Pocket 5 is not in the rack.' },
      { status: 422, statusText: 'Unprocessable' },
    );
    await settle(page.fixture);
    expect(words(page)).toContain('Pocket 5 is not in the rack.');
    expect(words(page)).toContain('T4 (4 mm compression) goes into pocket 5.');
  });

  it('refuses a tool of another taper and says why', async () => {
    const page = await open('operator');
    await pressLabelled(page, 'Load pocket 5');
    expect(document.body.textContent).toContain('Its holder is BT30, pocket 5 is cut for ISO30.');
    await touchTool(page, 9);
    expect(page.fixture.componentInstance.hasUnsaved()).toBe(false);
  });

  it('records a tool that is too long only on a second touch', async () => {
    const page = await open('operator');
    await pressLabelled(page, 'Load pocket 5');
    await touchTool(page, 30);
    expect(page.fixture.componentInstance.hasUnsaved()).toBe(false);
    expect(document.body.textContent).toContain('Too long: 180 mm, and the pocket takes 150 mm.');
    await press(page, 'T30 stands there: record it');
    expect(words(page)).toContain('T30 (30 mm compression) goes into pocket 5.');
  });

  it('records what the spindle holds', async () => {
    const page = await open('operator');
    const select = await page.loader.getHarness(MatSelectHarness);
    expect(await select.getValueText()).toBe('nothing');
    await select.clickOptions({ text: 'not known' });
    expect(words(page)).toContain('The spindle holds something unknown.');
  });

  it('shows an admin, who may not load, the same facts without a way to change them', async () => {
    const page = await open('admin');
    expect(words(page)).toContain('7 mm compression');
    expect(words(page)).toContain('Recorded: nothing');
    expect(await page.loader.getAllHarnesses(MatButtonHarness)).toHaveLength(1);
    expect(await page.loader.getAllHarnesses(MatSelectHarness)).toHaveLength(0);
  });
});
