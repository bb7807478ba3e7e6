import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import type { HttpTestingController, TestRequest } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { MatPaginatorHarness } from '@angular/material/paginator/testing';
import { MatSortHarness } from '@angular/material/sort/testing';
import { MatTableHarness } from '@angular/material/table/testing';
import { RouterTestingHarness } from '@angular/router/testing';
import { EAST, NORTH, aCheck, aProgram } from '../testing/records';
import { setUp, settle, signInAs } from '../testing/set-up';
import { ProgramListPage } from './program-list-page';

const machine = (id: string, name: string) => ({
  ...{ id, name, edge: 'back', pockets: 8, loaded: 7, revision: 1, loadingRevision: 1 },
});

/** The one list request under way, with any older ones that it replaced. */
function listRequest(http: HttpTestingController): TestRequest {
  return http.match((request) => request.url === '/api/v1/programs').at(-1)!;
}

async function open(address = '/programs', programs = [aProgram()], total = programs.length) {
  const http = setUp([{ path: 'programs', component: ProgramListPage }]);
  await signInAs(http, 'programmer');
  const harness = await RouterTestingHarness.create();
  await harness.navigateByUrl(address);
  await settle();
  http
    .expectOne('/api/v1/machines')
    .flush({ machines: [machine(NORTH, 'North router'), machine(EAST, 'East router')] });
  const first = listRequest(http);
  first.flush({ programs, total });
  await settle(harness.fixture);
  return {
    http,
    first,
    fixture: harness.fixture,
    loader: TestbedHarnessEnvironment.loader(harness.fixture),
    text: () => harness.routeNativeElement?.textContent ?? '',
  };
}

describe('ProgramListPage', () => {
  it('asks for what the address says', async () => {
    const { first } = await open('/programs?search=door&verdict=held&offset=25');
    const { params } = first.request;
    expect(params.get('search')).toBe('door');
    expect(params.get('verdict')).toBe('held');
    expect(params.get('offset')).toBe('25');
  });

  it('shows each program with its newest check on every machine', async () => {
    const checks = [
      aCheck({ verdict: 'stopped', counts: { stop: 1, hold: 0, note: 0 } }),
      aCheck({ machineId: EAST, machineName: 'East router', outOfDate: true }),
    ];
    const { loader } = await open(undefined, [aProgram({ checks })]);
    const table = await loader.getHarness(MatTableHarness);
    const [row] = await table.getCellTextByIndex();
    expect(row?.[0]).toContain('door.nc');
    expect(row?.[1]).toMatch(/stopped.*North router · 1 stop.*clear.*East router · out of date/s);
  });

  it('sorts on the server when a heading is chosen', async () => {
    const { http, loader } = await open();
    const sort = await loader.getHarness(MatSortHarness);
    const [lines] = await sort.getSortHeaders({ label: 'Lines' });
    await lines?.click();
    await settle();
    const { params } = listRequest(http).request;
    expect([params.get('sort'), params.get('direction')]).toEqual(['lines', 'asc']);
  });

  it('turns the page on the server', async () => {
    const { http, loader } = await open(undefined, [aProgram()], 60);
    const paginator = await loader.getHarness(MatPaginatorHarness);
    await paginator.goToNextPage();
    await settle();
    expect(listRequest(http).request.params.get('offset')).toBe('25');
  });

  it('asks once for what was typed, when the typing pauses', async () => {
    const { http, fixture, loader } = await open();
    const search = await loader.getHarness(MatInputHarness.with({ selector: '[type=search]' }));
    vi.useFakeTimers();
    const typing = search.setValue('hinge');
    await vi.advanceTimersByTimeAsync(400);
    await typing;
    vi.useRealTimers();
    await fixture.whenStable();
    const asked = http.match((request) => request.url === '/api/v1/programs');
    expect(asked.map(({ request }) => request.params.get('search'))).toEqual(['hinge']);
  });

  it('says what to do when there are no programs, and when none fits', async () => {
    const empty = await open(undefined, []);
    expect(empty.text()).toContain('No programs yet');
    TestBed.resetTestingModule();
    const filtered = await open('/programs?search=zzz', []);
    expect(filtered.text()).toContain('No program fits');
  });
});
