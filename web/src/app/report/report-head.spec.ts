import { factsOf, progressOf, verdictOf } from './report-head';
import { sampleDetails } from './testing/sample-check';

const NOW = new Date('2026-12-01T20:00:00Z');

test('the facts name program, bytes, machine state and how long the check took', () => {
  const facts = factsOf(sampleDetails(), NOW);
  expect(facts).toMatchObject({
    revision: 'revision 3',
    hash: '9f2c…b41e',
    lines: '500 lines',
    against: 'machine 2 · rack 1 · loading 41 · offsets 12 · macro 7',
  });
  expect(facts.when).toMatch(/^checked \d\d:\d\d, took 0\.31 s$/);
});

test('a check that is not over was not checked at any time yet', () => {
  expect(factsOf(sampleDetails({ state: 'running', finishedAt: null }), NOW).when).toBe('');
});

test('progress is a share of the lines, never above all, and none while waiting', () => {
  expect(progressOf({ state: 'running', lines: 500, linesRead: 125 }).share).toBe(25);
  expect(progressOf({ state: 'running', lines: 500, linesRead: 501 }).share).toBe(100);
  expect(progressOf({ state: 'running', lines: 0, linesRead: 0 }).share).toBe(0);
  expect(progressOf({ state: 'queued', lines: 500, linesRead: 0 })).toMatchObject({
    share: 0,
    lead: 'Waiting.',
  });
});

test('the lowest of all tools is told in the person’s unit; without motion there is none', () => {
  const summary = sampleDetails().summary!;
  const tools = [-2, -18.4, null].map((lowest, index) => ({
    ...summary.tools[0]!,
    number: index + 1,
    changes: 2,
    lowest,
  }));
  expect(verdictOf({ ...summary, tools }, 'mm')).toMatchObject({
    lowest: '−18.4 mm',
    changes: '6',
  });
  expect(verdictOf({ ...summary, tools }, 'inch').lowest).toBe('−0.724 in');
  expect(verdictOf({ ...summary, tools: [] }, 'mm').lowest).toBe('–');
});
