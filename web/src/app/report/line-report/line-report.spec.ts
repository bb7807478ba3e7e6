import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { showFindings } from '../shown-finding';
import { FINDINGS, REVISION_ID } from '../testing/sample-check';
import { LineReport } from './line-report';

/** Program text whose every line says which one it is. */
function answerLines(http: HttpTestingController): number {
  const requests = http.match((request) => request.url.endsWith('/lines'));
  for (const each of requests) {
    const from = Number(each.request.params.get('from'));
    const to = Number(each.request.params.get('to'));
    const lines = Array.from({ length: to - from + 1 }, (_, index) => `G1 X${from + index}.`);
    each.flush({ from, lines, total: 500 });
  }
  return requests.length;
}

async function show(inputs: Record<string, unknown> = {}) {
  vi.useFakeTimers();
  TestBed.configureTestingModule({
    providers: [provideHttpClient(), provideHttpClientTesting()],
  });
  const fixture = TestBed.createComponent(LineReport);
  const all = {
    revisionId: REVISION_ID,
    lineCount: 500,
    findings: showFindings(FINDINGS, 'attended', 'mm'),
    ...inputs,
  };
  for (const [name, value] of Object.entries(all)) fixture.componentRef.setInput(name, value);
  const http = TestBed.inject(HttpTestingController);
  const host = fixture.nativeElement as HTMLElement;
  const settle = async (): Promise<number> => {
    await vi.advanceTimersByTimeAsync(100);
    const asked = answerLines(http);
    await vi.advanceTimersByTimeAsync(0);
    return asked;
  };
  await settle();
  const rows = () =>
    [...host.querySelectorAll('.line .number, .fold .number, .finding .message')].map((row) =>
      row.textContent.trim(),
    );
  return { component: fixture.componentInstance, host, http, settle, rows };
}
afterEach(() => vi.useRealTimers());

test('folds what is quiet and sets each finding below its line', async () => {
  const { rows } = await show();
  expect(rows()).toEqual([
    '1',
    '2',
    '3',
    '4',
    'Sentence of finding 11.',
    '5',
    '6–410',
    '411',
    '412',
    'Sentence of finding 12.',
    '413',
    '414–430',
    '431–498',
    '499',
    '500',
    'Sentence of finding 13.',
  ]);
});

test('underlines exactly the columns of a finding', async () => {
  const { host } = await show();
  const marked = [...host.querySelectorAll('.text .hold, .text .stop')];
  expect(marked.map((each) => [each.className, each.textContent])).toEqual([
    ['hold', '1 X4.'],
    ['stop', 'X412.'],
  ]);
});

test('fetches only the lines it shows, in chunks', async () => {
  vi.useFakeTimers();
  const { http, settle } = await show();
  expect(await settle()).toBe(0);
  http.verify();
});

test('a fold opens by one press, more with the next, and folds again', async () => {
  const { host, rows, settle, component } = await show();
  const fold = () => host.querySelector<HTMLButtonElement>('.fold .whole')!;
  expect(fold().getAttribute('aria-label')).toBe('Lines 6–410: 405 quiet lines. Unfold.');
  fold().click();
  await settle();
  expect(rows()).toContain('25');
  expect(fold().getAttribute('aria-label')).toContain('26–410');
  fold().click();
  await settle();
  // The second press opens two hundred more; the fold below begins where they end.
  component.showLine(226);
  await settle();
  expect(rows()).toContain('226');
  component.foldAll();
  await settle();
  expect(fold().getAttribute('aria-label')).toContain('6–410');
});

test('a repeat stretch says how many blocks are still the same finding', async () => {
  const { host } = await show();
  const repeat = host.querySelector('.fold.stop .words')!;
  expect(repeat.textContent.trim()).toBe('same finding, 8 more blocks');
});

