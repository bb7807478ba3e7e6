import { differencesOf, isSame, rebase, valueAt } from './differences';

describe('what differs between two values', () => {
  it('is listed leaf by leaf with its path', () => {
    expect(
      differencesOf(
        { travel: { x: [0, 1300] }, name: 'N', gone: 1 },
        { travel: { x: [0, 1310] }, name: 'N', come: 2 },
      ),
    ).toEqual([
      { path: ['travel', 'x', 1], was: 1300, is: 1310 },
      { path: ['gone'], was: 1, is: undefined },
      { path: ['come'], was: undefined, is: 2 },
    ]);
  });
  it('gives lists of different length as a whole', () => {
    expect(differencesOf({ a: [1] }, { a: [1, 2] })).toEqual([
      { path: ['a'], was: [1], is: [1, 2] },
    ]);
  });
  it('does not see an order of keys as a difference', () => {
    expect(isSame({ a: 1, b: [{ c: 2 }] }, { b: [{ c: 2 }], a: 1 })).toBe(true);
    expect(isSame({ a: undefined }, {})).toBe(true);
    expect(isSame([1], [2])).toBe(false);
  });
});

describe('my changes on top of another person’s', () => {
  const base = { name: 'N', travel: { x: [0, 1300] }, top: -200, area: { min: 0 } };

  it('keep theirs where I changed nothing and mine where I did', () => {
    const mine = { ...base, top: -199.5 };
    const theirs = { ...base, travel: { x: [0, 1290] } };
    expect(rebase(base, mine, theirs)).toEqual({
      value: { ...base, travel: { x: [0, 1290] }, top: -199.5 },
      clashes: [],
    });
  });
  it('name the places that both changed, and keep mine there', () => {
    const { value, clashes } = rebase(base, { ...base, top: -199 }, { ...base, top: -198 });
    expect(valueAt(value, ['top'])).toBe(-199);
    expect(clashes).toEqual([{ path: ['top'], theirs: -198 }]);
  });
  it('stand as a whole list, named as a clash, where the other made the list longer', () => {
    const list = (...grips: number[]) => ({ pockets: grips.map((x) => ({ x })) });
    const { value, clashes } = rebase(list(1, 2), list(1, 3), list(1, 2, 4));
    expect(value).toEqual(list(1, 3));
    expect(clashes).toEqual([{ path: ['pockets'], theirs: [{ x: 1 }, { x: 2 }, { x: 4 }] }]);
  });
  it('do not call it a clash when both changed it to the same', () => {
    expect(rebase(base, { ...base, top: 1 }, { ...base, top: 1 }).clashes).toEqual([]);
  });
  it('carry over what I took out', () => {
    const mine = { name: 'N', travel: { x: [0, 1300] }, top: -200 };
    expect(rebase(base, mine, { ...base, name: 'M' }).value).toEqual({ ...mine, name: 'M' });
  });
});
