import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { diameterOffsetOtherTool } from './diameter-offset-other-tool';

test('flags the D of another tool', () => {
  checkRule(
    diameterOffsetOtherTool,
    {},
    `
G21 G90 G54 G17
T2 M6
G0 X0 Y0
G41 D3
^^^^^^ diameter-offset-other-tool: D3 is used with T2 in the spindle, whose own offset is D2.
G1 X20 F500
G40 X40
M30
`,
  );
});

test('allows its own, D left out, and D shifted as the description says', () => {
  checkRule(
    diameterOffsetOtherTool,
    { controller: { diameterOffsetShift: 20 }, offsets: { diameter: { 22: 6 } } },
    `
G21 G90 G54 G17
T2 M6
G0 X0 Y0
G41 D22
G1 X20 F500
G40 X40
M30
`,
  );
});
