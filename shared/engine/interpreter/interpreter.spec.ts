import { describe, expect, test } from 'vitest';
import { eventsOf as allEventsOf } from '../testing/events-of';

/** These programs are a few blocks that end nowhere; that they lack an end code is not the point. */
const eventsOf: typeof allEventsOf = (...of) =>
  allEventsOf(...of).filter((text) => !text.endsWith('missing-end'));

/** A machine at 0, 0, 0 with work zero there too, so that figures read as they are written. */
const AT_ZERO = {
  machine: {
    travel: { x: [-9000, 9000], y: [-9000, 9000], z: [-9000, 9000] },
    start: { x: 0, y: 0, z: 0 },
    references: { g28: { x: 1, y: 2, z: 3 }, g30: { x: 5, y: 6, z: 7 } },
  },
  offsets: {
    work: {
      G54: { x: 0, y: 0, z: 0 },
      G55: { x: 100, y: 0, z: 0 },
      'G54.1P2': { x: 7, y: 0, z: 0 },
    },
    length: { '1': 50, '2': 60 },
  },
  controller: { switches: { startMotion: 'rapid' } },
};
const change = (more: { machine?: object; controller?: object } = {}) => ({
  ...AT_ZERO,
  machine: { ...AT_ZERO.machine, ...more.machine },
  controller: { ...AT_ZERO.controller, ...more.controller },
});
const run = (program: string, more = {}) => eventsOf(program, change(more));

describe('straight motion', () => {
  test.each([
    ['G0 X10', ['1 rapid X0 Y0 Z0 → X10 Y0 Z0']],
    ['G1 X10 F600', ['1 feed X0 Y0 Z0 → X10 Y0 Z0 F600']],
    ['G20 G1 X1 F10', ['1 feed X0 Y0 Z0 → X25.4 Y0 Z0 F254']],
    // A feed is kept as a physical speed when the units change.
    ['G20 F10\nG21 G1 X1', ['2 feed X0 Y0 Z0 → X1 Y0 Z0 F254']],
    ['G91 X1\nX1', ['1 rapid X0 Y0 Z0 → X1 Y0 Z0', '2 rapid X1 Y0 Z0 → X2 Y0 Z0']],
    ['G55 X1', ['1 rapid X0 Y0 Z0 → X101 Y0 Z0']],
    ['G54.1 P2 X1', ['1 rapid X0 Y0 Z0 → X8 Y0 Z0']],
    // The order of words on a line means nothing (NISTIR 6556 3.2.6).
    ['X1 G91 G20 G0', ['1 rapid X0 Y0 Z0 → X25.4 Y0 Z0']],
    // G93: F is the inverse of the minutes.
    ['G93 G1 X100 F2', ['1 feed X0 Y0 Z0 → X100 Y0 Z0 F200']],
    // G95: millimetres a turn.
    ['S1000 G95 G1 X1 F0.1', ['1 feed X0 Y0 Z0 → X1 Y0 Z0 F100']],
  ])('%j', (program, events) => {
    expect(run(program)).toEqual(events);
  });
});

