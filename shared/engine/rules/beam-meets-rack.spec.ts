import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { beamMeetsRack } from './beam-meets-rack';

// Parked holders reach up to Z -53 and stand at Y 2535 to 2585.
const beam = (lowest: number) => ({
  machine: {
    bodies: [
      {
        name: 'beam',
        rides: 'gantry',
        box: { min: { y: 80, z: lowest }, max: { y: 240, z: 160 } },
      },
    ],
  },
});

test('flags a beam that is lower than a parked holder, whatever Z does', () => {
  checkRule(
    beamMeetsRack,
    beam(-60),
    `
G21 G90
G53 G0 Z0
G53 G0 Y2300
       ^^^^^ beam-meets-rack (stop)
M30
`,
  );
});

test('allows a beam that clears them, and one that stays in front', () => {
  checkRule(beamMeetsRack, beam(-53), '\nG21 G90\nG53 G0 Y2600\nM30\n');
  checkRule(beamMeetsRack, beam(-60), '\nG21 G90\nG53 G0 Y2295\nM30\n');
});
