import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { modalConflict } from './modal-conflict';

test('flags two codes of one group', () => {
  checkRule(
    modalConflict,
    {},
    `
G90 G91 G0 X10
    ^^^ modal-conflict: G90 and G91 belong to one modal group and stand in one block.
M30
`,
  );
});

test('flags two spindle words', () => {
  checkRule(
    modalConflict,
    {},
    `
M3 M5 S18000
   ^^ modal-conflict
M30
`,
  );
});

test('allows the safety lines posts write', () => {
  checkRule(
    modalConflict,
    {},
    `
G0 G17 G40 G49 G80 G90
G21 G90 G94 G54 G64
G91 G28 Z0
G90
G0 G28 X0 Y0
G98 G81 X10 Y10 Z-5 R2 F500
G80 G0 Z10
M30
`,
  );
});
