import { expect, test } from 'vitest';
import { runProgram } from '../testing/check-rule';
import { RULES } from './catalogue';
import { wordFinding } from './word-finding';

test('words every stored finding as the report does, from its figures alone', () => {
  for (const rule of RULES) {
    const { findings } = runProgram(rule.examples.bad, rule.examples.setup ?? {});
    for (const finding of JSON.parse(JSON.stringify(findings)) as typeof findings) {
      const { message, advice } = finding;
      expect(wordFinding(finding, 'both')).toEqual({ message, advice });
    }
  }
});

test('words lengths in the reader’s own unit', () => {
  const finding = {
    rule: 'too-long-for-pocket',
    data: { tool: 1, name: 'end mill', pocket: 2, gaugeLength: 190.5, longest: 190 },
  };
  expect(wordFinding(finding, 'mm').message).toBe(
    'T1 (end mill) is 190.5 mm long from the gauge line; pocket 2 takes 190 mm.',
  );
  expect(wordFinding(finding, 'inch').message).toBe(
    'T1 (end mill) is 7.5 in long from the gauge line; pocket 2 takes 7.48 in.',
  );
});

test('words folded findings, and says so of a rule it does not know', () => {
  expect(wordFinding({ rule: 'beyond-travel', data: { folded: 1 } }, 'mm').message).toBe(
    'There is 1 more finding of this kind that is not listed one by one.',
  );
  expect(wordFinding({ rule: 'gone', data: {} }, 'mm').message).toBe(
    'The rule gone is not known to this version.',
  );
});
