import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatProgressBarHarness } from '@angular/material/progress-bar/testing';
import { CHECK, NORTH, REVISION, aBench, aCheck, aProblem } from '../testing/records';
import { FakeEvents, setUp, settle, signInAs } from '../testing/set-up';
import { BenchPage } from './bench-page';
import { BenchStore } from './bench-store';

async function openBench(bench: ReturnType<typeof aBench>) {
  const http = setUp();
  await signInAs(http, 'operator');
  TestBed.runInInjectionContext(() => TestBed.inject(BenchStore).follow());
  const fixture = TestBed.createComponent(BenchPage);
  http.expectOne('/api/v1/bench').flush(bench);
  await fixture.whenStable();
  const text = (): string => (fixture.nativeElement as HTMLElement).textContent ?? '';
  return { http, fixture, text, loader: TestbedHarnessEnvironment.loader(fixture) };
}

describe('BenchPage', () => {
  it('says what to do when nothing was checked yet', async () => {
    const { text } = await openBench(aBench());
    expect(text()).toContain('Nothing has been checked yet');
    expect(text()).toContain('No machine is described yet');
  });

  it('shows what stops a program and warns of a spindle nobody looked into', async () => {
    const checks = [aCheck({ verdict: 'stopped', counts: { stop: 2, hold: 1, note: 0 } })];
    const machines = [
      {
        id: NORTH,
        name: 'North router',
        inSpindle: 'unknown' as const,
        loaded: 3,
        pockets: 8,
        lastLoading: null,
      },
    ];
    const { text } = await openBench(aBench({ checks, machines }));
    expect(text()).toContain('2 stops, 1 hold');
    expect(text()).toContain('not known: look');
  });

  it('moves the bar as the events come', async () => {
    const checks = [aCheck({ state: 'running', linesRead: 0, verdict: null, counts: null })];
    const { fixture, loader, text } = await openBench(aBench({ checks }));
    FakeEvents.all[0]?.onopen?.();
    FakeEvents.all[0]?.say({
      checkId: CHECK,
      state: 'running',
      linesRead: 60,
      lines: 80,
      verdict: null,
    });
    await fixture.whenStable();
    const bar = await loader.getHarness(MatProgressBarHarness);
    expect(await bar.getValue()).toBe(75);
    expect(text()).toContain('60 of 80 lines');
  });

  it('asks again for a check that is out of date', async () => {
    const { http, loader } = await openBench(aBench({ checks: [aCheck({ outOfDate: true })] }));
    const button = await loader.getHarness(MatButtonHarness.with({ text: 'Check again' }));
    const clicked = button.click();
    await settle();
    const request = http.expectOne(`/api/v1/program-revisions/${REVISION}/checks`);
    expect(request.request.body).toEqual({ machineId: NORTH });
    request.flush(aCheck({ state: 'queued', verdict: null }), {
      status: 202,
      statusText: 'Accepted',
    });
    await clicked;
  });

  it('says what failed and reads again when asked', async () => {
    const http = setUp();
    await signInAs(http, 'operator');
    vi.useFakeTimers();
    TestBed.runInInjectionContext(() => TestBed.inject(BenchStore).follow());
    const refusal = aProblem({ status: 503, detail: 'The database is away.' });
    http.expectOne('/api/v1/bench').flush(refusal, { status: 503, statusText: 'Not ready' });
    vi.useRealTimers();
    const fixture = TestBed.createComponent(BenchPage);
    await fixture.whenStable();
    const alert = (fixture.nativeElement as HTMLElement).querySelector('[role=alert]');
    expect(alert?.textContent).toContain('The database is away.');
    expect(alert?.textContent).toContain('Try again');
  });
});
