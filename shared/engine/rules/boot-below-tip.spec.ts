import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { bootBelowTip } from './boot-below-tip';

const boot = (kind: string) => ({
  machine: {
    bodies: [
      {
        name: 'boot',
        rides: 'head',
        boot: kind,
        box: { min: { x: -70, y: -70, z: -96 }, max: { x: 70, y: 70, z: -60 } },
      },
    ],
  },
  controller: { codes: [{ code: 'M21', does: 'boot-up' }] },
});
const cut = (tool: number) => `T${tool} M6\nS18000 M3\nG43 H${tool}\nG0 X50 Y50 Z5\nG1 Z-5 F1000`;

test('holds once for a tool shorter than the boot is deep', () => {
  // The formula: tip over the stock by max(0, boot depth − gauge length); T1 is 95 mm, the boot 96.
  checkRule(
    bootBelowTip,
    boot('stays'),
    `
G21 G90 G17 G54
${cut(1)}
   ^^^ boot-below-tip (hold): The boot hangs 1 mm (0.0394 in) lower than the tip of T1 (10 mm end mill).
G1 X100
M5
${cut(6)}
M30
`,
  );
});

test('allows a boot that is lifted, and a tool that does not cut', () => {
  checkRule(bootBelowTip, boot('lifts'), `\nG21 G90 G17 G54\nM21\n${cut(1)}\nM30\n`);
  checkRule(bootBelowTip, boot('stays'), '\nG21 G90 G17 G54\nT1 M6\nG43 H1\nG0 X50 Y50 Z5\nM30\n');
});