describe('machine moves', () => {
  test.each([
    ['G55 G53 X10 Z-5', ['1 rapid by machine X0 Y0 Z0 → X10 Y0 Z-5']],
    ['G53 G1 X10 F9', ['1 feed by machine X0 Y0 Z0 → X10 Y0 Z0 F9']],
    ['G91 G53 X10', ['1 rapid by machine X0 Y0 Z0 → X10 Y0 Z0']],
    [
      'G2 F9 X0 I1\nG53 X1',
      [
        '1 arc X0 Y0 Z0 → X0 Y0 Z0 F9 xy centre 1,0 turn -360',
        '2 1-4 modal-conflict machine-move-motion',
      ],
    ],
    ['G53\nZ0 X5', ['1 1-4 split-machine-move G53', '2 rapid X0 Y0 Z0 → X5 Y0 Z0']],
    ['G53\nG0 Z0 X5', ['1 1-4 split-machine-move G53', '2 rapid X0 Y0 Z0 → X5 Y0 Z0']],
    ['G53\nG53 X5', ['2 rapid by machine X0 Y0 Z0 → X5 Y0 Z0']],
    ['G53\nG90 G54\nX5', ['3 rapid X0 Y0 Z0 → X5 Y0 Z0']],
    ['G28 X5', ['1 rapid by home X0 Y0 Z0 → X5 Y0 Z0', '1 rapid by home X5 Y0 Z0 → X1 Y2 Z3']],
    ['G30 Z5', ['1 rapid by home X0 Y0 Z0 → X0 Y0 Z5', '1 rapid by home X0 Y0 Z5 → X5 Y6 Z7']],
    ['G28', ['1 rapid by home X0 Y0 Z0 → X1 Y2 Z3']],
    [
      'G28\nZ5',
      [
        '1 rapid by home X0 Y0 Z0 → X1 Y2 Z3',
        '1 1-4 split-machine-move G28',
        '2 rapid X1 Y2 Z3 → X1 Y2 Z5',
      ],
    ],
    ['G28\nG0 Z5', ['1 rapid by home X0 Y0 Z0 → X1 Y2 Z3', '2 rapid X1 Y2 Z3 → X1 Y2 Z5']],
    [
      'X9\nG28.1\nX0\nG28',
      [
        '1 rapid X0 Y0 Z0 → X9 Y0 Z0',
        '3 rapid X9 Y0 Z0 → X0 Y0 Z0',
        '4 rapid by home X0 Y0 Z0 → X9 Y0 Z0',
      ],
    ],
  ])('%j', (program, events) => {
    expect(run(program)).toEqual(events);
  });

  test('G28 sends home only the named axes where the controller does so', () => {
    const named = { controller: { switches: { startMotion: 'rapid', homeAxes: 'named' } } };
    expect(run('G91 G28 Z0', named)).toEqual([
      '1 rapid by home X0 Y0 Z0 → X0 Y0 Z0',
      '1 rapid by home X0 Y0 Z0 → X0 Y0 Z3',
    ]);
  });

  test('G53 under G91 is told where the controller refuses or ignores it', () => {
    const with_ = (incrementalMachineMove: string) => ({
      controller: { switches: { startMotion: 'rapid', incrementalMachineMove } },
    });
    expect(run('X3\nG91 G53 X1', with_('refused'))).toEqual([
      '1 rapid X0 Y0 Z0 → X3 Y0 Z0',
      '2 5-8 machine-move-in-incremental',
    ]);
    expect(run('X3\nG91 G53 X1', with_('ignored'))).toEqual([
      '1 rapid X0 Y0 Z0 → X3 Y0 Z0',
      '2 5-8 machine-move-in-incremental',
      '2 rapid X3 Y0 Z0 → X4 Y0 Z0',
    ]);
  });

  test('a reference point the machine does not have is told, and the walk stays at the point between', () => {
    expect(run('G28 Z5', { machine: { references: { g28: undefined } } })).toEqual([
      '1 rapid by home X0 Y0 Z0 → X0 Y0 Z5',
      '1 1-4 not-modelled no-reference',
    ]);
  });
});

