import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { plungeAtRapid } from './plunge-at-rapid';

const START = 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X50 Y50 Z5';

test('stops a rapid down into whole stock', () => {
  checkRule(
    plungeAtRapid,
    {},
    `
${START}
G0 Z-3
   ^^^ plunge-at-rapid (stop): Plunges at rapid 3 mm (0.118 in) into the stock.
M30
`,
  );
});

test('holds a rapid down into its own hole, and stops below what was cut', () => {
  checkRule(
    plungeAtRapid,
    {},
    `
${START}
G1 Z-6 F500
G0 Z2
G0 Z-5.5
   ^^^^^ plunge-at-rapid (hold): Plunges at rapid to 5.5 mm (0.217 in) under the top of the stock, where this program has cut but the space is not known to be cleared.
G0 Z2
G0 Z-7
   ^^^ plunge-at-rapid (stop)
M30
`,
  );
});

test('sees a plunge that only the wrong length offset makes', () => {
  checkRule(
    plungeAtRapid,
    {},
    `
G21 G90 G17 G54
T6 M6
S18000 M3
G43 H5
G0 X50 Y50
G0 Z5
   ^^ plunge-at-rapid (stop): Plunges at rapid 3 mm (0.118 in) into the stock.
M30
`,
  );
});

test('allows approach planes, plunges at feed, drilling cycles and rapids up', () => {
  checkRule(
    plungeAtRapid,
    {},
    `
${START}
G0 Z0.5
G0 Z0
G1 Z-18.2 F800
G0 Z5
G0 X-10
G0 Z-5
G1 X20 F1000
G0 Z5
M5
T3 M6
S6000 M3
G43 H3
G0 X50 Y50
G0 Z10
G98 G81 Z-18.5 R2 F300
X80
G98 G83 X110 Z-18.5 R2 Q3
X140
G80
G53 G0 Z0
M30
`,
  );
});
