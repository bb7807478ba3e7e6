import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { stateLeftOver } from './state-left-over';

test('flags G91 at the end where the end code resets nothing', () => {
  checkRule(
    stateLeftOver,
    { controller: { language: 'custom-macro' } },
    `
G21 G90 G54
G91 G28 Z0
M30
^^^ state-left-over: G91 is still on as the program ends (set in line 2), and M30 does not put it back.
`,
  );
});

test('flags G91 at an end without an end code everywhere', () => {
  checkRule(
    stateLeftOver,
    {},
    `
G21 G90 G54
G91 G28 Z0
| state-left-over: G91 is still on as the program ends (set in line 2), and the end of the text does not put it back.
`,
  );
});

test('allows it where M30 resets, and where the program puts it back itself', () => {
  checkRule(
    stateLeftOver,
    {},
    `
G21 G90 G54
G91 G28 Z0
M30
`,
  );
});

test('allows a tidy end on every controller', () => {
  checkRule(
    stateLeftOver,
    { controller: { language: 'custom-macro' } },
    `
G21 G90 G54
G91 G28 Z0
G90
M30
`,
  );
});

test('flags compensation that is on while the tool is changed', () => {
  checkRule(
    stateLeftOver,
    {},
    `
G21 G90 G54 G17
T2 M6
G41 D2 G1 X50 F1000
X90
T4 M6
^^^^^ state-left-over: G41 is still on as the tool is changed (set in line 3): the radius of the old cutter would hold for the new one.
G40 X200
T2 M6
M30
`,
  );
});
