import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { changedTools } from '../testing/test-shop';
import { toolCommentDisagrees } from './tool-comment-disagrees';

test('flags another diameter in the head, under the unit the program states below it', () => {
  checkRule(
    toolCommentDisagrees,
    {},
    `
(T2  D=0.25 CR=0. - ZMIN=-0.2 - FLAT END MILL)
 ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ tool-comment-disagrees: The comment gives T2 (6 mm end mill) a diameter of 6.35 mm (0.25 in), but the tool list says 6 mm (0.236 in).
G20 G90 G54
T2 M6
G0 X0
M30
`,
  );
});

test('flags another kind', () => {
  checkRule(
    toolCommentDisagrees,
    {},
    `
(T3 D=5. CR=0. - ZMIN=-5 - FLAT END MILL)
 ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ tool-comment-disagrees: The comment calls T3 (5 mm drill) an end mill, but the tool list says drill.
G21 G90 G54
G0 X0
M30
`,
  );
});

test('flags a size and a number written in the block of the change', () => {
  checkRule(
    toolCommentDisagrees,
    {},
    `
G21 G90 G54
T1 M6 (1/2" END MILL)
       ^^^^^^^^^^^^^ tool-comment-disagrees: The comment gives T1 (10 mm end mill) a diameter of 12.7 mm (0.5 in), but the tool list says 10 mm (0.394 in).
T2 M6 (T1 10MM)
       ^^^^^^^ tool-comment-disagrees: The comment in this block speaks of T1, but the block calls T2.
G0 X0
M30
`,
  );
});

test('allows agreement, to 0.05 mm, in either unit and to the ground size', () => {
  checkRule(
    toolCommentDisagrees,
    { tools: changedTools({ 4: { asGround: 5.9 } }) },
    `
(T1 D=10.05 CR=0. - ZMIN=-5 - FLAT END MILL)
(T2 6MM UPCUT)
(T4 D=5.9 - COMPRESSION)
(T6 12 mm compression)
; T8 D=6 CR=3 - BALL END MILL
G21 G90 G54
T2 M6 (1/4 DEEP POCKET)
G0 X0
M30
`,
  );
});

test('allows tapered and pointed cutters, remarks on other things and tools it does not know', () => {
  checkRule(
    toolCommentDisagrees,
    {},
    `
(T8 D=0.5 TAPER=30DEG)
(T1 D=2. TAPER=45DEG - CHAMFER MILL)
(T3 - 18MM DEEP HOLES)
(T99 D=3. - FLAT END MILL)
(STOCK 18MM BIRCH)
(DRILL ALL HOLES)
G21 G90 G54
T3 M6 (DRILLING)
G0 X0
M30
`,
  );
});

test('allows sizes that fit in the other unit where the program states none', () => {
  checkRule(
    toolCommentDisagrees,
    {},
    `
(T2 D=0.2362 - FLAT END MILL)
G90 G54
G0 X0
M30
`,
  );
});
