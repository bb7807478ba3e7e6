import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Subject } from 'rxjs';
import type { CheckProgress } from '#contracts';
import { ShopEvents } from '../http/shop-events';
import { FINDINGS_AT_ONCE } from './check-client';
import { CheckReport } from './check-report';
import {
  CHECK_ID,
  FINDINGS,
  MACHINE_ID,
  sampleDetails,
  sampleFinding,
  samplePage,
} from './testing/sample-check';

const ADDRESS = `/api/v1/checks/${CHECK_ID}`;
const PATH = { tolerance: 0.1, truncated: false, runs: [] };

function open() {
  const progress$ = new Subject<CheckProgress>();
  const live = signal(true);
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(),
      provideHttpClientTesting(),
      { provide: ShopEvents, useValue: { progress$, live } },
      CheckReport,
    ],
  });
  const report = TestBed.inject(CheckReport);
  const http = TestBed.inject(HttpTestingController);
  report.open(CHECK_ID);
  return { report, http, progress$, live };
}
const told = (more: Partial<CheckProgress>): CheckProgress => ({
  checkId: CHECK_ID,
  state: 'running',
  linesRead: 100,
  lines: 500,
  verdict: null,
  ...more,
});

test('reads a finished check with its findings and path', () => {
  const { report, http } = open();
  http.expectOne(ADDRESS).flush(sampleDetails());
  http.expectOne((each) => each.url === `${ADDRESS}/findings`).flush(samplePage());
  http.expectOne(`${ADDRESS}/path`).flush(PATH);
  expect(report.findings()).toEqual(FINDINGS);
  expect(report.setup()?.rack.pockets).toHaveLength(2);
  expect(report.path()).toEqual(PATH);
  http.verify();
});

test('reads all findings, page after page', () => {
  const { report, http } = open();
  http.expectOne(ADDRESS).flush(sampleDetails());
  http.expectOne(`${ADDRESS}/path`).flush(PATH);
  const page = Array.from({ length: FINDINGS_AT_ONCE }, (_, index) => sampleFinding(`${index}`));
  const total = FINDINGS_AT_ONCE + 1;
  const asked = (offset: number) =>
    http.expectOne(
      (each) => each.url.endsWith('/findings') && each.params.get('offset') === `${offset}`,
    );
  asked(0).flush({ findings: page, total });
  asked(FINDINGS_AT_ONCE).flush({ findings: [sampleFinding('last')], total });
  expect(report.findings()).toHaveLength(total);
  http.verify();
});

test('follows a running check by events and reads it anew when it is over', () => {
  const { report, http, progress$ } = open();
  http
    .expectOne(ADDRESS)
    .flush(sampleDetails({ state: 'running', linesRead: 0 }, { summary: null }));
  progress$.next(told({ linesRead: 250 }));
  progress$.next(told({ checkId: MACHINE_ID, linesRead: 1 }));
  expect(report.check()).toMatchObject({ state: 'running', linesRead: 250 });
  progress$.next(told({ state: 'done', linesRead: 500, verdict: 'stopped' }));
  http.expectOne(ADDRESS).flush(sampleDetails());
  http.expectOne((each) => each.url.endsWith('/findings')).flush(samplePage());
  http.expectOne(`${ADDRESS}/path`).flush(PATH);
  expect(report.check()?.state).toBe('done');
});

test('asks instead while no events come', () => {
  vi.useFakeTimers();
  try {
    const { report, http, live } = open();
    live.set(false);
    http.expectOne(ADDRESS).flush(sampleDetails({ state: 'queued' }, { summary: null }));
    vi.advanceTimersByTime(2_000);
    http
      .expectOne(ADDRESS)
      .flush(sampleDetails({ state: 'running', linesRead: 42 }, { summary: null }));
    expect(report.check()).toMatchObject({ state: 'running', linesRead: 42 });
    vi.advanceTimersByTime(2_000);
    http.expectOne(ADDRESS).error(new ProgressEvent('error'));
    expect(report.problem()).toBeNull();
    vi.advanceTimersByTime(2_000);
    http
      .expectOne(ADDRESS)
      .flush(sampleDetails({ state: 'failed', failure: 'It broke off.' }, { summary: null }));
    http
      .expectOne(ADDRESS)
      .flush(sampleDetails({ state: 'failed', failure: 'It broke off.' }, { summary: null }));
    expect(report.check()).toMatchObject({ state: 'failed', failure: 'It broke off.' });
    vi.advanceTimersByTime(10_000);
    http.verify();
  } finally {
    vi.useRealTimers();
  }
});

test('reads the machine of today only when something has changed since', () => {
  const { http } = open();
  http.expectOne(ADDRESS).flush(sampleDetails({ outOfDate: true }));
  http.expectOne(`/api/v1/machines/${MACHINE_ID}`).error(new ProgressEvent('error'));
  http.expectOne((each) => each.url.endsWith('/findings')).flush(samplePage());
  http.expectOne(`${ADDRESS}/path`).flush(PATH);
  http.verify();
});

test('findings that cannot be read are a problem of their own; the path still comes', () => {
  const { report, http } = open();
  http.expectOne(ADDRESS).flush(sampleDetails());
  http.expectOne((each) => each.url.endsWith('/findings')).error(new ProgressEvent('error'));
  http.expectOne(`${ADDRESS}/path`).flush(PATH);
  expect(report.findingsProblem()?.message).toBe('The server did not answer.');
  expect(report.findings()).toBeNull();
  expect(report.path()).toEqual(PATH);
});

test('a setup that this page cannot read leaves the rest of the report standing', () => {
  const { report, http } = open();
  http.expectOne(ADDRESS).flush(sampleDetails({}, { setup: { format: 'something else' } }));
  expect(report.setup()).toBeNull();
  expect(report.details()).not.toBeNull();
});
