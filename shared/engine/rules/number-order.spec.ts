import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { numberOrder } from './number-order';

test('flags M6 with no new choice and its T in the next block', () => {
  checkRule(
    numberOrder,
    {},
    `
T1 M6
G0 X0
M6
^^ number-order (stop): M6 stands before its tool number T2, so it changes to the tool chosen before.
T2
M30
`,
  );
});

test('notes M6 in front of T on a macro-style controller, once', () => {
  checkRule(
    numberOrder,
    { controller: { language: 'custom-macro' } },
    `
M6 T1
^^^^^ number-order (note): M6 stands in front of T1 in its block, and some macro-style controllers then change to the tool chosen before.
M6 T2
M30
`,
  );
});

test('allows M6 and T in one block in either order, and choices made ahead behind a change', () => {
  checkRule(
    numberOrder,
    {},
    `
M6 T1
T2
G0 X0
M6
T3
G0 X0
M6
G0 X10
T1
M6
M30
`,
  );
});
