import type { StoredFinding } from '#contracts';
import { EVERYTHING, countSeverities, filterFindings, isOpen, showFindings } from './shown-finding';

function stored(id: string, more: Partial<StoredFinding> = {}): StoredFinding {
  return {
    id,
    rule: 'no-rule-of-this-version',
    severity: 'stop',
    line: 10,
    endLine: 10,
    worstLine: 10,
    count: 1,
    message: `Message ${id}.`,
    advice: 'Do something.',
    data: {},
    ...more,
  };
}
const FINDINGS = [
  stored('a', { severity: 'note', unattended: 'stop', tool: 4, line: 5, message: 'Pauses here.' }),
  stored('b', { severity: 'hold', tool: 7, line: 8 }),
  stored('c', { line: 12, tool: 4 }),
];

test('a finding has the severity of the run one thinks of, and says the other', () => {
  const attended = showFindings(FINDINGS, 'attended', 'mm');
  expect(attended.map((each) => [each.severity, each.otherwise])).toEqual([
    ['note', 'stop'],
    ['hold', null],
    ['stop', null],
  ]);
  const unattended = showFindings(FINDINGS, 'unattended', 'mm');
  expect(unattended.map((each) => [each.severity, each.otherwise])).toEqual([
    ['stop', 'note'],
    ['hold', null],
    ['stop', null],
  ]);
  expect(countSeverities(unattended)).toEqual({ stop: 2, hold: 1, note: 0 });
});

test('a finding of a rule this version does not know keeps the words it came with', () => {
  const [shown] = showFindings([stored('x')], 'attended', 'inch');
  expect(shown).toMatchObject({ message: 'Message x.', advice: 'Do something.' });
});

describe('the filter', () => {
  const shown = showFindings(FINDINGS, 'attended', 'mm');
  const ids = (change: Partial<typeof EVERYTHING>) =>
    filterFindings(shown, { ...EVERYTHING, ...change }).wanted.map(({ id }) => id);

  test('lets everything through when nothing is set', () => {
    expect(isOpen(EVERYTHING)).toBe(true);
    expect(filterFindings(shown, EVERYTHING)).toEqual({ wanted: shown, leftOut: [] });
  });
  test('by severity', () => {
    expect(ids({ severities: new Set(['stop', 'hold']) })).toEqual(['b', 'c']);
  });
  test('by tool', () => {
    expect(ids({ tool: 4 })).toEqual(['a', 'c']);
  });
  test('by words, all of which must occur, wherever they stand', () => {
    expect(ids({ text: 'pauses' })).toEqual(['a']);
    expect(ids({ text: 'something  MESSAGE' })).toEqual(['b', 'c']);
    expect(ids({ text: 'no-rule' })).toEqual(['a', 'b', 'c']);
  });
  test('keeps the lines of what it leaves out, so that no fold calls them quiet', () => {
    const { leftOut } = filterFindings(shown, { ...EVERYTHING, tool: 7 });
    expect(leftOut).toEqual([5, 12]);
  });
});
