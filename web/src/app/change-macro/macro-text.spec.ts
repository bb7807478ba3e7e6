import { changedLines, keepLineEnds, linesOf, linesToRead, wordChangedLines } from './macro-text';

describe('the text of a macro', () => {
  it('has lines that end with LF, CRLF or a lone CR', () => {
    expect(linesOf('M5\r\nG53 G0 Z0\rM30\n')).toEqual(['M5', 'G53 G0 Z0', 'M30', '']);
  });
  it('has no line after its last line end when it is read', () => {
    expect(linesToRead('M5\nM30\n')).toEqual(['M5', 'M30']);
    expect(linesToRead('M5\nM30')).toEqual(['M5', 'M30']);
    expect(linesToRead('')).toEqual([]);
  });
  it('keeps its line ends through a text area that only knows LF', () => {
    expect(keepLineEnds('M5\nM30\n', 'M5\r\nM9\r\n')).toBe('M5\r\nM30\r\n');
    expect(keepLineEnds('M5\nM30', 'M5\nM9')).toBe('M5\nM30');
    expect(keepLineEnds('M5\nM30', '')).toBe('M5\nM30');
  });
  it('says which lines a change touches', () => {
    expect(changedLines('a\nb\nc', 'a\nx\ny\nc')).toEqual({ from: 2, removed: 1, added: 2 });
    expect(changedLines('a\nb', 'a\nb')).toBeNull();
    expect(wordChangedLines('a\nb\nc', 'a\nx\ny\nc')).toBe(
      'From line 2: 1 line replaced by 2 lines.',
    );
    expect(wordChangedLines('a\nb', 'a\nb\nc')).toBe('From line 3: 1 line added.');
    expect(wordChangedLines('a\nb\nc', 'a\nc')).toBe('From line 2: 1 line taken out.');
    expect(wordChangedLines('a\na', 'a\na\na')).toBe('From line 3: 1 line added.');
  });
});
