import { describe, expect, test } from 'vitest';
import { run, story } from './run';

describe('trace', () => {
  test('prints each motion of the program as one JSON line, gauge point in machine mm', () => {
    const { code, out, err } = run('trace', ...story('long-worktop'));
    expect({ code, err }).toEqual({ code: 0, err: '' });
    const motions = out
      .trimEnd()
      .split('\n')
      .map((line) => JSON.parse(line) as Record<string, unknown>);
    // By hand: G54 stands at X30 Y40, so X20 Y6 of line 11 is machine X50 Y46, Z still at the top.
    expect(motions.find(({ line }) => line === 11)).toEqual({
      line: 11,
      kind: 'rapid',
      to: { x: 50, y: 46, z: 0 },
    });
    // By hand: Z-9 with H1 = 107.25 and origin -182 is -9 + 107.25 - 182 = -83.75.
    expect(motions.find(({ line }) => line === 14)).toMatchObject({
      kind: 'feed',
      to: { z: -83.75 },
      feed: 1500,
    });
    // By hand: quarter turn from (1284.2, 6) to (1294.2, 16) about (1284.2, 16), plus the origin (30, 40).
    expect(motions.find(({ line }) => line === 17)).toMatchObject({
      kind: 'arc',
      plane: 'xy',
      centre: { x: 1314.2, y: 56 },
      turn: Math.PI / 2,
    });
  });

  test('refuses more than one program', () => {
    const { code, out } = run('trace', ...story('long-worktop'), 'another.nc');
    expect({ code, out }).toEqual({ code: 3, out: '' });
  });
});
