import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { toolByHand } from './tool-by-hand';

test('flags each call for a tool that is fitted by hand', () => {
  checkRule(
    toolByHand,
    { loading: { pockets: [{ pocket: 1, tool: 1 }], byHand: [2] } },
    `
T2 M6
^^^^^ tool-by-hand (hold, unattended stop): T2 (6 mm end mill) has to be fitted by hand at this change.
T1 M6
T2 M6
^^^^^ tool-by-hand
M30
`,
  );
});

test('flags every change of a machine that changes by hand', () => {
  checkRule(
    toolByHand,
    { controller: { toolChange: 'manual' } },
    `
T1 M6
^^^^^ tool-by-hand
M30
`,
  );
});

test('allows a tool that stands in a pocket as well, and the one already held', () => {
  checkRule(
    toolByHand,
    { loading: { pockets: [{ pocket: 2, tool: 2 }], byHand: [2, 3], inSpindle: 3 } },
    `
T3 M6
T2 M6
M30
`,
  );
});