describe('arcs', () => {
  test.each([
    ['G2 X10 Y0 I5 F9', ['1 arc X0 Y0 Z0 → X10 Y0 Z0 F9 xy centre 5,0 turn -180']],
    // A full turn needs no end point on router controllers.
    ['G3 I5 F9', ['1 arc X0 Y0 Z0 → X0 Y0 Z0 F9 xy centre 5,0 turn 360']],
    ['G3 I5 Z-2 F9', ['1 arc X0 Y0 Z0 → X0 Y0 Z-2 F9 xy centre 5,0 turn 360']],
    ['G90.1 G2 X10 I5 J0 F9', ['1 arc X0 Y0 Z0 → X10 Y0 Z0 F9 xy centre 5,0 turn -180']],
    // A flat third centre word, as posts add to a helix.
    ['G2 X10 I5 J0 K0 F9', ['1 arc X0 Y0 Z0 → X10 Y0 Z0 F9 xy centre 5,0 turn -180']],
    ['G2 X10 I5 K1 F9', ['1 8-13 arc-impossible centre-letter']],
    ['G2 X10 F9', ['1 1-10 arc-centre-missing']],
    ['G2 X10 R4 F9', ['1 8-10 arc-impossible radius-short']],
    ['G2 X0 Y0 R4 F9', ['1 10-12 arc-impossible ends-where-it-starts']],
    ['G2 X10 I5 R5 F9', ['1 8-13 arc-impossible radius-and-centre']],
    [
      'G2 X10.1 I5 F9',
      ['1 4-12 arc-radius-mismatch', '1 arc X0 Y0 Z0 → X10.1 Y0 Z0 F9 xy centre 5,0 turn -180'],
    ],
    // The walk goes on from the stated end of an arc that could not be worked out.
    ['G2 X10 F9\nG1 X11', ['1 1-10 arc-centre-missing', '2 feed X10 Y0 Z0 → X11 Y0 Z0 F9']],
  ])('%j', (program, events) => {
    expect(run(program)).toEqual(events);
  });
});

describe('cycles', () => {
  test('G81 is a rapid over the hole, a rapid to R, a feed and a rapid out', () => {
    expect(run('G0 Z10\nG98 G81 X5 Z-2 R1 F9\nX8\nG80')).toEqual([
      '1 rapid X0 Y0 Z0 → X0 Y0 Z10',
      '2 rapid by cycle X0 Y0 Z10 → X5 Y0 Z10',
      '2 rapid by cycle X5 Y0 Z10 → X5 Y0 Z1',
      '2 feed by cycle X5 Y0 Z1 → X5 Y0 Z-2 F9',
      '2 rapid by cycle X5 Y0 Z-2 → X5 Y0 Z10',
      '3 rapid by cycle X5 Y0 Z10 → X8 Y0 Z10',
      '3 rapid by cycle X8 Y0 Z10 → X8 Y0 Z1',
      '3 feed by cycle X8 Y0 Z1 → X8 Y0 Z-2 F9',
      '3 rapid by cycle X8 Y0 Z-2 → X8 Y0 Z10',
    ]);
  });

  test.each([
    ['G81 X1 Z-1 F9', ['1 1-4 cycle-words-missing']],
    ['G83 X1 Z-1 R1 F9', ['1 1-4 cycle-words-missing']],
    ['G83 X1 Z-1 R1 Q0 F9', ['1 15-17 out-of-range-word Q0']],
    ['G81 X1 Z2 R1 F9', ['1 11-13 cycle-plane']],
    ['G81 X1 Z-1 R1 L0 F9', ['1 15-17 out-of-range-word L0']],
    ['G83 X1 Z-100 R1 Q0.0001 F9', ['1 17-24 out-of-range-word G83']],
    ['G93 G81 X1 Z-1 R1 F9', ['1 5-8 modal-conflict in-cycle']],
    // Under G80 no motion code is in force in the published language.
    ['G80\nX1\nX2', ['2 1-3 missing-word no-motion-code', '3 1-3 missing-word no-motion-code']],
  ])('refuses %j', (program, events) => {
    expect(run(program)).toEqual(events);
  });

  test('a macro dialect has the motion code from before the cycle again after G80', () => {
    const macro = { controller: { language: 'custom-macro' } };
    expect(run('G0 Z5\nG99 G81 X1 Z-1 R1 F9\nG80\nZ9', macro).at(-1)).toBe(
      '4 rapid X1 Y0 Z1 → X1 Y0 Z9',
    );
  });
});

