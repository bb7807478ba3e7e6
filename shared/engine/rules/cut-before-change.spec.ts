import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { cutBeforeChange } from './cut-before-change';

test('flags cutting before the first change with an unknown tool, once', () => {
  checkRule(
    cutBeforeChange,
    { loading: { inSpindle: 'unknown' } },
    `
S18000 M3
G0 X0
G1 X10 F1000
| cut-before-change: The program cuts without having called a tool, and the loading does not say which one the spindle holds.
G1 X20
M30
`,
  );
});

test('flags cutting with an empty spindle', () => {
  checkRule(
    cutBeforeChange,
    {},
    `
G1 X10 F1000
| cut-before-change: The program cuts without having called a tool, and the loading says that the spindle is empty.
M30
`,
  );
});

test('allows rapids before the change, and a tool the loading knows', () => {
  checkRule(
    cutBeforeChange,
    { loading: { inSpindle: 4 } },
    `
G0 X0
G1 X10 F1000
T1 M6
M30
`,
  );
});

test('leaves a tool that is chosen and never fetched to its own rule', () => {
  checkRule(
    cutBeforeChange,
    { loading: { inSpindle: 'unknown' } },
    `
T1
G1 X10 F1000
M30
`,
  );
});

test('allows cutting after a change', () => {
  checkRule(
    cutBeforeChange,
    { loading: { inSpindle: 'unknown' } },
    `
G0 X0
T1 M6
G1 X10 F1000
M30
`,
  );
});