test('next and previous walk the findings in reading order and stop at the ends', async () => {
  const { component, host, settle } = await show();
  const walked: (string | null)[] = [];
  for (const by of [1, 1, 1, 1, -1] as const) {
    component.step(by);
    await settle();
    walked.push(component.current());
  }
  expect(walked).toEqual(['11', '12', '13', '13', '12']);
  expect(host.querySelector('.current .message')!.textContent).toContain('finding 12');
  expect(host.querySelector('[aria-live]')!.textContent).toBe(
    'Finding 2 of 3, stop, line 412: Sentence of finding 12.',
  );
});

test('going to a folded line unfolds its surroundings and points it out', async () => {
  const { component, host, settle } = await show();
  component.showLine(200);
  await settle();
  expect(host.querySelector('.line.asked .number')!.textContent).toBe('200');
  expect(host.querySelector('.line.asked .text')!.textContent).toContain('X200.');
});

test('a line past the end is the last one', async () => {
  const { component, host, settle } = await show();
  component.showLine(9999);
  await settle();
  expect(host.querySelector('.line.asked .number')!.textContent).toBe('500');
});

test('the place of the worst block is one press away', async () => {
  const { host, settle } = await show();
  const worst = [...host.querySelectorAll<HTMLButtonElement>('.finding .place')].find((each) =>
    each.textContent.includes('worst'),
  )!;
  expect(worst.textContent.trim()).toBe('worst at line 415');
  worst.click();
  await settle();
  expect(host.querySelector('.line.asked .number')!.textContent).toBe('415');
});

test('says so when lines cannot be read, and reads them on the next try', async () => {
  vi.useFakeTimers();
  TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
  const fixture = TestBed.createComponent(LineReport);
  fixture.componentRef.setInput('revisionId', REVISION_ID);
  fixture.componentRef.setInput('lineCount', 3);
  fixture.componentRef.setInput('findings', []);
  const http = TestBed.inject(HttpTestingController);
  const host = fixture.nativeElement as HTMLElement;
  await vi.advanceTimersByTimeAsync(100);
  http.expectOne((each) => each.url.endsWith('/lines')).error(new ProgressEvent('error'));
  await vi.advanceTimersByTimeAsync(0);
  expect(host.querySelector('nl-notice')!.textContent).toContain('The server did not answer');
  host.querySelector<HTMLButtonElement>('nl-notice button')!.click();
  await vi.advanceTimersByTimeAsync(100);
  expect(answerLines(http)).toBe(1);
  await vi.advanceTimersByTimeAsync(0);
  expect(host.querySelector('nl-notice')).toBeNull();
  expect(host.textContent).toContain('G1 X3.');
});

test('Enter on the report unfolds its next stretch; on a button it is the button’s', async () => {
  const { host, rows, settle } = await show();
  const press = (on: Element) =>
    on.dispatchEvent(new KeyboardEvent('keydown', { key: 'Enter', bubbles: true }));
  press(host.querySelector('.finding .place')!);
  await settle();
  expect(rows()).toContain('6–410');
  press(host.querySelector('.scroller')!);
  await settle();
  expect(rows()).toContain('26–410');
});

test('an empty program shows what was found and waits for no text', async () => {
  const [empty] = FINDINGS;
  const finding = { ...empty!, line: 1, endLine: 1, worstLine: 1 };
  const { host, rows } = await show({
    lineCount: 0,
    findings: showFindings([finding], 'attended', 'mm'),
  });
  expect(rows()).toEqual(['1', 'Sentence of finding 11.']);
  expect(host.querySelector('.coming')).toBeNull();
});

test('a million lines make no more rows than a window holds', async () => {
  const { host, component, settle } = await show({ lineCount: 1_000_000, findings: [] });
  host.querySelector<HTMLButtonElement>('.ways button:last-child')!.click();
  await settle();
  expect(host.querySelectorAll('.line').length).toBeLessThan(120);
  const bar = host.querySelector<HTMLElement>('.bar')!;
  expect(bar.style.height).toBe('8000000px');
  component.showLine(654_321);
  await settle();
  expect(host.querySelector('.line.asked .number')!.textContent).toBe('654\u202f321');
  expect(host.querySelectorAll('.line').length).toBeLessThan(120);
});