describe('offsets and shifts', () => {
  const shifts = (program: string) => eventsOf(program, change(), ['motion', 'localShift']);
  test.each([
    [
      'X4\nG92 X7\nX0',
      ['1 rapid X0 Y0 Z0 → X4 Y0 Z0', '2 G92 X-3 Y0 Z0', '3 rapid X4 Y0 Z0 → X-3 Y0 Z0'],
    ],
    ['G92 X5\nG92.2\nG92.3', ['1 G92 X-5 Y0 Z0', '2 G92.2 X0 Y0 Z0', '3 G92.3 X-5 Y0 Z0']],
    ['G92 X5\nG92.1\nG92.3', ['1 G92 X-5 Y0 Z0', '2 G92.1 X0 Y0 Z0', '3 G92.3 X0 Y0 Z0']],
    ['G52 X10\nX0\nG52 X0', ['1 G52 X10 Y0 Z0', '2 rapid X0 Y0 Z0 → X10 Y0 Z0', '3 G52 X0 Y0 Z0']],
    ['G10 L2 P1 X5\nX0', ['2 rapid X0 Y0 Z0 → X5 Y0 Z0']],
    ['X9\nG10 L20 P1 X1\nX0', ['1 rapid X0 Y0 Z0 → X9 Y0 Z0', '3 rapid X9 Y0 Z0 → X8 Y0 Z0']],
    // G92 S is a speed limit on many controllers, no offset.
    ['G92 S4000', []],
    ['G92', ['1 1-4 missing-word X, Y or Z']],
    ['G10 L2 P10 X1', ['1 8-11 out-of-range-word P10']],
    ['G10 X1', ['1 1-4 missing-word L']],
  ])('%j', (program, events) => {
    expect(shifts(program)).toEqual(events);
  });

  test('says once which offset has no value, and not where G92 has set the zero', () => {
    const unset = { ...change(), offsets: { work: { G54: undefined, G55: { x: 1 } } } };
    expect(eventsOf('X1\nX2', unset)[0]).toBe('1 1-3 work-offset-unset');
    expect(eventsOf('X1\nX2', unset).filter((text) => text.includes('unset'))).toHaveLength(1);
    expect(eventsOf('G55 X1\nZ1', unset).join()).toMatch(/^1 rapid.*2 1-3 work-offset-unset/);
    expect(eventsOf('G92 X0\nX2', unset).join()).not.toContain('unset');
    expect(eventsOf('G53 X1\nG91 X2', unset).join()).not.toContain('unset');
  });
});

describe('lengths', () => {
  const lengths = (program: string, more = {}) =>
    eventsOf(program, change(more), ['motion', 'lengthOffset']);
  test.each([
    ['G43 H1 Z5', ['1 G43 H1 0 to 50', '1 rapid X0 Y0 Z0 → X0 Y0 Z55']],
    ['G43 H1\nG49 Z5', ['1 G43 H1 0 to 50', '2 G49 Hnull 50 to 0', '2 rapid X0 Y0 Z0 → X0 Y0 Z5']],
    ['G43 H0 Z5', ['1 G43 H0 0 to 0', '1 rapid X0 Y0 Z0 → X0 Y0 Z5']],
    ['G43.1 Z12\nZ5', ['1 G43.1 Hnull 0 to 12', '2 rapid X0 Y0 Z0 → X0 Y0 Z17']],
    ['G43 H99', ['1 1-8 length-offset-missing not-in-table', '1 G43 H99 0 to 0']],
    ['G43 Z5', ['1 1-4 missing-word H']],
    ['G10 L1 P1 Z70\nG43 H1 Z5', ['2 G43 H1 0 to 70', '2 rapid X0 Y0 Z0 → X0 Y0 Z75']],
  ])('%j', (program, events) => {
    expect(lengths(program)).toEqual(events);
  });

  test('the controller applies the length of what is held where the setup says so', () => {
    const automatic = { controller: { lengthOffset: 'automatic' } };
    expect(lengths('T2 M6', automatic)).toEqual(['1 G43 H2 0 to 60']);
    expect(lengths('T2 M6\nT0 M6', automatic).at(-1)).toBe('2 G49 H0 60 to 0');
  });
});

