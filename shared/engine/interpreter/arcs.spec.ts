import { describe, expect, test } from 'vitest';
import { eventsOf, showMotion } from '../testing/events-of';
import { startTrace } from '../index';
import type { Motion } from './events';
import { testSetup } from '../testing/test-shop';

const change = (controller: object = {}) => ({
  machine: {
    travel: { x: [-900, 900], y: [-900, 900], z: [-900, 900], a: [-3600, 3600] },
    start: { x: 0, y: 0, z: 0 },
  },
  controller,
  offsets: { work: { G54: { x: 0, y: 0, z: 0, a: 0 } } },
});
const arcs = (program: string, controller?: object) =>
  eventsOf(`G21 G90 G17 G54 F600\n${program}\nM30`, change(controller)).map((text) =>
    text.replace(/^2 /, '').replace(' F600', ''),
  );
function motionsOf(program: string): Motion[] {
  const motions: Motion[] = [];
  const observer = { motion: (motion: Motion) => void motions.push({ ...motion }) };
  const trace = startTrace(testSetup(change()), undefined, { observers: [observer] });
  trace.push(new TextEncoder().encode(`G21 G90 G17 G54 F600\n${program}\nM30`));
  trace.endOfText();
  return motions;
}

// Source: the facts sheet 5.1, planes seen from the positive end of the depth axis; quarter turns by hand.
describe('a helix in each plane rises along its depth axis', () => {
  test.each([
    ['G17 G3 X-10 Y10 I-10 J0 Z4', 'X-10 Y10 Z4 xy centre -10,0 turn 90'],
    ['G17 G2 X-10 Y-10 I-10 J0 Z-4', 'X-10 Y-10 Z-4 xy centre -10,0 turn -90'],
    ['G18 G3 Z-10 X10 K-10 I0 Y4', 'X10 Y4 Z-10 zx centre -10,0 turn 90'],
    ['G18 G2 Z-10 X-10 K-10 I0 Y4', 'X-10 Y4 Z-10 zx centre -10,0 turn -90'],
    ['G19 G3 Y-10 Z10 J-10 K0 X4', 'X4 Y-10 Z10 yz centre -10,0 turn 90'],
    ['G19 G2 Y-10 Z-10 J-10 K0 X4', 'X4 Y-10 Z-10 yz centre -10,0 turn -90'],
  ])('%s', (block, way) => {
    expect(arcs(block)).toEqual([`arc X0 Y0 Z0 → ${way}`]);
  });
  test('its length is that of the rope: turn times radius, and the rise', () => {
    const [helix] = motionsOf('G3 X-10 Y10 I-10 J0 Z4');
    expect(helix!.length).toBeCloseTo(Math.hypot((Math.PI / 2) * 10, 4), 9);
  });
});

// Common practice, no source: P counts the turns begun.
describe('P turns', () => {
  test.each([
    ['G3 X-10 Y10 I-10 J0 P1', 90],
    ['G3 X-10 Y10 I-10 J0 P2', 450],
    ['G2 X-10 Y-10 I-10 J0 P3', -810],
    ['G3 I-10 P1', 360],
    ['G3 I-10 Z-6 P3', 1080],
    ['G3 X-10 Y10 R10 P2', 450],
  ])('%s turns %d degrees', (block, turn) => {
    expect(arcs(block)).toEqual([expect.stringMatching(new RegExp(`turn ${turn}$`))]);
  });
  test('reach all four quarters once they go round, and count in the length', () => {
    const [helix] = motionsOf('G3 X-10 Y10 I-10 J0 P2 Z-5');
    const { minX, maxX, minY, maxY } = helix!;
    expect([minX, maxX, minY, maxY]).toEqual([-20, 0, -10, 10]);
    expect(helix!.length).toBeCloseTo(Math.hypot(2.5 * Math.PI * 10, 5), 9);
  });
  test.each([
    ['G3 I-10 P0', 'P0'],
    ['G3 I-10 P-2', 'P-2'],
    ['G3 I-10 P1.5', 'P1.5'],
    ['G3 I-10 P1001', 'P1001'],
  ])('%s is told, and the arc made once', (block, word) => {
    const [problem, arc] = arcs(block);
    expect(problem).toContain(`out-of-range-word ${word}`);
    expect(arc).toContain('turn 360');
  });
  test('are no word of an arc in a macro dialect or the published language', () => {
    expect(arcs('G3 I-10 P2', { language: 'custom-macro' })[0]).toContain('not-modelled no-use');
    expect(arcs('G3 X0 I-10 P2', { switches: { strict: true } })[0]).toContain('no-use');
  });
  test('a P of another code in the block is none', () => {
    expect(arcs('G64 P0.05 G3 I-10')[0]).toContain('turn 360');
    expect(arcs('G4 P2 G3 I-10')[0]).toContain('turn 360');
  });
});

