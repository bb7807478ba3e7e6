import { readdirSync, readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { describe, expect, test } from 'vitest';
import { runProgram } from '../testing/check-rule';
import { RULES } from './catalogue';
import type { Rule } from './rule';

const folder = dirname(fileURLToPath(import.meta.url));
const ruleFiles = readdirSync(folder).filter(
  (file) =>
    file.endsWith('.ts') &&
    !file.endsWith('.spec.ts') &&
    / = defineRule\(/.test(readFileSync(join(folder, file), 'utf8')),
);

/** What one rule finds in one of its own example programs. */
function findings(rule: Rule, program: string, run: Rule = rule) {
  const report = runProgram(program, rule.examples.setup ?? {}, [run]);
  return report.findings.filter((finding) => finding.rule === rule.id);
}

test('every rule file is in the catalogue, under an id equal to its file name', () => {
  expect([...RULES].map((rule) => `${rule.id}.ts`).sort()).toEqual([...ruleFiles].sort());
});

test('every rule has a spec beside it', () => {
  const specs = new Set(readdirSync(folder).filter((file) => file.endsWith('.spec.ts')));
  expect(RULES.map((rule) => `${rule.id}.spec.ts`).filter((spec) => !specs.has(spec))).toEqual([]);
});

test('every fault that the reading stages can tell has a rule of its id', () => {
  const events = readFileSync(join(folder, '..', 'interpreter', 'events.ts'), 'utf8');
  const union = /export type Problem =([^;]+);/.exec(events)?.[1] ?? '';
  const problems = [...union.matchAll(/'([a-z-]+)'/g)].map((match) => match[1]!);
  const ids = new Set(RULES.map((rule) => rule.id));
  expect(problems.length).toBeGreaterThan(20);
  expect(problems.filter((problem) => !ids.has(problem))).toEqual([]);
});

describe.each(RULES.map((rule) => [rule.id, rule] as const))('%s', (_id, rule) => {
  test('its bad example yields it, worded in whole sentences with no figure lacking', () => {
    const found = findings(rule, rule.examples.bad);
    expect(found).not.toEqual([]);
    for (const { message, advice } of found) {
      for (const sentence of [message, advice]) {
        expect(sentence).toMatch(/^[“A-Z].*[.”]$/s);
        expect(sentence).not.toMatch(/undefined|NaN|null|\$\{|\s{2}|“”|\[object/);
      }
    }
  });

  test('its good example yields nothing of it', () => {
    expect(findings(rule, rule.examples.good)).toEqual([]);
  });

  test('emptied, it breaks its own example', () => {
    const emptied: Rule = { ...rule, observe: () => ({}), compare: undefined };
    expect(findings(rule, rule.examples.bad, emptied)).toEqual([]);
  });

  test('says what it is in whole sentences', () => {
    expect(rule.title).toMatch(/^[A-Z].*[^.]$/);
    for (const sentence of [rule.protects, rule.explanation])
      expect(sentence).toMatch(/^[A-Z].*\.$/s);
    if (rule.severity === 'hold' || rule.unattended === 'hold') expect(rule.hold).toBeDefined();
  });
});
