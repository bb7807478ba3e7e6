import { layRows } from './line-rows';
import {
  FOLD_HEIGHT,
  LINE_HEIGHT,
  USUAL_FINDING_HEIGHT,
  placeOfFinding,
  placeOfLine,
  rowsWithin,
  stackRows,
  totalOf,
} from './stack-rows';

const FINDINGS = [
  { id: 'a', severity: 'stop' as const, line: 4, endLine: 4, count: 1 },
  { id: 'b', severity: 'hold' as const, line: 412, endLine: 412, count: 1 },
];
const SEGMENTS = layRows({ lines: 500, findings: FINDINGS, leftOut: [], opened: [] });
const unmeasured = (): undefined => undefined;

test('lines, folds and findings add up', () => {
  const stack = stackRows(SEGMENTS, unmeasured);
  // 1-4, 5, 411-412, 413, 500 are lines; two folds; two findings.
  expect(totalOf(stack)).toBe(9 * LINE_HEIGHT + 2 * FOLD_HEIGHT + 2 * USUAL_FINDING_HEIGHT);
});

test('a measured finding takes the room it needs', () => {
  const stack = stackRows(SEGMENTS, (index) => (index === 0 ? 200 : undefined));
  expect(placeOfFinding(stack, 0)).toMatchObject({ top: 4 * LINE_HEIGHT, height: 200 });
  expect(placeOfLine(stack, 5)!.top).toBe(4 * LINE_HEIGHT + 200);
});

test('the window gives the rows that touch it, and no others', () => {
  const stack = stackRows(SEGMENTS, unmeasured);
  const rows = rowsWithin(stack, 30, 90);
  expect(rows.map((row) => row.line)).toEqual([2, 3, 4, 4]);
  expect(rows[0]!.top).toBe(LINE_HEIGHT);
  expect(rows.at(-1)!.top).toBe(4 * LINE_HEIGHT);
});

test('the whole window at once is every row once', () => {
  const stack = stackRows(SEGMENTS, unmeasured);
  const rows = rowsWithin(stack, 0, totalOf(stack));
  expect(rows).toHaveLength(9 + 2 + 2);
  rows
    .slice(1)
    .forEach((row, index) => expect(row.top).toBe(rows[index]!.top + rows[index]!.height));
});

test('a million unfolded lines cost only the rows in the window', () => {
  const segments = layRows({
    lines: 1_000_000,
    findings: [],
    leftOut: [],
    opened: [{ from: 1, to: 1_000_000 }],
  });
  const stack = stackRows(segments, unmeasured);
  expect(segments).toHaveLength(1);
  expect(totalOf(stack)).toBe(1_000_000 * LINE_HEIGHT);
  const rows = rowsWithin(stack, 12_000_000, 480);
  expect(rows[0]!.line).toBe(500_001);
  expect(rows).toHaveLength(20);
  expect(rowsWithin(stack, 24_000_000 - 24, 480).map((row) => row.line)).toEqual([1_000_000]);
});

test('finds a line where it stands, or the fold that holds it', () => {
  const stack = stackRows(SEGMENTS, unmeasured);
  const fold = placeOfLine(stack, 200)!;
  expect(SEGMENTS[fold.segment]).toMatchObject({ kind: 'quiet', from: 6, to: 410 });
  const line = placeOfLine(stack, 412)!;
  expect(SEGMENTS[line.segment]).toMatchObject({ kind: 'lines', to: 412 });
  expect(placeOfLine(stack, 501)).toBeNull();
});

test('a finding that the filter left out has no place', () => {
  expect(placeOfFinding(stackRows(SEGMENTS, unmeasured), 7)).toBeNull();
});
