import type { Pocket } from '#engine';
import { placeRow, spaceEvenly } from './pocket-spacing';

const pocket = (number: number, x: number, y = 2560, z = -125): Pocket => ({
  number,
  grip: { x, y, z },
  opens: '-y',
  largestDiameter: 50,
  longest: 190,
  taper: 'ISO30',
  kind: 'fork',
});

describe('pockets evenly spaced between two taught ones', () => {
  it('stand at the same pitch and are numbered in between', () => {
    // A pitch of 125 mm leaves room for a 180 mm boot beside a 50 mm holder: common practice, no source.
    const spaced = spaceEvenly(pocket(1, 100), pocket(8, 975));
    if ('sentence' in spaced) throw new Error(spaced.sentence);
    expect(spaced.pitch).toBe(125);
    expect(spaced.pockets.map((each) => [each.number, each.grip.x])).toEqual([
      [1, 100],
      [2, 225],
      [3, 350],
      [4, 475],
      [5, 600],
      [6, 725],
      [7, 850],
      [8, 975],
    ]);
  });

  it('follow a rack that is not square to the axes, to a thousandth', () => {
    const spaced = spaceEvenly(pocket(1, 0, 2560, -125), pocket(4, 100, 2560.5, -124.9));
    if ('sentence' in spaced) throw new Error(spaced.sentence);
    expect(spaced.pockets[1]?.grip).toEqual({ x: 33.333, y: 2560.167, z: -124.967 });
    expect(spaced.pockets[3]?.grip).toEqual({ x: 100, y: 2560.5, z: -124.9 });
  });

  it('count down where the first has the greater number', () => {
    const spaced = spaceEvenly(pocket(3, 300), pocket(1, 100));
    if ('sentence' in spaced) throw new Error(spaced.sentence);
    expect(spaced.pockets.map((each) => each.number)).toEqual([3, 2, 1]);
  });

  it('do not claim to have been taught', () => {
    const taught = { at: '2026-11-30T18:00:00Z', by: 'Ana' };
    const spaced = spaceEvenly({ ...pocket(1, 0), taught }, { ...pocket(3, 200), taught });
    if ('sentence' in spaced) throw new Error(spaced.sentence);
    expect(spaced.pockets.map((each) => each.taught?.by)).toEqual(['Ana', undefined, 'Ana']);
  });

  it('are refused, with the reason, where two ends make no row', () => {
    expect(spaceEvenly(pocket(1, 0), pocket(1, 100))).toHaveProperty('sentence');
    expect(spaceEvenly(pocket(1, 0), pocket(2, 0))).toHaveProperty('sentence');
    expect(spaceEvenly(pocket(1, 0), { ...pocket(2, 9), opens: '+x' })).toHaveProperty('sentence');
  });

  it('replace pockets of the same number and leave the others', () => {
    const row = [pocket(2, 10), pocket(3, 20)];
    const placed = placeRow([pocket(9, 900), pocket(2, 1)], row);
    expect(placed.map((each) => [each.number, each.grip.x])).toEqual([
      [2, 10],
      [3, 20],
      [9, 900],
    ]);
  });
});
