import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { lengthOffsetMissing } from './length-offset-missing';

test('flags the first program Z move after a change with no length applied', () => {
  checkRule(
    lengthOffsetMissing,
    {},
    `
G21 G90 G54
T1 M6
S18000 M3
G0 X0 Y0
G0 Z5
   ^^ length-offset-missing: Z moves in program coordinates with T1 (10 mm end mill), but no length offset has been applied since the change.
G1 Z-1 F500
M30
`,
  );
});

test('flags H0, and a length cancelled before it was ever applied', () => {
  checkRule(
    lengthOffsetMissing,
    {},
    `
G21 G90 G54
T1 M6
G43 H0 G0 Z5
          ^^ length-offset-missing
T2 M6
G49
G0 Z5
   ^^ length-offset-missing
M30
`,
  );
});

test('flags an H that the table does not hold', () => {
  checkRule(
    lengthOffsetMissing,
    {},
    `
G21 G90 G54
T1 M6
G43 H19 Z5
^^^^^^^ length-offset-missing: H19 has no length in the offset table, so nothing is applied.
M30
`,
  );
});

test('allows X and Y, G53 and G28 before the length, and the length in the block of the change', () => {
  checkRule(
    lengthOffsetMissing,
    {},
    `
G21 G90 G54
T1 M6
G53 G0 Z0
G0 X0 Y0
G91 G28 Z0
G90
G43 H1 Z5
G0 Z50
M6 T2 G43 H2 Z50
G0 Z5
M30
`,
  );
});

test('allows program Z moves before any change, and where the macro applies the length', () => {
  checkRule(
    lengthOffsetMissing,
    { controller: { lengthOffset: 'macro' } },
    `
G21 G90 G54
G0 Z-10
T1 M6
G0 Z5
M30
`,
  );
});

test('allows T0, with nothing held', () => {
  checkRule(
    lengthOffsetMissing,
    {},
    `
G21 G90 G54
T0 M6
G0 Z-5
M30
`,
  );
});

test('flags a second tool without a zero of its own where zero is set with the tool in the spindle', () => {
  checkRule(
    lengthOffsetMissing,
    { controller: { lengthScheme: 'none' } },
    `
G21 G90 G54
T1 M6
G0 Z5
T2 M6
G0 X10
G0 Z5
T1 M6
G0 Z20
T2 M6
G0 Z10
   ^^^ length-offset-missing (stop): Z moves with T2 (6 mm end mill), but zero was last set with T1, and here each tool needs its own.
M0
G0 Z20
   ^^^ length-offset-missing (hold)
M30
`,
  );
});

test('allows a second tool there with a zero of its own', () => {
  checkRule(
    lengthOffsetMissing,
    { controller: { lengthScheme: 'none' }, offsets: { work: { G55: { x: 30, y: 40, z: -90 } } } },
    `
G21 G90 G54
T1 M6
G0 Z5
T2 M6
G55
G0 Z5
M30
`,
  );
});
