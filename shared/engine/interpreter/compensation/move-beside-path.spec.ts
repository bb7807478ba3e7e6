import { describe, expect, test } from 'vitest';
import { eventsOf } from '../../testing/events-of';

/** Work zero at machine zero, no travel in the way, T2 of 6 mm held: a radius of 3 mm. */
const open = (change: { controller?: object; offsets?: object; machine?: object } = {}) => ({
  machine: {
    travel: { x: [-900, 900], y: [-900, 900], z: [-900, 900], a: [-900, 900] },
    start: { x: 0, y: 0, z: 0 },
    ...change.machine,
  },
  controller: change.controller ?? {},
  loading: { inSpindle: 2 },
  offsets: { work: { G54: { x: 0, y: 0, z: 0, a: 0 } }, ...change.offsets },
});
const ways = (program: string, change?: Parameters<typeof open>[0]) =>
  eventsOf(`G21 G90 G17 G54 F600\n${program}\nM30`, open(change)).map((text) =>
    text.replace(/X\S+ Y\S+ Z\S+ → /, '').replace(' F600', ''),
  );

/**
 * From (5, 0) to (0, 0) the entry is 5 long. With a radius of 3 the tangent leaves the cutter at
 * (3 · 0.6, −3 · 0.8), cosine and sine of the angle whose cosine is 3/5. Going on to −X its side is (0, −3):
 * 90 − 53.1301 degrees round the corner.
 */
const ENTRY = 'G0 X5 Y0\nG41 D2 G1 X0';
const ENTERED = ['2 rapid X5 Y0 Z0', '3 feed X1.8 Y-2.4 Z0'];
const ALONG = ['4 arc X0 Y-3 Z0 xy centre 0,0 turn -36.8699', '4 feed X-20 Y-3 Z0'];

