import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { toolNotLoaded } from './tool-not-loaded';

test('flags a tool that stands in no pocket', () => {
  checkRule(
    toolNotLoaded,
    { loading: { pockets: [{ pocket: 1, tool: 1 }] } },
    `
T1 M6
T2 M6
^^^^^ tool-not-loaded: T2 (6 mm end mill) is called, but the loading puts it in no pocket.
M30
`,
  );
});

test('flags an empty pocket where T names pockets', () => {
  checkRule(
    toolNotLoaded,
    { controller: { toolWord: 'pocket' }, loading: { pockets: [{ pocket: 1, tool: 2 }] } },
    `
T1 M6
T3 M6
^^^^^ tool-not-loaded: T3 names pocket 3, which the loading leaves empty.
T0 M6
M30
`,
  );
});

test('leaves unknown tools, tools fitted by hand and manual machines to other rules', () => {
  checkRule(
    toolNotLoaded,
    { loading: { pockets: [{ pocket: 1, tool: 1 }], byHand: [2] } },
    `
T99 M6
T2 M6
T0 M6
M30
`,
  );
});

test('allows a tool in no pocket on a machine that changes by hand', () => {
  checkRule(
    toolNotLoaded,
    { controller: { toolChange: 'manual' }, loading: { pockets: [] } },
    `
T2 M6
M30
`,
  );
});
