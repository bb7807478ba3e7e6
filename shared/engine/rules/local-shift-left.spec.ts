import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { localShiftLeft } from './local-shift-left';

test('flags a shift at the end where the end code does not clear it', () => {
  checkRule(
    localShiftLeft,
    { controller: { language: 'custom-macro' } },
    `
G21 G90 G54
G52 X100
G0 X0
M30
^^^ local-shift-left: A shift of X 100 mm (3.937 in) is still on as the program ends (set in line 2).
`,
  );
});

test('allows it where M30 clears it', () => {
  checkRule(
    localShiftLeft,
    {},
    `
G21 G90 G54
G52 X100
G0 X0
M30
`,
  );
});

test('allows a shift that the program cancels', () => {
  checkRule(
    localShiftLeft,
    { controller: { language: 'custom-macro' } },
    `
G21 G90 G54
G52 X100
G0 X0
G52 X0 Y0
M30
`,
  );
});
