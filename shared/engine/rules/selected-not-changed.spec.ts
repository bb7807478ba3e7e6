import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { selectedNotChanged } from './selected-not-changed';

test('flags a tool chosen between two cuts and never fetched', () => {
  checkRule(
    selectedNotChanged,
    {},
    `
T1 M6
G1 X10 F1000
T2
^^ selected-not-changed: T2 is chosen, but no change follows and the cutting goes on with T1 in the spindle.
G43 H2 G1 X20
M30
`,
  );
});

test('flags a program that only ever chooses', () => {
  checkRule(
    selectedNotChanged,
    {},
    `
T3
^^ selected-not-changed: T3 is chosen, but no change follows and the cutting goes on with nothing known to be in the spindle.
S18000 M3
G1 X10 F1000
M30
`,
  );
});

test('allows choosing ahead, the held tool named again, and a choice with no cutting after it', () => {
  checkRule(
    selectedNotChanged,
    {},
    `
T1 M6
T2
G1 X10 F1000
M6
T2
G1 X20
T3
G0 Z0
M30
`,
  );
});

test('allows a choice replaced by another and fetched after all later on', () => {
  checkRule(
    selectedNotChanged,
    {},
    `
T2 M6
T1
G1 X10 F1000
T2 M6
G1 X20
T1 M6
G1 X30
M30
`,
  );
});

test('leaves a choice made ahead and left over to its own rule', () => {
  checkRule(
    selectedNotChanged,
    {},
    `
T1 M6
T2
G1 X10 F1000
M30
`,
  );
});

test('allows T where T itself changes the tool', () => {
  checkRule(
    selectedNotChanged,
    { controller: { changeOn: 'T' } },
    `
T1
G1 X10 F1000
T2
G1 X20
M30
`,
  );
});
