import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { toolInTwoPockets } from './tool-in-two-pockets';

test('flags a tool that the loading puts into two pockets, once', () => {
  checkRule(
    toolInTwoPockets,
    {
      loading: {
        pockets: [
          { pocket: 1, tool: 1 },
          { pocket: 5, tool: 1 },
          { pocket: 2, tool: 2 },
        ],
      },
    },
    `
T2 M6
T1 M6
^^^^^ tool-in-two-pockets: The loading puts T1 (10 mm end mill) into pockets 1 and 5.
T2 M6
T1 M6
M30
`,
  );
});

test('says nothing of tools the program does not use', () => {
  checkRule(
    toolInTwoPockets,
    {
      loading: {
        pockets: [
          { pocket: 1, tool: 1 },
          { pocket: 5, tool: 1 },
          { pocket: 2, tool: 2 },
        ],
      },
    },
    `
T2 M6
M30
`,
  );
});
