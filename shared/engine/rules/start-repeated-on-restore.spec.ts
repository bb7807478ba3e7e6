import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { startRepeatedOnRestore } from './start-repeated-on-restore';

const codes = {
  controller: {
    codes: [
      { code: 'M70', does: 'save-state' },
      { code: 'M72', does: 'restore-state' },
    ],
  },
};

test('flags a restore after the spindle was stopped', () => {
  checkRule(
    startRepeatedOnRestore,
    codes,
    `
S18000 M3
M70
M5
M72
^^^ start-repeated-on-restore (stop): M72 restores a state that was saved with the spindle turning, and the spindle has been stopped since.
M30
`,
  );
});

test('allows a state saved at rest, one restored while turning, and a restore of nothing', () => {
  checkRule(
    startRepeatedOnRestore,
    codes,
    '\nM72\nM70\nS18000 M3\nM5\nM72\nM3\nM70\nM72\nM5\nM30\n',
  );
});
