import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { obstacle } from './obstacle';

const clamp = {
  job: {
    obstacles: [
      {
        name: 'front clamp',
        in: 'G54',
        box: { min: { x: 200, y: -20, z: -18 }, max: { x: 260, y: 40, z: 25 } },
      },
    ],
  },
};
const START = 'G21 G90 G17 G54\nT1 M6\nG43 H1';

test('flags a crossing too low over a clamp', () => {
  checkRule(
    obstacle,
    clamp,
    `
${START}
G0 X100 Y20 Z10
G0 X400
   ^^^^ obstacle (stop): The cutter of T1 runs into the obstacle front clamp.
M30
`,
  );
});

test('flags the holder over a clamp that the cutter passes beside', () => {
  // Face of the holder is 40 mm over the tip, its radius 25 mm: at Z -16 it is 1 mm under the clamp's top.
  checkRule(
    obstacle,
    clamp,
    `
${START}
G0 X100 Y60 Z30
S18000 M3
G1 Z-16 F1000
G1 X400
   ^^^^ obstacle (stop): The holder of T1 runs into the obstacle front clamp.
M30
`,
  );
});

test('stands where its own work offset puts it', () => {
  checkRule(
    obstacle,
    {
      offsets: { work: { G55: { x: 530, y: 40, z: -182 } } },
      job: { obstacles: [{ ...clamp.job.obstacles[0], in: 'G55' }] },
    },
    `
${START}
G0 X100 Y20 Z10
G0 X400
G0 X760
   ^^^^ obstacle (stop)
M30
`,
  );
});

test('allows crossing above and cutting beside', () => {
  checkRule(
    obstacle,
    clamp,
    `
${START}
G0 X100 Y20 Z26
G0 X400
G0 Y100
S18000 M3
G1 Z-18 F1000
G1 X100
M30
`,
  );
});