describe('the radius format', () => {
  // Posts round to three decimals: half the chord is 10.0005 here. Facts sheet 5.7 for the strict reading.
  test('a semicircle rounded short by no more than the arc tolerance is one', () => {
    expect(arcs('G2 X20.001 Y0 R10')).toEqual([
      'arc X0 Y0 Z0 → X20.001 Y0 Z0 xy centre 10.0005,0 turn -180',
    ]);
    const [arc] = motionsOf('G2 X20.001 Y0 R10');
    expect(arc!.radius).toBeCloseTo(10.0005, 9);
    expect(arc!.maxY).toBeCloseTo(10.0005, 9);
  });
  test('one shorter than that is no arc, and under strict neither is the other', () => {
    expect(arcs('G2 X20.03 Y0 R10')[0]).toContain('arc-impossible radius-short');
    expect(arcs('G2 X20.001 Y0 R10', { switches: { strict: true } })[0]).toContain('radius-short');
    expect(arcs('G2 X20.001 Y0 R10', { arcTolerance: 0.0004 })[0]).toContain('radius-short');
  });
  test('near a full circle the long arc is taken', () => {
    // Chord 0.2 on a radius of 10: 2 · asin(0.01) = 1.1459 degrees short of a whole turn.
    expect(arcs('G2 X0.2 Y0 R-10')[0]).toMatch(/turn -358\.8541$/);
  });
});

describe('the centre format', () => {
  test('a centre word left out is nought, counted from the start', () => {
    expect(arcs('G2 X20 Y0 I10')).toEqual(arcs('G2 X20 Y0 I10 J0'));
    expect(arcs('G18 G2 Z20 X0 K10')).toEqual(arcs('G18 G2 Z20 X0 K10 I0'));
  });
  test('counted from program zero both are needed', () => {
    expect(arcs('G90.1 G2 X20 Y0 I10 J0')[0]).toMatch(/centre 10,0 turn -180$/);
    expect(arcs('G90.1 G2 X20 Y0 I10')).toEqual([
      expect.stringContaining('arc-centre-missing one-word'),
    ]);
  });
  test('absolute centres hold in each plane and count from a moved zero', () => {
    expect(arcs('G52 Z5 X7\nG18 G90.1 G2 Z5 X-7 K5 I-7').at(-1)).toContain('zx centre 10,0');
    expect(arcs('G19 G90.1 G3 Y20 Z0 J10 K0').at(-1)).toContain('yz centre 10,0 turn 180');
  });
  test.each([
    [0.0127, 20.0127, false],
    [0.0127, 20.0129, true],
    [0.05, 20.05, false],
    [0.05, 20.0502, true],
  ])('the tolerance of the profile, %d mm, judges an end at X%d', (arcTolerance, end, isTold) => {
    const told = arcs(`G2 X${end} Y0 I10`, { arcTolerance });
    expect(told.some((text) => text.includes('arc-radius-mismatch'))).toBe(isTold);
  });
  test('a rotary word goes along with the arc', () => {
    expect(arcs('G3 X-10 Y10 I-10 J0 A45')).toEqual([
      'arc X0 Y0 Z0 → X-10 Y10 Z0 A45 xy centre -10,0 turn 90',
    ]);
    const [arc] = motionsOf('G3 X-10 Y10 I-10 J0 A45');
    expect(arc!.length).toBeCloseTo(5 * Math.PI, 9);
    expect(showMotion(arc!)).toContain('A45');
  });
});