describe('follows the published path (NISTIR 6556, appendix B)', () => {
  test('a tangent entry, and an arc of the radius round an outside corner', () => {
    expect(ways(`${ENTRY}\nX-20\nY20`)).toEqual([
      ...ENTERED,
      ...ALONG,
      '5 arc X-23 Y0 Z0 xy centre -20,0 turn -90',
      '5 feed X-23 Y20 Z0',
    ]);
  });
  test('right of the path it is the same in the mirror', () => {
    expect(ways('G0 X5 Y0\nG42 D2 G1 X0\nX-20\nY-20')).toEqual([
      '2 rapid X5 Y0 Z0',
      '3 feed X1.8 Y2.4 Z0',
      '4 arc X0 Y3 Z0 xy centre 0,0 turn 36.8699',
      '4 feed X-20 Y3 Z0',
      '5 arc X-23 Y0 Z0 xy centre -20,0 turn 90',
      '5 feed X-23 Y-20 Z0',
    ]);
  });
  test('straight on is no corner, and back on itself half a turn', () => {
    expect(ways(`${ENTRY}\nX-20\nX-30\nX0`).slice(4)).toEqual([
      '5 feed X-30 Y-3 Z0',
      '6 arc X-30 Y3 Z0 xy centre -30,0 turn -180',
      '6 feed X0 Y3 Z0',
    ]);
  });
  test('rapids are compensated without corner arcs', () => {
    expect(ways(`${ENTRY}\nX-20\nG0 Y20`).slice(4)).toEqual(['5 rapid X-23 Y20 Z0']);
  });
  test('Z and A go along; alone they leave the cutter at its side', () => {
    expect(ways(`${ENTRY}\nX-20 Z-4 A90\nZ5\nA0`).slice(2)).toEqual([
      '4 arc X0 Y-3 Z0 xy centre 0,0 turn -36.8699',
      '4 feed X-20 Y-3 Z-4 A90',
      '5 feed X-20 Y-3 Z5',
      '6 feed X-20 Y-3 Z5 A0',
    ]);
  });
  test('Z alone does not enter yet', () => {
    expect(ways('G0 X5 Y0\nG41 D2\nG1 Z-2\nX0').slice(1)).toEqual([
      '4 feed X5 Y0 Z-2',
      '5 feed X1.8 Y-2.4 Z-2',
    ]);
  });
  test('an outside arc on a radius more by the cutter, an inside one on a radius less', () => {
    // West to (−20, 0); left round (−20, −10) is an inside arc, right round (−20, 10) an outside one.
    expect(ways(`${ENTRY}\nX-20\nG3 X-30 Y-10 J-10`).slice(4)).toEqual([
      '5 arc X-27 Y-10 Z0 xy centre -20,-10 turn 90',
    ]);
    expect(ways(`${ENTRY}\nX-20\nG2 X-30 Y10 R10`).slice(4)).toEqual([
      '5 arc X-33 Y10 Z0 xy centre -20,10 turn -90',
    ]);
  });
  test('a full circle begins and ends at the side of its start', () => {
    expect(ways(`${ENTRY}\nX-20\nG3 I0 J-10`).slice(4)).toEqual([
      '5 arc X-20 Y-3 Z0 xy centre -20,-10 turn 360',
    ]);
  });
  test('words in G91 count from the programmed point, and inches are the same', () => {
    expect(ways('G0 X5 Y0\nG91\nG41 D2 G1 X-5\nX-20\nY20').slice(1)).toEqual(
      ways('G0 X5 Y0\nG90\nG41 D2 G1 X0\nX-20\nY20').slice(1),
    );
    expect(ways('G0 X5 Y0\nG20\nG41 D2 G1 X0\nX[-20/25.4]\nY[20/25.4]').slice(1)).toEqual(
      ways('G0 X5 Y0\nG21\nG41 D2 G1 X0\nX-20\nY20').slice(1),
    );
  });
  test('strict: enters along an arc that touches the cutter, by centre or by radius', () => {
    const strict = { controller: { switches: { strict: true } } };
    // The programmed arc has radius 10 about (0, 10); the cutter outside of it starts 13 from that centre, and ends
    // 3 beyond (10, 10).
    expect(ways('G0 X0 Y-3\nG42 D2\nG3 X10 Y10 I0 J13', strict)).toEqual([
      '2 rapid X0 Y-3 Z0',
      '4 arc X13 Y10 Z0 xy centre 0,10 turn 90',
    ]);
    expect(ways('G0 X0 Y-3\nG42 D2\nG3 X10 Y10 R10', strict).slice(1)).toEqual([
      '4 arc X13 Y10 Z0 xy centre 0,10 turn 90',
    ]);
    expect(ways('G0 X0 Y0\nG42 D2\nG3 X10 Y10 I0 J10', strict).slice(1)).toEqual([
      '4 4-18 compensation-entry arc',
    ]);
  });
  test('strict: G40 moves nothing, and a word left out afterwards is where the cutter is', () => {
    const strict = { controller: { switches: { strict: true } } };
    expect(ways(`${ENTRY}\nX-20\nG40\nG0 X-40`, strict).slice(4)).toEqual(['6 rapid X-40 Y-3 Z0']);
  });
  test('in inverse time the F of a block holds for its corner arc and its line together', () => {
    // F2: half a minute for 3 · π/2 mm of arc and 20 mm of line.
    const told = ways(`${ENTRY}\nX-20\nG93\nY20 F2`).slice(4);
    const feed = (2 * ((3 * Math.PI) / 2 + 20)).toFixed(4);
    expect(told).toEqual([
      `6 arc X-23 Y0 Z0 F${feed} xy centre -20,0 turn -90`,
      `6 feed X-23 Y20 Z0 F${feed}`,
    ]);
  });
});

