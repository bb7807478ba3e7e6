import { describe, expect, test } from 'vitest';
import { startTrace, type Motion } from '../index';
import { eventsOf } from '../testing/events-of';
import { testSetup } from '../testing/test-shop';

const SETUP = {
  machine: {
    travel: { x: [-900, 900], y: [-900, 900], z: [-900, 900] },
    start: { x: 0, y: 0, z: 0 },
    references: { g28: { x: 1, y: 2, z: 3 } },
  },
  offsets: { work: { G54: { x: 0, y: 0, z: 0 } } },
  controller: {
    parameters: {},
    codes: [{ code: 'M66', does: 'read-input', input: 'tool-present', into: '#5399' }],
    switches: { startMotion: 'rapid' },
  },
};

const run = (program: string): string[] =>
  eventsOf(`G21 G90 F100\n${program}`, SETUP).filter((text) => !text.endsWith('missing-end'));

describe('after a probing move the head is somewhere on its way', () => {
  test('a move along the axis is judged from both ends, and one that states it is known again', () => {
    expect(run('G38.2 Z-10\nG91 G0 Z5\nG90 Z20\nX1')).toEqual([
      '2 probe X0 Y0 Z0 → X0 Y0 Z-10 F100',
      '3 rapid X0 Y0 Z-10 → X0 Y0 Z-5',
      '3 rapid X0 Y0 Z0 → X0 Y0 Z5',
      '4 rapid X0 Y0 Z-5 → X0 Y0 Z20',
      '4 rapid X0 Y0 Z5 → X0 Y0 Z20',
      '5 rapid X0 Y0 Z20 → X1 Y0 Z20',
    ]);
  });

  test('a move of other axes is judged at both heights', () => {
    expect(run('G38.2 Z-10\nG0 X5\nG53 G0 Z0\nX6')).toEqual([
      '2 probe X0 Y0 Z0 → X0 Y0 Z-10 F100',
      '3 rapid X0 Y0 Z-10 → X5 Y0 Z-10',
      '3 rapid X0 Y0 Z0 → X5 Y0 Z0',
      '4 rapid by machine X5 Y0 Z-10 → X5 Y0 Z0',
      '4 rapid by machine X5 Y0 Z0 → X5 Y0 Z0',
      '5 rapid X5 Y0 Z0 → X6 Y0 Z0',
    ]);
  });

  test('G28 leads to a known place', () => {
    expect(run('G38.2 Z-10\nG28\nG0 X6').at(-1)).toBe('4 rapid X1 Y2 Z3 → X6 Y2 Z3');
  });

  test('probing again from there reaches as far as either', () => {
    expect(run('G38.2 Z-10\nG91 G38.2 Z-10\nG90 G0 X1').slice(-2)).toEqual([
      '4 rapid X0 Y0 Z-20 → X1 Y0 Z-20',
      '4 rapid X0 Y0 Z0 → X1 Y0 Z0',
    ]);
  });

  test('probing twice leaves what both may have reached', () => {
    expect(run('G38.2 Z-10\nG91 G38.2 Z-10\nG90 G0 Z50\nX[#5063]').slice(-2)).toEqual([
      '5 rapid X0 Y0 Z50 → X-20 Y0 Z50',
      '5 rapid X0 Y0 Z50 → X0 Y0 Z50',
    ]);
  });

  test.each([
    ['G38.2', ['X1']],
    ['G38.3', ['X0', 'X1']],
  ])('whether %s touched is known if it had to', (code, ends) => {
    const told = run(`${code} Z-10\nG0 Z20\nX#5070`).filter((text) => text.startsWith('4'));
    expect(told.map((text) => /→ (X\S+)/.exec(text)![1])).toEqual(ends);
  });

  test('where it stopped is a parameter within bounds (facts sheet 4.3)', () => {
    expect(run('G38.2 Z-10\nG0 Z20\nX[#5063]').slice(-2)).toEqual([
      '4 rapid X0 Y0 Z20 → X-10 Y0 Z20',
      '4 rapid X0 Y0 Z20 → X0 Y0 Z20',
    ]);
  });

  test.each(['G92 Z0', 'G10 L20 P1 Z0', 'G28.1'])('an offset set there is named: %s', (block) => {
    expect(run(`G38.2 Z-10\n${block}`).at(-1)).toContain('not-modelled depends');
  });

  test.each(['G10 L2 P1 Z5', 'G52 X1', 'G92.1', 'M3 S8000', 'G4 P1', 'T1'])(
    'what rests on no place is carried out once: %s',
    (block) => {
      expect(run(`G38.2 Z-10\n${block}`)).toHaveLength(1);
    },
  );

  test('an arc at an unknown height is judged at both', () => {
    expect(run('G38.2 Z-10\nG2 X10 I5').slice(1)).toEqual([
      '3 arc X0 Y0 Z-10 → X10 Y0 Z-10 F100 xy centre 5,0 turn -180',
      '3 arc X0 Y0 Z0 → X10 Y0 Z0 F100 xy centre 5,0 turn -180',
    ]);
  });

  test('an arc from an unknown place in its plane is named', () => {
    expect(run('G38.2 X10\nG2 X20 I5')).toContain('3 1-10 not-modelled depends');
  });

  test('a plain program is told of nothing', () => {
    expect(run('G38.2 Z-10\nG0 Z20\nG2 X20 I10 F100\nM30').join()).not.toContain('depends');
  });
});

