import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { lengthOffsetOtherTool } from './length-offset-other-tool';

test('flags the H of another tool than the one in the spindle', () => {
  checkRule(
    lengthOffsetOtherTool,
    {},
    `
G21 G90 G54
T1 M6
T2
G43 H2 Z50
^^^^^^ length-offset-other-tool: H2 is applied with T1 (10 mm end mill) in the spindle.
M30
`,
  );
});

test('allows the own H with the next tool chosen ahead, H0, and an unknown tool', () => {
  checkRule(
    lengthOffsetOtherTool,
    { loading: { inSpindle: 'unknown' } },
    `
G21 G90 G54
G43 H3 Z-10
T1 M6
T2
G43 H1 Z50
G43 H0
M30
`,
  );
});

test('allows a second offset kept for the same tool, and the pocket’s number where T names pockets', () => {
  checkRule(
    lengthOffsetOtherTool,
    {
      controller: { toolWord: 'pocket' },
      loading: { pockets: [{ pocket: 3, tool: 5 }] },
      offsets: { length: { 3: 90, 25: 90 } },
    },
    `
G21 G90 G54
T3 M6
G43 H3 Z50
G43 H25 Z40
M30
`,
  );
});
