import { reportSchema } from '#contracts';
import { expect, test } from 'vitest';
import { defineRule, type FindingDraft, type Rule } from '../rules/rule';
import { runProgram } from '../testing/check-rule';

/** Reports every block that ends below program Z0, the deeper the worse. */
const deep = (change: Partial<Rule> = {}, draft: Partial<FindingDraft> = {}): Rule =>
  defineRule({
    id: 'deep',
    group: 'length',
    title: 'Deep',
    severity: 'stop',
    protects: 'Nothing.',
    explanation: 'For these tests only.',
    examples: { bad: '', good: '' },
    word: (data) => ({ message: `Is ${String(data['by'])} deep.`, advice: 'Raise it.' }),
    observe: (_shop, report) => ({
      motion(motion, state) {
        const by = GAUGE_AT_ZERO - motion.toZ;
        if (motion.by !== 'program' || by <= 0) return;
        report.found(
          { cause: 'z', by, at: state.place({ letters: 'Z' }), data: { by }, ...draft },
          state,
        );
      },
    }),
    ...change,
  });

/** G54 Z0 of the plain shop with no length applied: gauge point at −182. */
const GAUGE_AT_ZERO = -182;
const run = (program: string, rules: readonly Rule[], change: object = {}) =>
  runProgram(program.trim(), change, rules);

test('an episode counts violating blocks and names its first, last and worst, over clean ones between', () => {
  const { findings } = run(
    `
G90 G0 Z5
Z-1
Z-3
Z5
Z-3
Z-2
`,
    [deep()],
  );
  expect(findings).toEqual([
    expect.objectContaining({
      line: 2,
      endLine: 6,
      worstLine: 3,
      count: 4,
      columns: [1, 4],
      message: 'Is 3 deep.',
      data: { by: 3 },
    }),
  ]);
});

test('an episode ends at a tool change and at an offset change, and not at an offset stated again', () => {
  const { findings } = run(
    `
G90 G54 G0 Z-1
G54 Z-1
T1 M6
G90 G0 Z-1
T2 M6
Z-1
T1 M6
Z-1
G55 Z-1
`,
    [deep()],
    { offsets: { work: { G55: { x: 0, y: 0, z: -182 } } } },
  );
  expect(findings.map(({ line, count, tool }) => [line, count, tool])).toEqual([
    [1, 2, undefined],
    [4, 1, 1],
    [6, 1, 2],
    [8, 1, 1],
    [9, 1, 1],
  ]);
});

test('a block that violates twice counts once', () => {
  const twice = deep({
    observe: (_shop, report) => ({
      motion(_motion, state) {
        const draft = { cause: 'z', at: state.place(), data: {} };
        report.found(draft, state);
        report.found(draft, state);
      },
    }),
  });
  expect(run('G0 X1\nX2', [twice]).findings.map(({ count }) => count)).toEqual([2]);
});

test('causes, and severities of one rule, are episodes of their own', () => {
  const both = deep({
    observe: (_shop, report) => ({
      motion(_motion, state) {
        const draft = { at: state.place(), data: {} };
        report.found({ ...draft, cause: 'b' }, state);
        report.found({ ...draft, cause: 'a', severity: 'note' }, state);
        report.found({ ...draft, cause: 'a', severity: 'hold' }, state);
      },
    }),
    hold: 'look',
  });
  expect(run('G0 X1', [both]).findings.map(({ severity, hold }) => [severity, hold])).toEqual([
    ['stop', undefined],
    ['hold', 'look'],
    ['note', undefined],
  ]);
});

test('after 500 findings of a rule the rest fold into one', () => {
  const each = deep({
    observe: (_shop, report) => ({
      motion(_motion, state) {
        report.found({ cause: `${state.line}`, at: state.place(), data: {} }, state);
      },
    }),
  });
  const program = Array.from({ length: 612 }, (_, index) => `G0 X${index + 1}`).join('\n');
  const { findings, counts } = run(program, [each]);
  expect(findings).toHaveLength(501);
  expect(findings[500]).toMatchObject({
    line: 501,
    endLine: 612,
    count: 112,
    folded: 112,
    severity: 'stop',
    message: 'There are 112 more findings of this kind that are not listed one by one.',
    data: { folded: 112 },
  });
  expect(counts).toEqual({ stop: 501, hold: 0, note: 0 });
});