describe('a word within bounds', () => {
  test('is moved to both, two of them to every pair', () => {
    const ends = run('M66\nX[#5399*2] Y[#5399*3]').map((text) => text.split('→ ')[1]);
    expect(ends).toEqual(['X0 Y0 Z0', 'X2 Y0 Z0', 'X0 Y3 Z0', 'X2 Y3 Z0']);
  });

  test('adds to where the head may be in incremental distance', () => {
    const last = run('M66\nG91 G0 X[#5399*2]\nX[#5399*2]\nG90 Y1').slice(-2);
    expect(last).toEqual(['5 rapid X0 Y0 Z0 → X0 Y1 Z0', '5 rapid X4 Y0 Z0 → X4 Y1 Z0']);
  });

  test('from an unknown place, every start meets every end', () => {
    const moves = run('M66\nX[#5399*2]\nX[#5399*3]').slice(2);
    expect(moves.map((text) => text.replace(/ Y0 Z0/g, ''))).toEqual([
      '4 rapid X0 → X0',
      '4 rapid X2 → X0',
      '4 rapid X0 → X3',
      '4 rapid X2 → X3',
    ]);
  });

  test('that stands a hundred times is no more than one', () => {
    const told = run(`M66\n${'X#5399'.repeat(100)}`);
    expect(told.filter((text) => text.startsWith('3 rapid'))).toHaveLength(2);
  });

  test('that sets an offset is named', () => {
    expect(run('M66\nG10 L2 P1 X#5399').at(-1)).toContain('not-modelled depends');
  });

  test('does not outlive a block that is not carried out', () => {
    expect(run('M66\nX#5399 X2 H#<a>\nY1').slice(-1)).toEqual(['4 rapid X0 Y0 Z0 → X0 Y1 Z0']);
  });
});

test('the other readings are marked, and all of them have an unknown end', () => {
  const seen: string[] = [];
  const trace = startTrace(testSetup(SETUP), undefined, {
    observers: [
      {
        motion: ({ toX, isAlternative, endUnknown }: Motion) =>
          void seen.push(`${toX} ${isAlternative} ${endUnknown}`),
      },
    ],
  });
  do trace.push(new TextEncoder().encode('M66\nG0 X#5399\nX5\nX6\n'));
  while (trace.endOfText() === 'read-again');
  expect(seen).toEqual([
    '0 false true',
    '1 true true',
    '5 false true',
    '5 true true',
    '6 false false',
  ]);
});
