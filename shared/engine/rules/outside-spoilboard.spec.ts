import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { outsideSpoilboard } from './outside-spoilboard';

// The board reaches to machine X 1240, that is X 1210 from work zero.
const wide = { job: { stock: { max: { x: 1240 } } } };
const START = 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X1100 Y50 Z5';

test('holds a cut in stock that lies beyond the board', () => {
  checkRule(
    outsideSpoilboard,
    wide,
    `
${START}
G1 Z-5 F1000
G1 X1215
   ^^^^^ outside-spoilboard (hold): Cuts 5 mm (0.197 in) beyond the edge of the spoilboard.
M30
`,
  );
});

test('allows air moves and rapids beyond it', () => {
  checkRule(
    outsideSpoilboard,
    wide,
    `\n${START}\nG0 X1225\nG1 X1230 F1000\nG1 X1100\nG1 Z-5\nM30\n`,
  );
  // Stock that ends before the board: leading in from outside both is no cut.
  checkRule(outsideSpoilboard, {}, `\n${START}\nG0 X1216\nG1 Z-5 F1000\nG1 X1208\nM30\n`);
});
