import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { distanceNotStated } from './distance-not-stated';

test('notes a first move under neither G90 nor G91', () => {
  checkRule(
    distanceNotStated,
    {},
    `
G21 G54
G0 X10
| distance-not-stated: The program moves without having stated G90 or G91; this controller would read absolute coordinates if nothing changed it.
M30
`,
  );
});

test('allows G90 on the moving block itself', () => {
  checkRule(
    distanceNotStated,
    {},
    `
G21 G54
G90 G0 X10
M30
`,
  );
});
