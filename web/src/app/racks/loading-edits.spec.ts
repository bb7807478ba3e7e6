import type { Loading } from '#engine';
import { applyEdits, pocketOf, toolIn } from './loading-edits';
import { wordDifferences, wordEdit } from './loading-words';

const LOADING: Loading = {
  pockets: [
    { pocket: 1, tool: 4 },
    { pocket: 2, tool: 7 },
  ],
  inSpindle: 'unknown',
  byHand: [12],
};
const TOOLS = new Map([
  [4, { name: '6 mm compression' }],
  [7, { name: '3 mm ball' }],
]);

describe('what a person does to a loading', () => {
  it('puts a tool into an empty pocket', () => {
    const after = applyEdits(LOADING, [{ act: 'load', tool: 9, pocket: 5 }]);
    expect(toolIn(after, 5)).toBe(9);
    expect(after.pockets).toHaveLength(3);
  });
  it('moves a tool that sits elsewhere: it is never in two pockets', () => {
    const after = applyEdits(LOADING, [{ act: 'load', tool: 4, pocket: 5 }]);
    expect(after.pockets).toEqual([
      { pocket: 2, tool: 7 },
      { pocket: 5, tool: 4 },
    ]);
  });
  it('replaces the tool that sits in the pocket', () => {
    const after = applyEdits(LOADING, [{ act: 'load', tool: 9, pocket: 1 }]);
    expect(toolIn(after, 1)).toBe(9);
    expect(pocketOf(after, 4)).toBeUndefined();
  });
  it('takes a tool off the hand list when it gets a pocket, and out of its pocket when fitted by hand', () => {
    expect(applyEdits(LOADING, [{ act: 'load', tool: 12, pocket: 3 }]).byHand).toEqual([]);
    const byHand = applyEdits(LOADING, [{ act: 'by-hand', tool: 4, fitted: true }]);
    expect(byHand.byHand).toEqual([4, 12]);
    expect(pocketOf(byHand, 4)).toBeUndefined();
  });
  it('swaps two pockets, also with an empty one', () => {
    expect(applyEdits(LOADING, [{ act: 'swap', pocket: 1, with: 2 }]).pockets).toEqual([
      { pocket: 1, tool: 7 },
      { pocket: 2, tool: 4 },
    ]);
    expect(toolIn(applyEdits(LOADING, [{ act: 'swap', pocket: 1, with: 6 }]), 6)).toBe(4);
  });
  it('empties a pocket, says what the spindle holds, and goes back to an earlier loading', () => {
    expect(applyEdits(LOADING, [{ act: 'unload', pocket: 1 }]).pockets).toHaveLength(1);
    expect(applyEdits(LOADING, [{ act: 'spindle', holds: null }]).inSpindle).toBeNull();
    const to: Loading = { pockets: [], inSpindle: null, byHand: [] };
    expect(applyEdits(LOADING, [{ act: 'go-back', revision: 3, to }])).toEqual(to);
  });
  it('can be done again on a newer loading', () => {
    const newer: Loading = { ...LOADING, pockets: [{ pocket: 8, tool: 4 }] };
    expect(applyEdits(newer, [{ act: 'load', tool: 4, pocket: 5 }]).pockets).toEqual([
      { pocket: 5, tool: 4 },
    ]);
  });
});

describe('a loading in words', () => {
  it('says each pending act, and what it pushes out', () => {
    const words = (edit: Parameters<typeof wordEdit>[0]) => wordEdit(edit, LOADING, TOOLS);
    expect(words({ act: 'load', tool: 4, pocket: 2 })).toBe(
      'T4 (6 mm compression) goes from pocket 1 into pocket 2; T7 comes out.',
    );
    expect(words({ act: 'load', tool: 9, pocket: 5 })).toBe('T9 goes into pocket 5.');
    expect(words({ act: 'spindle', holds: 'unknown' })).toBe(
      'The spindle holds something unknown.',
    );
  });
  it('says what changed between two loadings', () => {
    const after = applyEdits(LOADING, [
      { act: 'load', tool: 4, pocket: 5 },
      { act: 'unload', pocket: 2 },
      { act: 'spindle', holds: 4 },
      { act: 'by-hand', tool: 12, fitted: false },
    ]);
    expect(wordDifferences(LOADING, after, TOOLS)).toEqual([
      'T4 (6 mm compression) went from pocket 1 into pocket 5.',
      'T7 (3 mm ball) came out of pocket 2.',
      'The spindle holds T4; before: something unknown.',
      'T12 is no longer fitted by hand.',
    ]);
    expect(wordDifferences(LOADING, LOADING, TOOLS)).toEqual([]);
  });
});