test('findings stand by line, then by severity, then by rule', () => {
  const rules = [
    deep({ id: 'note-first', severity: 'note' }),
    deep({ id: 'z-stop' }),
    deep({ id: 'a-stop' }),
    deep({ id: 'hold-it', severity: 'hold' }),
  ];
  const { findings } = run('G90 G0 Z-1\nT1 M6\nZ-2', rules);
  expect(findings.map(({ line, rule }) => `${line} ${rule}`)).toEqual([
    '1 a-stop',
    '1 z-stop',
    '1 hold-it',
    '1 note-first',
    '3 a-stop',
    '3 z-stop',
    '3 hold-it',
    '3 note-first',
  ]);
});

test('gives two verdicts, and names the unattended severity only where it differs', () => {
  const rules = [
    deep({ id: 'attended-note', severity: 'note', unattended: 'stop' }),
    deep({ id: 'same', severity: 'hold', unattended: 'note' }),
  ];
  const report = run('G90 G0 Z-1', rules);
  expect(report.findings.map(({ unattended }) => unattended)).toEqual([undefined, 'stop']);
  expect([report.verdict, report.counts]).toEqual(['held', { stop: 0, hold: 1, note: 1 }]);
  expect(report.unattended).toEqual({ verdict: 'stopped', counts: { stop: 1, hold: 1, note: 0 } });
  expect(run('G90 G0 Z5', rules).verdict).toBe('clear');
});

test('a shop may raise a severity and never lower one', () => {
  const raised = run('G90 G0 Z-1', [deep({ severity: 'note' })], {
    policy: { raise: { deep: 'hold' } },
  });
  expect(raised.findings[0]).toMatchObject({ severity: 'hold', hold: 'judge' });
  const kept = run('G90 G0 Z-1', [deep()], { policy: { raise: { deep: 'hold' } } });
  expect(kept.findings[0]).toMatchObject({ severity: 'stop' });
});

test('marks what only the reading with block delete on finds', () => {
  const { findings } = run(
    `
G90 G0 Z-1
G91
/G90
Z-1
T1 M6
/G90
Z-2
`,
    [deep()],
  );
  // Read as run, line 4 is at −1 and line 7 at −2; skipped, G91 stays on: −2 and −4.
  expect(
    findings.map(({ line, endLine, worstLine, blockDelete }) => [
      line,
      endLine,
      worstLine,
      blockDelete,
    ]),
  ).toEqual([
    [1, 4, 1, undefined],
    [1, 4, 4, 'on'],
    [7, 7, 7, undefined],
    [7, 7, 7, 'on'],
  ]);
});

test('a finding that both readings have stands once', () => {
  const { findings } = run('G90 G0 Z-1\n/M8\nZ-2', [deep()]);
  expect(findings.map(({ line, blockDelete }) => [line, blockDelete])).toEqual([[1, undefined]]);
});

test('counts lines with words, and takes off those the engine could not follow, once each', () => {
  const { coverage, program } = run('%\nG21 G90\n(REMARK)\nM250\nM250 M251\n\nM30\n', []);
  expect(coverage).toEqual({ blocks: 4, modelled: 2 });
  expect(program.lines).toBe(7);
});

test('rounds figures on entry, before they are worded', () => {
  const { findings } = run('G90 G0 Z-1.23456', [deep()]);
  expect(findings[0]).toMatchObject({ message: 'Is 1.235 deep.', data: { by: 1.235 } });
});

test('is what the report contract describes, key by key in its order', () => {
  const report = run('G90 G0 Z-1\n/Z-2\nM30', [deep({ severity: 'note', unattended: 'hold' })]);
  const parsed = reportSchema.parse(JSON.parse(JSON.stringify(report)));
  expect(parsed).toEqual(report);
  const { findings, ...rest } = report;
  expect(Object.keys(report)).toEqual([
    'format',
    'version',
    'engine',
    'program',
    'setup',
    'verdict',
    'counts',
    'unattended',
    'findings',
    'tools',
    'extents',
    'workZeroWindow',
    'seconds',
    'material',
    'coverage',
    'dependsOn',
    'blind',
  ]);
  expect(Object.keys(findings[0]!)).toEqual([
    'rule',
    'severity',
    'unattended',
    'line',
    'endLine',
    'worstLine',
    'count',
    'columns',
    'hold',
    'message',
    'advice',
    'data',
  ]);
  expect(rest.blind.every((sentence) => sentence.startsWith('Not seen: '))).toBe(true);
});
