import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { toolUnknown } from './tool-unknown';

test('flags a call for a tool that is not in the list', () => {
  checkRule(
    toolUnknown,
    {},
    `
T99 M6
^^^^^^ tool-unknown: T99 is called, but it is not in the tool list.
M30
`,
  );
});

test('allows tools of the list, T0 and a T that is never fetched', () => {
  checkRule(
    toolUnknown,
    {},
    `
T1 M6
M6 T2
T0 M6
T99
M30
`,
  );
});

test('allows a change the controller ignores', () => {
  checkRule(
    toolUnknown,
    { controller: { toolChange: 'ignored' } },
    `
T99 M6
M30
`,
  );
});
