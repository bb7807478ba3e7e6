import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { entersZone } from './enters-zone';

const zone = (forbids: string) => ({
  machine: {
    zones: [
      {
        name: 'tool setter',
        box: { min: { x: 1240, y: 0, z: -330 }, max: { x: 1300, y: 60, z: -150 } },
        forbids,
      },
    ],
  },
});
// The tip of T1 hangs 95 mm under the gauge point, its holder's face 55 mm: at Z -60 the tip is 5 mm
// inside the zone, the holder 35 mm above it.
const START = 'G21 G90 G17 G54\nT1 M6\nG53 G0 Z0';

test('flags the cutter in a zone that forbids everything', () => {
  checkRule(
    entersZone,
    zone('everything'),
    `
${START}
G53 G0 X1260 Y30
G53 G0 Z-60
       ^^^^ enters-zone: The cutter of T1 enters the zone tool setter, which forbids everything.
M30
`,
  );
});

test('flags the spindle body beside the tool', () => {
  checkRule(
    entersZone,
    zone('all-but-change'),
    `
${START}
G53 G0 X1178 Y30
G53 G0 Z-160
G53 G0 X1185
       ^^^^^ enters-zone: The spindle enters the zone tool setter, which forbids everything but a tool change.
M30
`,
  );
});

test('forbids only what the zone says', () => {
  checkRule(
    entersZone,
    zone('rapid'),
    `
${START}
S18000 M3
G53 G0 X1260 Y30
G53 G1 Z-60 F500
G53 G1 Z-50
G53 G0 Z-60
       ^^^^ enters-zone: The cutter of T1 crosses the zone tool setter at rapid, which forbids it.
M30
`,
  );
  checkRule(
    entersZone,
    zone('tip'),
    `
${START}
G53 G0 X1178 Y30
G53 G0 Z-160
G53 G0 X1185
M30
`,
  );
});

test('flags a clip of the zone’s corner between two points outside it', () => {
  checkRule(
    entersZone,
    zone('everything'),
    `
${START}
G53 G0 X1200 Y20
G53 G0 Z-70
G53 G0 X1270 Y80
       ^^^^^^^^^ enters-zone
M30
`,
  );
});

test('allows crossing above and cutting beside', () => {
  checkRule(
    entersZone,
    zone('everything'),
    `
${START}
G53 G0 X1260 Y30
G53 G0 Z-54
G53 G0 Z0
G43 H1
G0 X1140 Y0 Z5
S18000 M3
G1 Z-15 F1000
G0 Z5
M30
`,
  );
});
