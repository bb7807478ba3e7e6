import { ownGreatest, ownLeast } from '../geometry/path';
import type { Motion } from '../interpreter/events';
import type { Interval, Machine } from '../shop/setup';
import type { LengthWords } from './rule';

/** The ends of travel as a person at the machine calls them: X right, Y away from the operator, Z up. */
export type TravelAxis = 'x' | 'y' | 'z' | 'a';
export type TravelSide = 'low' | 'high';

const SIDE_WORDS: Readonly<Record<TravelAxis, Readonly<Record<TravelSide, string>>>> = {
  x: { low: 'left-hand', high: 'right-hand' },
  y: { low: 'front', high: 'back' },
  z: { low: 'lower', high: 'upper' },
  a: { low: 'lower', high: 'upper' },
};
/** Where work zero has to go to bring a move back from an end of travel. */
const AWAY_WORDS: Readonly<Record<'x' | 'y' | 'z', Readonly<Record<TravelSide, string>>>> = {
  x: { low: 'right', high: 'left' },
  y: { low: 'away from the operator', high: 'towards the operator' },
  z: { low: 'up', high: 'down' },
};

export function sideWord(axis: string, side: string): string {
  return SIDE_WORDS[axis as TravelAxis]?.[side as TravelSide] ?? side;
}
export function awayWord(axis: string, side: string): string {
  return AWAY_WORDS[axis as 'x' | 'y' | 'z']?.[side as TravelSide] ?? '';
}

/** A limit, which nobody measures, in one unit: millimetres where both are given. */
export function oneLength(lengths: LengthWords, mm: number): string {
  return lengths.length(mm).split(' (')[0] ?? '';
}

export interface Reach {
  readonly axis: TravelAxis;
  readonly side: TravelSide;
  readonly at: number;
  readonly limit: number;
}

/**
 * The farthest places that a motion itself goes to, on each axis it moves: its end, and what an arc
 * bulges past its start. Where it starts is the doing of the motion before. An axis whose work offset
 * has no value yet stands nowhere in particular and is left out.
 */
export function visitReaches(
  motion: Motion,
  travel: Machine['travel'],
  isUnset: { readonly x: boolean; readonly y: boolean; readonly z: boolean },
  visit: (reach: Reach) => void,
): void {
  if (!isUnset.x)
    visitAxis('x', motion.fromX, motion.toX, motion.minX, motion.maxX, travel.x, visit);
  if (!isUnset.y)
    visitAxis('y', motion.fromY, motion.toY, motion.minY, motion.maxY, travel.y, visit);
  if (!isUnset.z)
    visitAxis('z', motion.fromZ, motion.toZ, motion.minZ, motion.maxZ, travel.z, visit);
  if (travel.a && motion.fromA !== motion.toA) {
    visit({ axis: 'a', side: 'low', at: motion.toA, limit: travel.a[0] });
    visit({ axis: 'a', side: 'high', at: motion.toA, limit: travel.a[1] });
  }
}

function visitAxis(
  axis: 'x' | 'y' | 'z',
  from: number,
  to: number,
  least: number,
  greatest: number,
  limits: Interval,
  visit: (reach: Reach) => void,
): void {
  // NaN differs from itself, so a position that is no number is looked at too.
  if (from === to && least === from && greatest === from) return;
  visit({ axis, side: 'low', at: ownLeast(from, to, least), limit: limits[0] });
  visit({ axis, side: 'high', at: ownGreatest(from, to, greatest), limit: limits[1] });
}
