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

  test('stays silent on a stop with nothing said near it, and on comments that are no stop', () => {
    checkRule(
      handWork,
      {},
      `
(DOOR LEFT)
(TOOL 1 - 10 MM END MILL)
G21 G90 G54
G4 P1
M0
M30
`,
    );
  });
});
