import { expect, test } from 'vitest';
import { checkProgram } from '../check';
import { testSetup } from '../testing/test-shop';

const sentences = (program: string) => checkProgram(program, testSetup()).blind.join(' ');

test('says what stands between bounds is not seen, where a motion was judged at its bounds', () => {
  expect(sentences('G21 G90 G54\nG0 X1\nG38.2 Z-5 F100\nG0 X2\nM30')).toContain(
    'bounds of a place',
  );
});

test('says nothing of bounds where every place is known', () => {
  expect(sentences('G21 G90 G54\n#1=5\nG0 X#1\nM30')).not.toContain('bounds');
});
