import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { workOffsetUnset } from './work-offset-unset';

test('flags the first move in an offset without a value, once', () => {
  checkRule(
    workOffsetUnset,
    { offsets: { work: { G54: undefined } } },
    `
G21 G90 G54
G0 X10
   ^^^ work-offset-unset: G54 has no value in the offset table; what depends on where the work lies is not judged.
G0 X20
M30
`,
  );
});

test('allows machine moves before it is set, and an offset with a value', () => {
  checkRule(
    workOffsetUnset,
    { offsets: { work: { G55: { x: 0, y: 0, z: -100 } } } },
    `
G21 G90 G53 G0 Z0
G55 G0 X10
M30
`,
  );
});
