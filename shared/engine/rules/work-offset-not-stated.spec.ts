import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { workOffsetNotStated } from './work-offset-not-stated';

test('flags the first move where the end code is not known to reset', () => {
  checkRule(
    workOffsetNotStated,
    { controller: { language: 'custom-macro' } },
    `
G21 G90
G0 X10
| work-offset-not-stated (hold): The program moves without having stated a work offset; this controller would use G54 if nothing changed it.
M30
`,
  );
});

test('notes it where M30 selects the first offset again', () => {
  checkRule(
    workOffsetNotStated,
    {},
    `
G21 G90
G0 X10
| work-offset-not-stated (note)
M30
`,
  );
});

test('allows an offset stated anywhere before the first program move', () => {
  checkRule(
    workOffsetNotStated,
    { controller: { language: 'custom-macro' } },
    `
G21 G90
T1 M6
G53 G0 Z0
G55
G0 X10
M30
`,
  );
});
