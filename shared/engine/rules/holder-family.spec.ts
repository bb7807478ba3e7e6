import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { changedTools } from '../testing/test-shop';
import { holderFamily } from './holder-family';

test('flags a holder of another family than its pocket', () => {
  checkRule(
    holderFamily,
    { tools: changedTools({ 2: { holder: { taper: 'BT30', diameter: 46, above: 72 } } }) },
    `
T1 M6
T2 M6
^^^^^ holder-family: T2 (6 mm end mill) has a holder of family BT30, but pocket 2 takes ISO30.
M30
`,
  );
});

test('flags one fitted by hand that the spindle does not take', () => {
  checkRule(
    holderFamily,
    {
      tools: changedTools({ 2: { holder: { taper: 'SK30', diameter: 50, above: 72 } } }),
      loading: { pockets: [], byHand: [2] },
    },
    `
T2 M6
^^^^^ holder-family: T2 (6 mm end mill) has a holder of family SK30, but the spindle takes ISO30.
M30
`,
  );
});

test('flags the tool that is put away, too', () => {
  checkRule(
    holderFamily,
    {
      tools: changedTools({ 4: { holder: { taper: 'BT30', diameter: 46, above: 72 } } }),
      loading: { inSpindle: 4 },
    },
    `
T1 M6
^^^^^ holder-family: T4 (6 mm compression) has a holder of family BT30, but pocket 4 takes ISO30.
M30
`,
  );
});

test('allows another spelling of the same family', () => {
  checkRule(
    holderFamily,
    { tools: changedTools({ 2: { holder: { taper: 'iso-30', diameter: 50, above: 72 } } }) },
    `
T2 M6
M30
`,
  );
});
