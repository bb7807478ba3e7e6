import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { MATERIAL_ANIMATIONS } from '@angular/material/core';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatFormFieldHarness } from '@angular/material/form-field/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { provideRouter } from '@angular/router';
import type { Role } from '#contracts';
import { problemInterceptor } from '../http/problem-interceptor';
import { awaitRequest, settle } from '../machines/testing/await-request';
import { signInAs } from '../machines/testing/sign-in-as';
import { testTool } from '../machines/testing/test-shop';
import { CurrentUser } from '../sign-in/current-user';
import { ToolPage } from './tool-page';

const RECORD = testTool(4, {
  holder: {
    taper: 'ISO30',
    diameter: 50,
    above: 72,
    steps: [
      { diameter: 50, length: 12 },
      { diameter: 42, length: 40.4 },
    ],
  },
});

async function open(role: Role, toolId: string | null = RECORD.id) {
  TestBed.configureTestingModule({
    providers: [
      provideRouter([{ path: '**', children: [] }]),
      provideHttpClient(withInterceptors([problemInterceptor])),
      provideHttpClientTesting(),
      { provide: MATERIAL_ANIMATIONS, useValue: { animationsDisabled: true } },
    ],
  });
  const http = TestBed.inject(HttpTestingController);
  await signInAs(TestBed.inject(CurrentUser), http, [role]);
  const fixture = TestBed.createComponent(ToolPage);
  fixture.componentRef.setInput('toolId', toolId ?? undefined);
  (await awaitRequest(http, '/api/v1/tools')).flush({ tools: [RECORD] });
  if (toolId) {
    (await awaitRequest(http, `/api/v1/tools/${toolId}/revisions`)).flush({ revisions: [] });
  }
  await settle(fixture);
  return { http, fixture, loader: TestbedHarnessEnvironment.documentRootLoader(fixture) };
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
const words = () => document.body.textContent?.replace(/\s+/g, ' ') ?? '';

describe('the page of a tool', () => {
  it('shows holder steps against gauge length while they are typed', async () => {
    const page = await open('programmer');
    await press(page, 'Change');
    expect(words()).toContain(
      'The steps add up to 52.4 mm; between gauge line and holder face 52.4 mm. They agree.',
    );
    await (await field(page, 'Gauge length')).setValue('93');
    expect(words()).toContain('They may differ by 0.5 mm at most');
    await press(page, 'Save as tool 2');
    expect(words()).toContain('1 entry to put right');
    page.http.expectNone(`/api/v1/tools/${RECORD.id}`);
  });

  it('saves a change with both table entries beside it', async () => {
    const page = await open('programmer');
    await press(page, 'Change');
    await (await field(page, 'Name')).setValue('6 mm compression, new');
    await (await field(page, 'Diameter offset (D) (if any)')).setValue('6');
    await press(page, 'Save as tool 2');
    const { request } = await awaitRequest(page.http, `/api/v1/tools/${RECORD.id}`, 'PUT');
    expect(request.body).toEqual({
      basedOn: 1,
      reason: '',
      tool: { ...RECORD.tool, name: '6 mm compression, new' },
      lengthOffset: 92.4,
      diameterOffset: 6,
    });
  });

  it('asks for every figure of a new tool', async () => {
    const page = await open('programmer', null);
    await press(page, 'Add the tool');
    expect(words()).toMatch(/Diameter A figure is needed here/);
    expect(words()).toMatch(/Name Something must be written here/);
    page.http.expectNone('/api/v1/tools');
  });

  it('warns of a length far from the last one, and records it when told to', async () => {
    const page = await open('operator');
    await press(page, 'Measure');
    await (await field(page, 'Gauge length measured')).setValue('90');
    expect(words()).toContain('2.4 mm (0.09449 in) shorter than the last value.');
    expect(words()).toContain('so the stick-out becomes 37.6 mm');
    await press(page, 'Record the length');
    const path = `/api/v1/tools/${RECORD.id}/measurements`;
    const request = await awaitRequest(page.http, path, 'POST');
    expect(request.request.body).toEqual({ gaugeLength: 90, method: 'setter', inTable: true });
    request.flush(testTool(4, { gaugeLength: 90, stickOut: 37.6 }));
    (await awaitRequest(page.http, `/api/v1/tools/${RECORD.id}/revisions`)).flush({
      revisions: [],
    });
    await settle(page.fixture);
    expect(words()).toContain('Recorded 90 mm for T4.');
  });

  it('lets an operator measure, and not change the tool', async () => {
    const page = await open('operator');
    const change = MatButtonHarness.with({ text: 'Change' });
    expect(await page.loader.getAllHarnesses(change)).toHaveLength(0);
  });
});
