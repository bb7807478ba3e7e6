import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { stockNotStated } from './stock-not-stated';

const PROGRAM = 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X50 Y50 Z5\nG1 Z-5 F1000';

test('notes once that the stock is guessed from work zero', () => {
  checkRule(
    stockNotStated,
    { job: undefined },
    `
${PROGRAM}
^^^^^^^^^^^^ stock-not-stated (note): The job sheet states no stock, so everything under Z zero counts as stock here.
G1 X100
M30
`,
  );
});

test('notes that nothing is judged by the stock with zero on the board', () => {
  checkRule(
    stockNotStated,
    { job: { stock: undefined, zeroOn: 'board' } },
    `
${PROGRAM}
^^^^^^^^^^^^ stock-not-stated (note): The job sheet states no stock and Z zero is on the board, so whether the tip is in the stock is not judged.
M30
`,
  );
});

test('allows a job sheet with its stock, and a program that feeds nowhere', () => {
  checkRule(stockNotStated, {}, `\n${PROGRAM}\nM30\n`);
  checkRule(stockNotStated, { job: undefined }, '\nG21 G90\nG0 X10\nM30\n');
});
