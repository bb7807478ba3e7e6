import type { Shortcut } from './shortcut';
import { matchKey } from './shortcut';

const shortcut = (keys: string): Shortcut => ({
  keys,
  does: keys,
  place: 'Everywhere',
  run: () => undefined,
});

describe('matchKey', () => {
  const all = [shortcut('?'), shortcut('g b'), shortcut('g p'), shortcut('b')];

  it('finds a single key', () => {
    expect(matchKey(all, '', '?')).toEqual({ kind: 'whole', shortcut: all[0] });
  });
  it('waits after the first key of a pair', () => {
    expect(matchKey(all, '', 'g')).toEqual({ kind: 'begun', first: 'g' });
  });
  it('finds the pair and not the single key it ends with', () => {
    expect(matchKey(all, 'g', 'b')).toEqual({ kind: 'whole', shortcut: all[1] });
  });
  it('takes the second key for itself when the pair means nothing', () => {
    expect(matchKey(all, 'g', '?')).toEqual({ kind: 'whole', shortcut: all[0] });
  });
  it('lets a page give a key its own meaning', () => {
    const own = shortcut('b');
    expect(matchKey([...all, own], '', 'b')).toEqual({ kind: 'whole', shortcut: own });
  });
  it('says nothing for other keys', () => {
    expect(matchKey(all, '', 'x')).toEqual({ kind: 'none' });
  });
});
