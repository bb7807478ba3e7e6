import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { RULES } from './catalogue';
import { ruleReference } from './reference';

test('the rule reference is up to date (write it with npm run rules:docs)', () => {
  const written = readFileSync(new URL('README.md', import.meta.url), 'utf8');
  expect(written).toBe(ruleReference(RULES));
});

test('every rule has its section', () => {
  const sections = ruleReference(RULES).match(/^### .+$/gm) ?? [];
  expect(sections.map((heading) => heading.slice(4)).sort()).toEqual(
    RULES.map((rule) => rule.id).sort(),
  );
});