describe('tools', () => {
  const kinds = ['toolSelected', 'toolChanging', 'toolChanged'] as const;
  const tools = (program: string, more = {}) => eventsOf(program, change(more), kinds);
  test.each([
    ['T1 M6', ['1 select T1', '1 changing nothing to 1', '1 changed T1: T1']],
    ['M6 T1', ['1 select T1', '1 changing nothing to 1', '1 changed T1: T1']],
    ['T1\nM6\nT2', ['1 select T1', '2 changing nothing to 1', '2 changed T1: T1', '3 select T2']],
    [
      'T1 M6\nT0 M6',
      [
        '1 select T1',
        '1 changing nothing to 1',
        '1 changed T1: T1',
        '2 select T0',
        '2 changing T1 to 0',
        '2 changed T0: nothing',
      ],
    ],
    ['M6', ['1 1-3 change-without-tool never-selected']],
    ['T-1', ['1 1-4 out-of-range-word T-1']],
    ['T1.5', ['1 1-5 out-of-range-word T1.5']],
  ])('%j', (program, events) => {
    expect(tools(program)).toEqual(events);
  });

  test('T alone changes where the setup says so', () => {
    expect(tools('T1', { controller: { changeOn: 'T' } })).toHaveLength(3);
  });

  test('T names a pocket where the setup says so, and an empty one holds nothing', () => {
    const pockets = {
      ...change({ controller: { toolWord: 'pocket' } }),
      loading: { pockets: [{ pocket: 3, tool: 7 }], inSpindle: null },
    };
    expect(eventsOf('T3 M6', pockets, kinds).at(-1)).toBe('1 changed T3: T7');
    expect(eventsOf('T4 M6', pockets, kinds).at(-1)).toBe('1 changed T4: nothing');
    expect(eventsOf('T77', pockets, kinds)).toEqual(['1 1-4 out-of-range-word T77']);
  });

  test.each([
    ['ignored', ['1 select T1', '1 changing nothing to 1', '1 changed T1: T1', '2 select T0']],
    [
      'refused',
      [
        '1 select T1',
        '1 changing nothing to 1',
        '1 changed T1: T1',
        '2 select T0',
        '2 1-6 out-of-range-word T0',
      ],
    ],
  ])('T0 M6 where it is %s', (toolZero, events) => {
    expect(tools('T1 M6\nT0 M6', { controller: { toolZero } })).toEqual(events);
  });

  test('a macro dialect with M6 before its T would load the previous choice, and that is told', () => {
    const macro = { controller: { language: 'custom-macro' } };
    expect(tools('M6 T1', macro)).toContain('1 1-6 number-order');
    expect(tools('T1 M6', macro).join()).not.toContain('number-order');
  });

  test('a change takes the head to its change point where there is one', () => {
    const away = { machine: { changePoint: { x: 8, y: 9, z: -1 } } };
    expect(run('T1 M6\nX0', away)).toEqual(['2 rapid X8 Y9 Z-1 → X0 Y9 Z-1']);
    expect(run('T1 M6\nX1')).toEqual(['2 rapid X0 Y0 Z0 → X1 Y0 Z0']);
  });
});

