import { describe, expect, test } from 'vitest';
import { runProgram } from '../testing/check-rule';
import { eventsOf } from '../testing/events-of';

const shop = (controller: object = {}) => ({
  machine: {
    travel: { x: [-900, 900], y: [-900, 900], z: [-900, 900], a: [-360, 360] },
    start: { x: 0, y: 0, z: 0 },
    references: { g28: { x: 0, y: 0, z: 0 }, g30: { x: 0, y: 0, z: 0 } },
    spindle: { waits: false },
  },
  controller,
  offsets: { work: { G54: { x: 0, y: 0, z: 0, a: 0 }, G55: { x: 0, y: 0, z: 0, a: 30 } } },
});
const turns = (program: string, controller?: object) =>
  eventsOf(`G21 G90 G17 G54 F600\n${program}\nM30`, shop(controller)).map((text) =>
    text.replace(/X\S+ Y\S+ Z\S+ → /, '').replace(' F600', ''),
  );

// Source: facts sheet 4.5 to 4.13 for each code; A in degrees whatever the units (section 1, table).
describe('A in program and machine coordinates', () => {
  test.each([
    [
      'absolute, and as written past a turn',
      'G0 A90\nA400',
      ['2 rapid X0 Y0 Z0 A90', '3 rapid X0 Y0 Z0 A400'],
    ],
    ['incremental', 'G91 G0 A90\nA-30', ['2 rapid X0 Y0 Z0 A90', '3 rapid X0 Y0 Z0 A60']],
    ['degrees are no inches', 'G20 G0 A90', ['2 rapid X0 Y0 Z0 A90']],
    ['from the zero of the offset', 'G55 G0 A0', ['2 rapid X0 Y0 Z0 A30']],
    ['G53 in machine degrees', 'G55 G53 G0 A10', ['2 rapid by machine X0 Y0 Z0 A10']],
    ['G92 sets it', 'G0 A90\nG92 A0\nA45', ['2 rapid X0 Y0 Z0 A90', '4 rapid X0 Y0 Z0 A135']],
    ['G52 shifts it', 'G52 A10\nG0 A5', ['3 rapid X0 Y0 Z0 A15']],
    ['G10 L2 places it', 'G10 L2 P1 A20\nG0 A1', ['3 rapid X0 Y0 Z0 A21']],
    [
      'G10 L20 places it by where it stands',
      'G0 A90\nG10 L20 P1 A0\nA1',
      ['2 rapid X0 Y0 Z0 A90', '4 rapid X0 Y0 Z0 A91'],
    ],
  ])('%s', (_story, program, told) => {
    expect(turns(program)).toEqual(told);
  });
});

// Source: facts sheet 4.9 and 4.10; where the description gives no other, the stored A is machine zero.
describe('homing', () => {
  test('takes A by its own word to the point named, then home', () => {
    expect(turns('G0 A90\nG28 A45')).toEqual([
      '2 rapid X0 Y0 Z0 A90',
      '3 rapid by home X0 Y0 Z0 A45',
      '3 rapid by home X0 Y0 Z0 A0',
    ]);
  });
  test('takes every axis home as published, or only the named ones', () => {
    const named = { switches: { homeAxes: 'named' } };
    expect(turns('G0 A90\nG28 Z5').at(-1)).toBe('3 rapid by home X0 Y0 Z0 A0');
    expect(turns('G0 A90\nG28 Z5', named).at(-1)).toBe('3 rapid by home X0 Y0 Z0');
    expect(turns('G0 A90\nG28 A90', named).at(-1)).toBe('3 rapid by home X0 Y0 Z0 A0');
  });
  test('goes back to an A that was stored, by G28.1 or by its parameter', () => {
    expect(turns('G0 A90\nG28.1\nA0\nG28').at(-1)).toBe('5 rapid by home X0 Y0 Z0 A90');
    expect(turns('#5164=15\nG28').at(-1)).toBe('3 rapid by home X0 Y0 Z0 A15');
  });
});

// Source: facts sheet 7.2 and 7.3.
describe('its time', () => {
  const seconds = (program: string) =>
    runProgram(`G21 G90 G17 G54\nS18000 M3\n${program}\nM30`, shop(), []).seconds;
  test('A alone: degrees over F minutes', () => {
    // 360 degrees at 720 a minute.
    expect(seconds('G1 A360 F720')).toMatchObject({ cutting: 30, total: 30 });
  });
  test('with X: F counts along X, and A keeps pace', () => {
    // 100 mm at 600 mm/min: 10 s, however far A turns.
    const alone = seconds('G1 X100 F600').cutting;
    expect(alone).toBe(10);
    expect(seconds('G1 X100 A360 F600').cutting).toBe(alone);
  });
  test('in inverse time a block lasts 1/F minutes, with X or without', () => {
    expect(seconds('G93 G1 A90 F6').cutting).toBe(10);
    expect(seconds('G93 G1 X100 A90 F6').cutting).toBe(10);
  });
  test('a rapid turn alone is not timed: the description has no speed of A', () => {
    expect(seconds('G0 A360').total).toBe(0);
  });
  test('with the spindle off it is no cutting', () => {
    expect(seconds('M5\nG1 A360 F720')).toMatchObject({ cutting: 0, total: 30 });
  });
});

// Source: facts sheet 7.3.
describe('inverse time', () => {
  test('needs F in every block that feeds, and in none that does not', () => {
    expect(turns('G93 G1 A90 F2\nA180\nG0 A0')).toEqual([
      '2 feed X0 Y0 Z0 A90 F180',
      '3 1-5 cut-no-feed inverse-time',
      '3 feed X0 Y0 Z0 A180',
      '4 rapid X0 Y0 Z0 A0',
    ]);
  });
  test('refuses F0, and forgets its F with the mode', () => {
    expect(turns('G93 G1 A90 F0')[0]).toContain('cut-no-feed inverse-time');
    expect(turns('G93 G1 A90 F2\nG94 A0')[1]).toContain('cut-no-feed');
  });
  test('an F beside a rapid is no feed of the next block', () => {
    expect(turns('G93 G0 A90 F2\nG1 A0')[1]).toContain('cut-no-feed inverse-time');
  });
});

describe('other rotary axes', () => {
  test.each(['B', 'C'])('%s is named: A is the only one followed', (letter) => {
    const { findings } = runProgram(`G21 G90 G17 G54\nG0 X1 ${letter}90\nM30`, shop());
    expect(
      findings.filter(({ rule }) => rule === 'not-modelled').map((each) => each.message),
    ).toEqual([
      `${letter}90 moves an axis this check does not follow: beside X, Y and Z it knows A alone.`,
    ]);
  });
  test('A is named where the machine description has none', () => {
    const { findings } = runProgram('G21 G90 G17 G54\nG0 X1 A90\nM30');
    expect(
      findings.some(({ rule, message }) => rule === 'not-modelled' && message.startsWith('A90')),
    ).toBe(true);
  });
  test('a cycle refuses an A word', () => {
    expect(turns('G81 X5 Z-2 R1 A90')).toEqual([
      expect.stringContaining('modal-conflict in-cycle'),
    ]);
  });
});
