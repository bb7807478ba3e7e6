import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { subprogramLoop } from './subprogram-loop';

test('finds a subprogram that calls itself, once', () => {
  checkRule(
    subprogramLoop,
    {},
    `
M98 P1
M30
O1
G0 Z5
M98 P1 L3
^^^^^^ subprogram-loop: The subprogram O1 calls itself, and is still doing so 10 calls deep.
M99
`,
  );
});

test('finds two that call each other', () => {
  checkRule(
    subprogramLoop,
    {},
    `
o1 sub
o2 call
o1 endsub
o2 sub
o1 call
^^^^^^^ subprogram-loop
o2 endsub
o1 call
M2
`,
  );
});

test('finds a chain of calls that is too deep', () => {
  const subs = Array.from({ length: 12 }, (_, at) => `O${at + 1}\nM98 P${at + 2}\nM99\n`);
  const marked = subs.map((sub, at) =>
    at === 9 ? sub.replace('M99', '^^^^^^^ subprogram-loop\nM99') : sub,
  );
  checkRule(
    subprogramLoop,
    {},
    `M98 P1\nM30\n${marked.join('').replace('M98 P11\n^^^^^^^ subprogram-loop', 'M98 P11\n^^^^^^^ subprogram-loop: The call of O11 stands more than 10 calls deep.')}`,
  );
});

test('stays silent at many calls, and where a condition ends the chain', () => {
  checkRule(subprogramLoop, {}, 'M98 P1 L500\nM30\nO1\nG0 Z5\nM99\n');
  checkRule(
    subprogramLoop,
    {},
    'o1 sub\no2 if [#1 GT 0]\nG0 Z#1\no1 call [#1-1]\no2 endif\no1 endsub\no1 call [4]\nM2\n',
  );
});
