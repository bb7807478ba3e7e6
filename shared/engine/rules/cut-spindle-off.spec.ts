import { test } from 'vitest';
import { changedTools } from '../testing/test-shop';
import { checkRule } from '../testing/check-rule';
import { cutSpindleOff } from './cut-spindle-off';

const START = 'G21 G90 G17 G54\nT1 M6\nG43 H1\nG0 X50 Y50 Z5';

test('flags a plunge and the cut after it as one', () => {
  checkRule(
    cutSpindleOff,
    {},
    `
${START}
G1 Z-3 F800
   ^^^ cut-spindle-off (stop): T1 (10 mm end mill) cuts with the spindle off, 3 mm (0.118 in) under the top of the stock.
G1 X100
M30
`,
  );
});

test('flags the cut after a change that stopped the spindle, and an arc', () => {
  checkRule(
    cutSpindleOff,
    {},
    `
G21 G90 G17 G54
T1 M6
S18000 M3
G43 H1
G0 X50 Y50 Z5
G1 Z-3 F800
G0 Z5
T2 M6
G43 H2
G0 X50 Y50 Z5
G1 Z0 F800
G3 X70 Y70 Z-2 I0 J20
   ^^^^^^^^^^^ cut-spindle-off (stop)
M30
`,
  );
});

test('flags a drilling cycle', () => {
  checkRule(
    cutSpindleOff,
    {},
    `
${START}
G81 X60 Y60 Z-5 R2 F300
^^^^^^^^^^^^^^^^^^^^^^^ cut-spindle-off (stop)
G80
M30
`.replace('^^^^^^^^^^^^^^^^^^^^^^^ cut', '            ^^^ cut'),
  );
});

test('allows feed moves in air, beside the stock, probing and tools that never turn', () => {
  checkRule(
    cutSpindleOff,
    {},
    `
${START}
G1 Z1 F2000
G1 X100 Y100
G0 X-20 Y-20
G1 Z-5 F800
G1 Y500
G0 Z5
G0 X50 Y50
G38.2 Z-1 F100
G0 Z5
M30
`,
  );
  checkRule(
    cutSpindleOff,
    { tools: changedTools({ 1: { kind: 'knife', turns: 'never' } }) },
    `\n${START}\nG1 Z-3 F800\nG1 X100\nM30\n`,
  );
});

test('with nothing known of the stock takes a feed move sideways for a cut', () => {
  checkRule(
    cutSpindleOff,
    { job: { stock: undefined, zeroOn: 'board' } },
    `
${START}
G1 Z2 F800
G1 X100
   ^^^^ cut-spindle-off (stop): T1 (10 mm end mill) cuts with the spindle off.
M30
`,
  );
});
