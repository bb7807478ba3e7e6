import { expect, test } from 'vitest';
import { cornerOf, cornerReach, crossing, directionOf, sideNormal, turnAway } from './corner';

// Plane geometry worked by hand: a cutter on the left of a path to +Y is at −X.
const NORTH = sideNormal(0, 5, 1);
const EAST = sideNormal(2, 0, 1);
const WEST = sideNormal(-2, 0, 1);

test('the side normal stands left or right of the way', () => {
  expect(NORTH).toEqual({ x: -1, y: 0 });
  expect(sideNormal(0, 5, -1)).toEqual({ x: 1, y: -0 });
  expect(directionOf(NORTH, 1).y).toBe(1);
});

test('turning away from the cutter is an outside corner, towards it an inside one', () => {
  expect(turnAway(NORTH, EAST, 1)).toBeCloseTo(Math.PI / 2, 12);
  expect(cornerOf(turnAway(NORTH, EAST, 1))).toBe('outside');
  expect(cornerOf(turnAway(NORTH, WEST, 1))).toBe('inside');
});

test('a hundredth of a radian is no corner, and a reversal is an outside one on either side', () => {
  expect([0.0099, -0.0099].map(cornerOf)).toEqual(['straight-on', 'straight-on']);
  expect([0.0101, -0.0101].map(cornerOf)).toEqual(['outside', 'inside']);
  expect([Math.PI, -Math.PI, 0.0099 - Math.PI].map(cornerOf)).toEqual([
    'outside',
    'outside',
    'outside',
  ]);
  expect(cornerOf(0.0101 - Math.PI)).toBe('inside');
});

test('offset lines of a right angle cross one radius along each, and use that much up', () => {
  expect(crossing(NORTH, WEST)).toEqual({ x: -1, y: -1 });
  expect(cornerReach(-Math.PI / 2)).toBeCloseTo(1, 12);
});
