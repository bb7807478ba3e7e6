import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Router, provideRouter } from '@angular/router';
import { Subject } from 'rxjs';
import type { CheckDetails } from '#contracts';
import { ShopEvents } from '../http/shop-events';
import { CurrentUser } from '../sign-in/current-user';
import { ReportPage } from './report-page';
import {
  CHECK_ID,
  MACHINE_ID,
  REVISION_ID,
  sampleDetails,
  samplePage,
} from './testing/sample-check';

const ADDRESS = `/api/v1/checks/${CHECK_ID}`;

async function show(details: CheckDetails, inputs: Record<string, unknown> = {}) {
  const permitted = signal(true);
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(),
      provideHttpClientTesting(),
      provideRouter([]),
      { provide: ShopEvents, useValue: { progress$: new Subject(), live: signal(true) } },
      { provide: CurrentUser, useValue: { units: signal('mm'), may: () => permitted() } },
    ],
  });
  const fixture = TestBed.createComponent(ReportPage);
  for (const [name, value] of Object.entries({ id: CHECK_ID, ...inputs })) {
    fixture.componentRef.setInput(name, value);
  }
  const http = TestBed.inject(HttpTestingController);
  await fixture.whenStable();
  http.expectOne(ADDRESS).flush(details);
  await fixture.whenStable();
  if (details.check.state === 'done') {
    http.expectOne((each) => each.url === `${ADDRESS}/findings`).flush(samplePage());
    http.expectOne(`${ADDRESS}/path`).flush({ tolerance: 0.1, truncated: false, runs: [] });
    await fixture.whenStable();
  }
  const host = fixture.nativeElement as HTMLElement;
  const button = (words: string) =>
    [...host.querySelectorAll('button')].find((each) => each.textContent.trim().startsWith(words))!;
  return { fixture, host, http, button, permitted };
}

test('says what was checked against what, and the verdict for both kinds of run', async () => {
  const { host } = await show(sampleDetails());
  const header = host.querySelector('nl-page-header')!.textContent;
  for (const words of [
    'door-left.nc',
    'revision 3',
    '9f2c…b41e',
    '500 lines',
    'loading 41',
    'took 0.31 s',
  ]) {
    expect(header).toContain(words);
  }
  const banner = host.querySelector('nl-verdict-banner')!.textContent;
  expect(banner).toContain('Stopped.');
  expect(banner).toContain(
    '1 finding forbids this run, 1 waits for an answer, 1 is worth knowing.',
  );
  expect(banner).toContain('All 500 lines were understood.');
  expect(banner).toContain('2 findings forbid this run');
  expect(banner).toContain('Prove the first run');
  expect(banner).toContain('1 h 12 min');
});

test('shows rack, lines, findings, tools, zero and what it cannot see', async () => {
  const { host } = await show(sampleDetails());
  expect(host.querySelector('nl-rack-strip')!.textContent).toContain('pocket 2');
  expect(host.querySelectorAll('nl-finding-list nl-finding-card')).toHaveLength(3);
  expect(host.querySelector('nl-tools-used')!.textContent).toContain('6 mm compression');
  expect(host.querySelector('nl-work-zero')!.textContent).toContain(
    'move it at least 44.2 mm to the left',
  );
  expect(host.querySelector('nl-what-it-covers')!.textContent).toContain('A loose collet.');
});

test('a deep link shows its finding at once', async () => {
  const { host } = await show(sampleDetails(), { finding: '12' });
  expect(host.querySelector('nl-line-report .current .message')!.textContent).toContain(
    'finding 12',
  );
});

test('a deep link to a line points it out', async () => {
  const { host } = await show(sampleDetails(), { line: '222' });
  expect(host.querySelector('.line.asked .number')!.textContent).toBe('222');
});

test('the severity filter leaves findings out everywhere, and the fold says so', async () => {
  const { fixture, host, button } = await show(sampleDetails());
  button('hold').click();
  await fixture.whenStable();
  expect(host.querySelectorAll('nl-finding-list nl-finding-card')).toHaveLength(2);
  expect(host.querySelector('.fold .words')!.textContent).toContain('1 finding not shown');
});