describe('what a controller that looks ahead does at a corner stays within what is told', () => {
  test('inside: to the end of the offset line, back to where the lines cross, and on', () => {
    expect(ways(`${ENTRY}\nX-20\nY-20`)).toEqual([
      ...ENTERED,
      ...ALONG,
      '5 feed X-17 Y-3 Z0',
      '5 feed X-17 Y-20 Z0',
    ]);
  });
  test('inside, between a line and an arc: across to the side of the arc', () => {
    // The arc round (−20, −10) begins straight down at (−30, −10), so its side there is 3 to the right.
    expect(ways(`${ENTRY}\nX-30\nG3 X-20 Y-10 I10 J0`).slice(3)).toEqual([
      '4 feed X-30 Y-3 Z0',
      '5 feed X-27 Y0 Z0',
      '5 arc X-20 Y-7 Z0 xy centre -20,0 turn 90',
    ]);
  });
  test('macro-style, outside: by the place where the offset lines cross', () => {
    expect(
      ways(`${ENTRY}\nX-20\nY20`, { controller: { language: 'custom-macro' } }).slice(-3),
    ).toEqual(['5 feed X-23 Y-3 Z0', '5 feed X-23 Y0 Z0', '5 feed X-23 Y20 Z0']);
  });
  test('macro-style, outside and sharper than square: one radius beyond on both lines', () => {
    // Back to +X at 45 degrees up: a turn of 135 degrees; the new side is (−0.7071, 0.7071) · 3.
    expect(
      ways(`${ENTRY}\nX-20\nX-10 Y10`, { controller: { language: 'custom-macro' } }).slice(-3),
    ).toEqual(['5 feed X-23 Y-3 Z0', '5 feed X-24.2426 Y0 Z0', '5 feed X-12.1213 Y12.1213 Z0']);
  });
  test('after G40 the next move ends at the programmed place on both axes', () => {
    expect(ways(`${ENTRY}\nX-20\nG40 G1 X-40\nY5`).slice(4)).toEqual([
      '5 feed X-40 Y0 Z0',
      '6 feed X-40 Y5 Z0',
    ]);
  });
});

describe('the radius', () => {
  const end = (switching: string, change?: Parameters<typeof open>[0]) =>
    ways(`G0 X20 Y0\n${switching}\nG1 X0\nX-20`, change).slice(-1)[0];
  test('is half the diameter of the D number, or of the held tool', () => {
    expect(end('G41 D1')).toBe('5 feed X-20 Y-5 Z0');
    expect(end('G41')).toBe('5 feed X-20 Y-3 Z0');
  });
  test('D0 is none', () => expect(end('G41 D0')).toBe('5 feed X-20 Y0 Z0'));
  test('a negative diameter swaps the side', () => {
    expect(end('G41 D2', { offsets: { diameter: { 2: -6 } } })).toBe('5 feed X-20 Y3 Z0');
  });
  test('the held tool is found behind the shift between T and D numbers', () => {
    const change = { controller: { diameterOffsetShift: 30 }, offsets: { diameter: { 32: 8 } } };
    expect(end('G41', change)).toBe('5 feed X-20 Y-4 Z0');
  });
  test('the held tool is found by its pocket where T names pockets', () => {
    const change = { controller: { toolWord: 'pocket' } };
    expect(end('T6 M6\nG41', change)).toContain('X-20 Y-6 Z0');
  });
  test('G41.1 states it as a diameter in the units of the program', () => {
    expect(end('G41.1 D7')).toBe('5 feed X-20 Y-3.5 Z0');
    expect(ways('G41.1')).toEqual(['2 1-6 missing-word D']);
  });
  test('one the table does not hold is told, and the path followed at that of the tool', () => {
    const told = ways('G0 X20 Y0\nG41 D99\nG1 X0\nX-20');
    expect(told).toContain('3 5-8 out-of-range-word D99');
    expect(told.at(-1)).toBe('5 feed X-20 Y-3 Z0');
  });
  test('a held tool without a diameter offset is told', () => {
    const told = ways('G0 X20 Y0\nG41\nG1 X0\nX-20', { controller: { diameterOffsetShift: 50 } });
    expect(told[1]).toContain('out-of-range-word');
    expect(told.at(-1)).toBe('5 feed X-20 Y-3 Z0');
  });
});

