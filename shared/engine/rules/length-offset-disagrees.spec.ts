import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { lengthOffsetDisagrees } from './length-offset-disagrees';

test('holds a difference of more than 0.05 mm and stops one of more than 1 mm', () => {
  checkRule(
    lengthOffsetDisagrees,
    { offsets: { length: { 1: 95.06, 2: 90.99 } } },
    `
G21 G90 G54
T1 M6
G43 H1 Z50
^^^^^^ length-offset-disagrees (hold): The offset table holds 95.06 mm (3.743 in) for T1 (10 mm end mill), the tool list makes it 95 mm (3.74 in): its tip runs 0.06 mm (0.0024 in) too high, if the list is right.
T2 M6
G43 H2 Z50
^^^^^^ length-offset-disagrees (stop): The offset table holds 90.99 mm (3.582 in) for T2 (6 mm end mill), the tool list makes it 92 mm (3.622 in): its tip runs 1.01 mm (0.0398 in) too low, if the list is right.
M30
`,
  );
});

test('allows exactly 0.05 mm, and counts lengths from the reference of the table', () => {
  checkRule(
    lengthOffsetDisagrees,
    {
      controller: { lengthScheme: 'from-master', lengthReference: 90 },
      offsets: { length: { 1: 5.05, 2: 2, 5: 0 } },
    },
    `
G21 G90 G54
T1 M6
G43 H1 Z50
T2 M6
G43 H2 Z50
M30
`,
  );
});

test('does not judge touch-off values', () => {
  checkRule(
    lengthOffsetDisagrees,
    { controller: { lengthScheme: 'touch-off' }, offsets: { length: { 1: -104.2 } } },
    `
G21 G90 G54
T1 M6
G43 H1 Z50
M30
`,
  );
});
