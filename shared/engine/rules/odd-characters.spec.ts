import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { oddCharacters } from './odd-characters';

test('flags characters outside comments', () => {
  checkRule(
    oddCharacters,
    {},
    `
G0 X10 $
       ^ odd-characters: “$” (byte 36) does not belong in a block.
M30
`,
  );
});

test('allows any characters in comments', () => {
  checkRule(
    oddCharacters,
    {},
    `
(TÜR №3 – 18 mm, 5 $)
G0 X10 ; größe
M30
`,
  );
});
