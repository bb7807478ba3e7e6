import { PageWords } from './page-words';

describe('PageWords', () => {
  const { getRangeLabel } = new PageWords();
  it('says which rows are shown, to the last one and no further', () => {
    expect(getRangeLabel(1, 25, 42)).toBe('26 to 42 of 42');
    expect(getRangeLabel(0, 25, 0)).toBe('none');
  });
});