test('for an unattended run a finding has its severity of that run', async () => {
  const { fixture, host, button } = await show(sampleDetails());
  const kinds = () =>
    [...host.querySelectorAll('nl-finding-list nl-finding-card')].map((each) => each.classList[0]);
  expect(kinds()).toEqual(['hold', 'stop', 'note']);
  button('unattended').click();
  await fixture.whenStable();
  expect(kinds()).toEqual(['hold', 'stop', 'stop']);
});

test('says that the loading has changed since, by its revisions', async () => {
  const { fixture, host, http } = await show(sampleDetails({ outOfDate: true }));
  const revision = (number: number) => ({ number, madeBy: null, madeAt: '', reason: '' });
  const setup = sampleDetails().setup as Record<string, unknown>;
  http.expectOne(`/api/v1/machines/${MACHINE_ID}`).flush({
    id: MACHINE_ID,
    name: 'North router',
    machine: setup['machine'],
    controller: setup['controller'],
    revision: revision(2),
    rack: setup['rack'],
    rackRevision: revision(1),
    loading: setup['loading'],
    loadingRevision: revision(42),
    work: {},
    offsetRevision: revision(12),
    macro: null,
    macroRevision: null,
  });
  await fixture.whenStable();
  expect(host.querySelector('nl-notice')!.textContent).toContain(
    'The loading is at revision 42 now; the check was held against 41.',
  );
});

test('checks again on the same machine and goes to the new check', async () => {
  const { fixture, http, button } = await show(sampleDetails());
  const router = TestBed.inject(Router);
  const went = vi.spyOn(router, 'navigate').mockResolvedValue(true);
  button('Check again').click();
  const asked = http.expectOne(`/api/v1/program-revisions/${REVISION_ID}/checks`);
  expect(asked.request.body).toEqual({ machineId: MACHINE_ID });
  asked.flush(sampleDetails({ id: MACHINE_ID, state: 'queued' }).check);
  await fixture.whenStable();
  expect(went).toHaveBeenCalledWith(['/checks', MACHINE_ID]);
});

test('a check that goes on has no verdict and says not to run', async () => {
  const { host, button } = await show(
    sampleDetails({ state: 'running', linesRead: 200, verdict: null }, { summary: null }),
  );
  const banner = host.querySelector('nl-verdict-banner')!.textContent;
  expect(banner).toContain('200 of 500 lines read.');
  expect(banner).toContain('do not run');
  expect(button('Check again').disabled).toBe(true);
  expect(host.querySelector('nl-line-report')).toBeNull();
});

test('a failed check says why and is never taken for clear', async () => {
  const { host } = await show(
    sampleDetails(
      { state: 'failed', verdict: null, failure: 'The setup was gone.' },
      { summary: null },
    ),
  );
  const banner = host.querySelector('nl-verdict-banner')!;
  expect(banner.classList).toContain('failed');
  expect(banner.textContent).toContain('The setup was gone.');
  expect(banner.textContent).toContain('Nothing is known about this program');
});

test('a check that is not there is said so, and can be asked for again', async () => {
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(),
      provideHttpClientTesting(),
      provideRouter([]),
      { provide: ShopEvents, useValue: { progress$: new Subject(), live: signal(true) } },
      { provide: CurrentUser, useValue: { units: signal('mm'), may: () => true } },
    ],
  });
  const fixture = TestBed.createComponent(ReportPage);
  fixture.componentRef.setInput('id', CHECK_ID);
  const http = TestBed.inject(HttpTestingController);
  await fixture.whenStable();
  const problem = {
    type: 'about:blank',
    title: 'Not found',
    status: 404,
    detail: 'There is no such check in this shop.',
    code: 'no-such-check',
  };
  http.expectOne(ADDRESS).flush(problem, { status: 404, statusText: 'Not Found' });
  await fixture.whenStable();
  const host = fixture.nativeElement as HTMLElement;
  expect(host.textContent).toContain('There is no such check in this shop.');
  host.querySelector<HTMLButtonElement>('nl-notice button')!.click();
  http.expectOne(ADDRESS);
});
