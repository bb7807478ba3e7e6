import { expect, test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { chipLoad } from './chip-load';

const band = (change: object = {}) => ({
  policy: { chipLoad: [{ kind: 'end-mill', from: 0.08, to: 0.25, ...change }] },
});
const START = 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X50 Y50 Z5\nG1 Z-5 F500';

// 3600 mm/min over 18 000 rev/min and 2 edges is 0.1 mm; 7620 is 0.2117 mm (handbook formula F = n z f).
test('notes a feed per tooth below and above the band', () => {
  checkRule(
    chipLoad,
    band(),
    `
${START}
G1 X100 F1800
        ^^^^^ chip-load (note): T1 (10 mm end mill) cuts with 0.05 mm (0.002 in) a tooth; the shop’s band is 0.08 mm (0.0031 in) to 0.25 mm (0.0098 in).
G1 Y100 F10800
        ^^^^^^ chip-load (note): T1 (10 mm end mill) cuts with 0.3 mm (0.0118 in) a tooth; the shop’s band is 0.08 mm (0.0031 in) to 0.25 mm (0.0098 in).
M30
`,
  );
});

test('takes the band of the material before the one for any', () => {
  const found = checkRule(
    chipLoad,
    {
      policy: {
        chipLoad: [
          { kind: 'end-mill', from: 0.01, to: 1 },
          { kind: 'end-mill', material: 'birch plywood', from: 0.15, to: 0.25 },
        ],
      },
    },
    `
${START}
G1 X100 F3600
        ^^^^^ chip-load
M30
`,
  );
  expect(found[0]?.data).toMatchObject({ load: 0.1, from: 0.15 });
});

test('allows what lies in the band, plunges, ramps, air moves, other kinds and other material', () => {
  checkRule(
    chipLoad,
    band(),
    `\n${START}\nG1 X100 F3600\nG1 X150 Z-6 F600\nG0 Z5\nG1 X60 F600\nM30\n`,
  );
  checkRule(chipLoad, band({ kind: 'ball' }), `\n${START}\nG1 X100\nM30\n`);
  checkRule(chipLoad, band({ material: 'acrylic' }), `\n${START}\nG1 X100\nM30\n`);
  checkRule(chipLoad, {}, `\n${START}\nG1 X100\nM30\n`);
});