describe('what is refused or told while it is on', () => {
  const REFUSED = [
    'G18',
    'G19',
    'G20',
    'G28 Z0',
    'G30',
    'G53 G0 Z0',
    'G92 X0',
    'G92.1',
    'G38.2 Z-5',
    'G81 X5 Z-2 R1',
    'G42 D2',
  ];
  test.each(REFUSED)('%s', (block) => {
    expect(ways(`${ENTRY}\n${block}`).slice(2)).toEqual([
      expect.stringMatching(/^4 \S+ modal-conflict/),
    ]);
  });
  test('the same side again, the same units and a safety line are ordinary', () => {
    expect(ways(`${ENTRY}\nG41 D2 X-20\nG21\nG21 G17 G40 G49 G80 G90\nG0 Z5`)).toEqual([
      ...ENTERED,
      ...ALONG,
      '7 rapid X-20 Y-3 Z5',
    ]);
  });
  test('macro-style, a new side enters anew', () => {
    const told = ways(`${ENTRY}\nX-20\nG42 D2\nX-40`, { controller: { language: 'custom-macro' } });
    // From (−20, −3) to (−40, 0) with a radius of 3 on the right.
    expect(told.at(-1)).toMatch(/^6 feed X-39\.\d+ Y2\.\d+ Z0$/);
  });
  test('moving work zero is told, restating it is not', () => {
    const offsets = { work: { G54: { x: 0, y: 0, z: 0 }, G55: { x: 50, y: 0, z: 0 } } };
    expect(ways(`${ENTRY}\nG54\nX-20`, { offsets })).toEqual([
      ...ENTERED,
      '5 arc X0 Y-3 Z0 xy centre 0,0 turn -36.8699',
      '5 feed X-20 Y-3 Z0',
    ]);
    expect(ways(`${ENTRY}\nG55`, { offsets }).slice(2)).toEqual([
      expect.stringContaining('compensation-entry zero-moved'),
    ]);
  });
  test('a place that is only known within bounds is told, and nothing goes wrong', () => {
    const told = ways('G38.2 X50 F100\nG41 D2\nG1 Y20\nX10');
    expect(
      told.some((text) => text.includes('4 not-modelled') || text.includes('4 1-7 not-modelled')),
    ).toBe(true);
  });
  test('after a change to the change point it enters anew', () => {
    const machine = { changePoint: { x: 100, y: 0, z: 0 } };
    const told = ways(`${ENTRY}\nT2 M6\nG1 X95 Y0`, { machine });
    // 5 long again: the tangent ends 1.8 and 2.4 off.
    expect(told.at(-1)).toBe('5 feed X96.8 Y-2.4 Z0');
  });
});

describe('D in a macro dialect holds on (common practice, no source)', () => {
  const macro = { controller: { language: 'custom-macro' } };
  test('a lone D is for the next G41', () => {
    expect(ways('G0 X20 Y0\nD1\nG41\nG1 X0\nX-20', macro).at(-1)).toBe('6 feed X-20 Y-5 Z0');
    expect(ways('D1')[0]).toContain('not-modelled no-use');
  });
  test('with G41 on the cutter goes over to it with the next move', () => {
    // From (−20, −3) to (−60, 0) at a radius of 5, then straight on.
    const told = ways('G0 X20 Y0\nG41 D2\nG1 X0\nX-20\nD1\nX-60\nX-80', macro);
    expect(told.at(-1)).toBe('8 feed X-80 Y-5 Z0');
  });
  test('D0 and back is a new entry', () => {
    const told = ways('G0 X20 Y0\nG41 D0\nG1 X0\nD2\nX-20\nX-40', macro);
    expect(told.at(-1)).toBe('7 feed X-40 Y-3 Z0');
  });
});

describe('G10 L1 in the program', () => {
  test('R sets the radius of the cutter', () => {
    expect(ways('G10 L1 P2 R4\nG0 X20 Y0\nG41 D2\nG1 X0\nX-20').at(-1)).toBe('6 feed X-20 Y-4 Z0');
  });
});

// Found by mutated programs: each left the walk without a position.
describe('what has no direction', () => {
  const macro = { controller: { language: 'custom-macro' } };
  test.each([
    ['an arc without a centre that ends where it starts', `${ENTRY}\nX-20\nG2 X-20\nG1 Y20`, {}],
    ['an arc that ends at its centre', `${ENTRY}\nX-20\nG2 X-30 I-10\nG1 Y20`, {}],
    ['a move to where the cutter is already', `${ENTRY}\nX-20\nG42 D1\nY-3\nX-60`, macro],
    ['a move of next to nothing', `${ENTRY}\nX-20\nX-20.000000000001\nY20`, {}],
  ])('%s', (_story, program, change) => {
    const told = ways(program, change);
    expect(told.join()).not.toMatch(/NaN|Infinity/);
    expect(told.at(-1)).toMatch(/^\d feed X/);
  });
});
