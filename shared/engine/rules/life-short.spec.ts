import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { changedTools } from '../testing/test-shop';
import { lifeShort } from './life-short';

test('flags the block in which the life of a tool ends', () => {
  checkRule(
    lifeShort,
    { tools: changedTools({ 1: { life: 600, used: 540 } }) },
    `
G21 G90 G54
T1 M6
S18000 M3
G0 X0
G1 X100 F120
X0
^^ life-short (hold, unattended stop): T1 (10 mm end mill) needs 1.7 min of cutting here, but only 1 min of its life is left.
M30
`,
  );
});

test('notes a life within the margin and stops only unattended runs', () => {
  checkRule(
    lifeShort,
    { tools: changedTools({ 1: { life: 1000, used: 880 } }) },
    `
G21 G90 G54
T1 M6
S18000 M3
G0 X0
G1 X100 F120
   ^^^^ life-short (note, unattended stop): T1 (10 mm end mill) will have 1.2 min of its life left after this program, less than the margin of 1.7 min kept for unattended runs.
M30
`,
  );
});

test('allows time to spare, rapids, a still spindle and tools without a life', () => {
  checkRule(
    lifeShort,
    { tools: changedTools({ 1: { life: 600, used: 400 } }) },
    `
G21 G90 G54
T1 M6
G1 X100 F10
S18000 M3
G0 X0
G1 X100 F120
T2 M6
M3
G1 X0 F1
M30
`,
  );
});
