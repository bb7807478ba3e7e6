import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatCheckboxHarness } from '@angular/material/checkbox/testing';
import type { MachineDetails, SetupDocument } from '#contracts';
import { problemInterceptor } from '../http/problem-interceptor';
import { CurrentUser } from '../sign-in/current-user';
import { SetupImport } from './setup-import';
import { awaitRequest, settle } from './testing/await-request';
import { signInAs } from './testing/sign-in-as';
import { testMachine, testTool } from './testing/test-shop';

const MACHINE = testMachine();
const RECORD = testTool(4);

/** The setup file of the test machine, with parts of it written differently. */
function fileOf(change: Partial<SetupDocument> = {}): SetupDocument {
  const { machine, controller, rack, loading, work, macro } = MACHINE;
  return {
    format: 'nightlatch-setup',
    version: 1,
    machine,
    controller,
    rack,
    loading,
    tools: [RECORD.tool],
    offsets: { length: { '4': 92.4 }, work },
    ...(macro ? { changeMacro: macro } : {}),
    ...change,
  } as SetupDocument;
}

async function open(machine: MachineDetails | null = MACHINE) {
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(withInterceptors([problemInterceptor])),
      provideHttpClientTesting(),
    ],
  });
  const http = TestBed.inject(HttpTestingController);
  await signInAs(TestBed.inject(CurrentUser), http, ['lead']);
  const fixture = TestBed.createComponent(SetupImport);
  fixture.componentRef.setInput('machine', machine);
  const imported: MachineDetails[] = [];
  fixture.componentInstance.imported.subscribe((each) => imported.push(each));
  (await awaitRequest(http, '/api/v1/tools')).flush({ tools: [RECORD] });
  await settle(fixture);
  return { http, fixture, imported, loader: TestbedHarnessEnvironment.loader(fixture) };
}
type Opened = Awaited<ReturnType<typeof open>>;

/** Drops a file, as a person does; a file field cannot be filled from a script. */
async function drop({ fixture }: Opened, text: string): Promise<void> {
  const file = new File([text], 'north.json', { type: 'application/json' });
  // jsdom has no text() on files; a browser has.
  Object.defineProperty(file, 'text', { value: () => Promise.resolve(text) });
  const event = new Event('drop', { bubbles: true, cancelable: true });
  Object.defineProperty(event, 'dataTransfer', { value: { files: [file] } });
  (fixture.nativeElement as HTMLElement).querySelector('.drop')?.dispatchEvent(event);
  await settle(fixture);
}
const words = ({ fixture }: Opened) =>
  (fixture.nativeElement as HTMLElement).textContent?.replace(/\s+/g, ' ') ?? '';
const button = ({ loader }: Opened, text: string) =>
  loader.getHarness(MatButtonHarness.with({ text }));

describe('the import of a setup file', () => {
  it('names every wrong place by its path and sends nothing', async () => {
    const page = await open();
    const machine = { ...MACHINE.machine, rapid: undefined, colour: 'red' };
    const wrong = { ...fileOf(), machine, version: 2 };
    await drop(page, JSON.stringify(wrong));
    expect(words(page)).toContain('3 places in north.json to put right; nothing was imported.');
    expect(words(page)).toMatch(/machine\.rapid This is missing/);
    expect(words(page)).toContain('version Must be one of: 1.');
    expect(words(page)).toContain('Not known here: colour.');
    page.http.verify();
  });

  it('says where a file is no JSON', async () => {
    const page = await open();
    await drop(page, '');
    expect(words(page)).toContain('The file is empty.');
    await drop(page, '{"format": "nightlatch-setup",\n "version": 1,, }');
    expect(words(page)).toMatch(/The file is no JSON|breaks off or is no JSON/);
  });

  it('says that a file changes nothing, and offers no import', async () => {
    const page = await open();
    await drop(page, JSON.stringify(fileOf()));
    expect(words(page)).toContain('Nothing: all it says stands already.');
    expect(await page.loader.getAllHarnesses(MatButtonHarness)).toHaveLength(0);
  });

  it('shows what would change, and imports it as new revisions', async () => {
    const page = await open();
    const rapid = { ...MACHINE.machine.rapid, x: 21000 };
    const loading = { ...MACHINE.loading, pockets: [{ pocket: 2, tool: 7 }] };
    await drop(page, JSON.stringify(fileOf({ machine: { ...MACHINE.machine, rapid }, loading })));
    expect(words(page)).toContain('Rapid, X: 20000 mm/min, now 21000 mm/min');
    expect(words(page)).toContain('T7 went from pocket 1 into pocket 2.');
    await (await button(page, 'Import as new revisions')).click();
    const { request } = await awaitAndAnswer(page);
    expect(request.body).toMatchObject({
      reason: '',
      replaceTools: false,
      setup: { machine: { rapid: { x: 21000 } } },
    });
    expect(page.imported).toHaveLength(1);
  });

  it('waits for a word on tools that the shop has with other figures', async () => {
    const page = await open();
    const tools = [{ ...RECORD.tool, gaugeLength: 92.6, stickOut: 40.2 }];
    await drop(page, JSON.stringify(fileOf({ tools })));
    expect(words(page)).toContain('Gauge length: 92.4 mm, now 92.6 mm');
    expect(await (await button(page, 'Import as new revisions')).isDisabled()).toBe(true);
    await (await page.loader.getHarness(MatCheckboxHarness)).check();
    await (await button(page, 'Import as new revisions')).click();
    const { request } = await awaitAndAnswer(page);
    expect(request.body).toMatchObject({ replaceTools: true });
  });

  it('keeps the file in view when the server refuses it', async () => {
    const page = await open(null);
    await drop(page, JSON.stringify(fileOf()));
    await (await button(page, 'Add this machine')).click();
    (await awaitRequest(page.http, '/api/v1/machines', 'POST')).flush(
      {
        type: 'about:blank',
        title: 'Already there',
        status: 409,
        detail: 'A machine named North router is there already.',
        code: 'already-there',
      },
      { status: 409, statusText: 'Conflict' },
    );
    await settle(page.fixture);
    expect(words(page)).toContain('A machine named North router is there already.');
    expect(words(page)).toContain('north.json brings');
    expect(page.imported).toHaveLength(0);
  });
});

async function awaitAndAnswer(page: Opened) {
  const request = await awaitRequest(page.http, `/api/v1/machines/${MACHINE.id}/setup`, 'PUT');
  request.flush(MACHINE);
  await settle(page.fixture);
  return request;
}
