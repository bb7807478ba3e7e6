import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { changedTools } from '../testing/test-shop';
import { mustNotTurn } from './must-not-turn';

test('flags a start with a knife, and a speed given with the start still on', () => {
  checkRule(
    mustNotTurn,
    { tools: changedTools({ 1: { kind: 'knife', turns: 'never' } }) },
    `
T1 M6
S18000 M3
^^^^^^^^^ must-not-turn: The spindle is started at 18000 rev/min with T1 (10 mm end mill) in it, which must not turn.
M30
`,
  );
});

test('flags a probe whatever its entry says of turning', () => {
  checkRule(
    mustNotTurn,
    { tools: changedTools({ 1: { kind: 'probe' } }) },
    `
T1 M6
M3 S100
^^^^^^^ must-not-turn
M30
`,
  );
});

test('allows a start at speed zero, and cutters', () => {
  checkRule(
    mustNotTurn,
    { tools: changedTools({ 1: { kind: 'knife', turns: 'never' } }) },
    `
T1 M6
S0 M3
T2 M6
S18000 M3
M30
`,
  );
});
