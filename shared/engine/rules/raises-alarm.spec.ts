import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { raisesAlarm } from './raises-alarm';

const MACRO = { controller: { language: 'custom-macro' } };

test('finds an alarm and judges nothing after it', () => {
  checkRule(
    raisesAlarm,
    MACRO,
    `
G21 G90 G54
#3000=1 (NO TOOL)
^^^^^^^ raises-alarm: The program raises an alarm here (#3000), and nothing after it is carried out.
#3000=2
M30
`,
  );
});

test('finds a code that the setup declares as an alarm', () => {
  checkRule(
    raisesAlarm,
    { controller: { codes: [{ code: 'M250', does: 'alarm' }] } },
    `
G21 G90 G54
M250
^^^^ raises-alarm: The program raises an alarm here (M250), and nothing after it is carried out.
M30
`,
  );
});

test('stays silent where nothing is raised', () => {
  checkRule(raisesAlarm, MACRO, 'G21 G90 G54\n#3000=0\n#300=1\n(#3000=1)\nM30\n');
  // The published language has no such parameter of the controller.
  checkRule(raisesAlarm, {}, 'G21 G90 G54\n#3000=1\nM30\n');
});
