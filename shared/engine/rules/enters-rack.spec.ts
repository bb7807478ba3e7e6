import { describe, expect, test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { entersRack } from './enters-rack';

// The plain rack: pockets at X 100, 250, 400 …, grip Y 2560 Z -125, mouths towards the operator.
// A parked holder of 72 above its gauge line reaches up to Z -53; the rail's top is Z -160.
const START = 'G21 G90 G17 G54\nT1 M6';

test('flags the holder driven into a parked holder, by the least height that clears it', () => {
  const [finding] = checkRule(
    entersRack,
    {},
    `
${START}
G53 G0 Z0
G53 G0 X400 Y2400
G53 G0 Y2560
       ^^^^^ enters-rack: The cutter of T1 runs into T3 in pocket 3.
M30
`,
  );
  // Tip of T1 at Z -95, top of the parked holder at Z -53: 42 mm too low; there is no travel above.
  expect(finding?.data).toMatchObject({ raise: 42, canRaise: false, pocket: 3, parkedTool: 3 });
});

test('allows what the retract clears', () => {
  checkRule(
    entersRack,
    { rack: { pockets: PARKED_LOW } },
    `
${START}
G53 G0 Z0
G53 G0 X400 Y2560
M30
`,
  );
});

test('takes the pocket of the held tool for empty, and those beside it for full', () => {
  checkRule(entersRack, {}, `\n${START}\nG53 G0 Z0\nG53 G0 X100 Y2400\nG53 G0 Y2560\nM30\n`);
  checkRule(
    entersRack,
    {},
    `
${START}
G53 G0 Z0
G53 G0 X100 Y2400
G53 G0 Y2560
G53 G0 X250
       ^^^^ enters-rack: The cutter of T1 runs into T2 in pocket 2.
M30
`,
  );
});

test('flags a plunge onto the rail and a fork', () => {
  checkRule(
    entersRack,
    { loading: { pockets: [] } },
    `
G21 G90
G53 G0 X175 Y2650 Z0
G53 G0 Z-170
       ^^^^^ enters-rack: The spindle runs into the rail.
G53 G0 Z0
G53 G0 X400 Y2480
G53 G0 Z-138
G53 G0 Y2485
       ^^^^^ enters-rack: The spindle runs into the fork of pocket 3.
M30
`,
  );
});

test('flags a boot that is down and allows one that is lifted', () => {
  const bodies = [
    {
      name: 'boot',
      rides: 'head',
      boot: 'lifts',
      box: { min: { x: -70, y: -110, z: -60 }, max: { x: 70, y: 45, z: -20 } },
    },
  ];
  const change = {
    machine: { bodies },
    controller: {
      codes: [
        { code: 'M21', does: 'boot-up' },
        { code: 'M22', does: 'boot-down' },
      ],
    },
  };
  checkRule(
    entersRack,
    change,
    `
G21 G90
G53 G0 Z0 X400
G53 G0 Y2500
       ^^^^^ enters-rack: The boot runs into T3 in pocket 3.
M30
`,
  );
  checkRule(entersRack, change, '\nG21 G90\nM21\nG53 G0 Z0 X400\nG53 G0 Y2500\nM30\n');
});

describe('while the spindle’s tool is not known', () => {
  test('holds for what only the longest listed tool would touch', () => {
    checkRule(
      entersRack,
      { loading: { inSpindle: 'unknown' } },
      `
G21 G90
G53 G0 Z0 X400
G53 G0 Y2560
       ^^^^^ enters-rack (hold): It is not known what the spindle holds; if it is T6, it runs into T3 in pocket 3.
M30
`,
    );
  });
});

test('takes a rapid for its whole box where the controller does not promise a straight one', () => {
  const program = `
${START}
G53 G0 Z-60
G53 G0 X20 Y2400
G53 G0 X1250 Y2630
M30
`;
  const straightBeside = {
    rack: { bodies: [], pockets: [{ ...POCKET, number: 1, grip: { x: 1200, y: 2450, z: -125 } }] },
    loading: { pockets: [{ pocket: 1, tool: 2 }] },
  };
  checkRule(entersRack, straightBeside, program);
  checkRule(
    entersRack,
    { ...straightBeside, controller: { rapids: 'independent' } },
    program.replace('M30', '       ^^^^^^^^^^^ enters-rack\nM30'),
  );
});

test('allows the motions of an ordinary program over the whole table', () => {
  checkRule(
    entersRack,
    {},
    `
G21 G90 G17 G40 G49 G80 G54
G53 G0 Z0
T1 M6
S18000 M3
G43 H1
G0 X0 Y0 Z20
G1 Z-18.2 F2000
G1 X1200
G1 Y600
G3 X1190 Y610 I-10 J0
G0 Z20
G0 Y2300
M5
G53 G0 Z0
G53 G0 X0 Y2300
M30
`,
  );
});

test('leaves the way straight up out of a meeting in peace', () => {
  const [finding] = checkRule(
    entersRack,
    {},
    `
${START}
G53 G0 X400 Y2400
G53 G0 Z-100
G53 G0 Y2560
       ^^^^^ enters-rack
G53 G0 Z0
M30
`,
  );
  expect(finding?.count).toBe(1);
});

const POCKET = { opens: '-y', largestDiameter: 50, longest: 190, taper: 'ISO30' };
const PARKED_LOW = [1, 2, 3, 4, 5, 6, 7, 8].map((number) => ({
  ...POCKET,
  number,
  grip: { x: 100 + (number - 1) * 150, y: 2560, z: -170 },
}));
