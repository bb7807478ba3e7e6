import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { rotaryLeftTurned } from './rotary-left-turned';

test('flags a rotary axis that does not come back', () => {
  checkRule(
    rotaryLeftTurned,
    { machine: { travel: { a: [-3600, 3600] } }, offsets: { work: { G54: { a: 0 } } } },
    `
G21 G90 G54
G0 A90
M30
^^^ rotary-left-turned: The rotary axis stands at 90° as the program ends, not at 0° where it began.
`,
  );
});

test('allows whole turns and a way back', () => {
  checkRule(
    rotaryLeftTurned,
    { machine: { travel: { a: [-3600, 3600] } }, offsets: { work: { G54: { a: 0 } } } },
    `
G21 G90 G54
G0 A90
G0 A720
M30
`,
  );
});
