import type { StoredFinding } from '#contracts';
import { marksOf } from './rack-marks';
import type { ShownFinding } from './shown-finding';

function shown(rule: string, more: Partial<ShownFinding> = {}, data = {}): ShownFinding {
  const finding = { rule, data } as unknown as StoredFinding;
  return { severity: 'stop', tool: 4, ...more, finding } as ShownFinding;
}

test('a finding about a tool is a word at its pocket', () => {
  expect(marksOf([shown('tool-not-loaded')])).toEqual([
    { tool: 4, severity: 'stop', word: 'not loaded' },
  ]);
});

test('findings about motion are no fault of the rack', () => {
  expect(marksOf([shown('beyond-travel')])).toEqual([]);
});

test('a note is no mark', () => {
  expect(marksOf([shown('life-short', { severity: 'note' })])).toEqual([]);
});

test('the same rule for the same tool is told once, at its gravest, stops first', () => {
  const marks = marksOf([
    shown('tool-comment-disagrees', { severity: 'hold', tool: 7 }),
    shown('length-offset-disagrees', { severity: 'hold' }),
    shown('length-offset-disagrees'),
    shown('length-offset-disagrees', { severity: 'hold' }),
  ]);
  expect(marks).toEqual([
    { tool: 4, severity: 'stop', word: 'length differs' },
    { tool: 7, severity: 'hold', word: 'not as named' },
  ]);
});

test('takes the tool from the finding’s figures where it names none itself', () => {
  expect(marksOf([shown('tool-unknown', { tool: null }, { tool: 31 })])).toMatchObject([
    { tool: 31 },
  ]);
});
