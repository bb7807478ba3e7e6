import { describe, test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { handWork } from './hand-work';

describe('hand-work', () => {
  test('flags what is said on the block of a stop, or just above it', () => {
    checkRule(
      handWork,
      {},
      `
G21 G90 G54
M0 (TURN THE PART OVER)
    ^^^^^^^^^^^^^^^^^^ hand-work (note, unattended hold): At this stop the program says: “TURN THE PART OVER”.
G4 P1
(MSG, MOVE THE CLAMP)
 ^^^^^^^^^^^^^^^^^^^ hand-work: At this stop the program says: “MOVE THE CLAMP”.
M0
M30
`,
    );
  });

  test('stays silent on a stop with nothing said near it, on names of operations, and on comments away from a stop', () => {
    checkRule(
      handWork,
      {},
      `
(DOOR LEFT)
(TURN AT HIGH SPEED)
G21 G90 G54
G4 P1
M0
(DRILL3)
M1
N40 M1 (2D CONTOUR 3)
(SETUP 2)
M0
M30
`,
    );
  });
});