describe('order within a block (NISTIR 6556 table 8)', () => {
  const all = [
    'motion',
    'spindle',
    'coolant',
    'dwell',
    'stop',
    'lengthOffset',
    'toolChanged',
    'programEnd',
  ] as const;
  test.each([
    [
      'X1 M0 G43 H1 M8 M3 S100 M6 T1 F9 G1',
      [
        '1 changed T1: T1',
        '1 M3 cw 100',
        '1 M8 mist false flood true',
        '1 G43 H1 0 to 50',
        '1 feed X0 Y0 Z0 → X1 Y0 Z0 F9',
        '1 stop M0',
        '1 end end-of-text',
      ],
    ],
    ['M30 G0 X1 G4 P2', ['1 dwell 2 program', '1 rapid X0 Y0 Z0 → X1 Y0 Z0', '1 end M30']],
    ['S5 M3\nS7', ['1 M3 cw 5', '2 S cw 7', '2 end end-of-text']],
    [
      'M7\nM8\nM9',
      [
        '1 M7 mist true flood false',
        '2 M8 mist true flood true',
        '3 M9 mist false flood false',
        '3 end end-of-text',
      ],
    ],
    // M19 orients the spindle, so it stands.
    ['S5 M3\nM19', ['1 M3 cw 5', '2 M19 off 5', '2 end end-of-text']],
  ])('%j', (program, events) => {
    expect(eventsOf(program, change(), all)).toEqual(events);
  });
});

describe('words that nothing uses', () => {
  test.each([
    ['X1 H1', ['1 4-6 not-modelled no-use', '1 rapid X0 Y0 Z0 → X1 Y0 Z0']],
    ['X1 I1', ['1 4-6 not-modelled no-use', '1 rapid X0 Y0 Z0 → X1 Y0 Z0']],
    ['X1 E5', ['1 4-6 not-modelled other-axis', '1 rapid X0 Y0 Z0 → X1 Y0 Z0']],
    ['X1 A5', ['1 4-6 not-modelled no-axis', '1 rapid X0 Y0 Z0 → X1 Y0 Z0 A5']],
    // Noughts that say again that nothing is on.
    ['G49 H0\nG40 D0\nT1 M6 H0', []],
  ])('%j', (program, events) => {
    expect(run(program)).toEqual(events);
  });
});

describe('codes the setup declares', () => {
  const codes = [
    { code: 'M64', where: { P: 2 }, does: 'air-blast' },
    { code: 'M61', does: 'set-current-tool', from: 'Q' },
    { code: 'M70', does: 'save-state' },
    { code: 'M72', does: 'restore-state' },
    { code: 'M8', where: { P: 9 }, does: 'vacuum-on' },
  ];
  const declared = (program: string) =>
    eventsOf(program, change({ controller: { codes } }), ['motion', 'deed', 'coolant']);
  test.each([
    ['M64 P2', ['1 M64 air-blast']],
    ['M64 P3', ['1 1-4 not-modelled M64']],
    ['M8 P9', ['1 M8 vacuum-on']],
    // Where its conditions do not hold, a code keeps its built-in meaning.
    ['M8', ['1 M8 mist false flood true']],
    [
      'M70\nG91 G20\nM72\nX1',
      ['1 M70 save-state', '3 M72 restore-state', '4 rapid X0 Y0 Z0 → X1 Y0 Z0'],
    ],
  ])('%j', (program, events) => {
    expect(declared(program)).toEqual(events);
  });
});

describe('what is not modelled', () => {
  test.each([
    // The walk goes on from the stated end.
    ['G5 X5\nG0 X6', ['1 1-3 not-modelled G5', '2 rapid X5 Y0 Z0 → X6 Y0 Z0']],
    // Axis words of a setting code are no end.
    ['G68 X5 Y5 R45\nG0 X6', ['1 1-4 not-modelled G68', '2 rapid X0 Y0 Z0 → X6 Y0 Z0']],
    ['M98 P100', ['1 1-9 subprogram-missing call']],
    ['G0 X#1\nX2', ['1 4-7 not-modelled depends', '2 rapid X0 Y0 Z0 → X2 Y0 Z0']],
    ['M250', ['1 1-5 not-modelled M250']],
  ])('%j', (program, events) => {
    expect(run(program)).toEqual(events);
  });
});
