import { markLine, visible } from './mark-line';

/** Pieces as text: underlined ones in brackets with the first letter of their severity. */
function short(pieces: ReturnType<typeof markLine>): string {
  return pieces
    .map(({ text, severity }) => (severity ? `[${severity[0]}:${text}]` : text))
    .join('');
}

test('underlines exactly the columns of a finding', () => {
  const line = 'G1 X1284.2 F4800.';
  expect(short(markLine(line, [{ columns: [4, 11], severity: 'stop' }]))).toBe(
    'G1 [s:X1284.2] F4800.',
  );
});

test('a line without findings is one piece', () => {
  expect(markLine('G90', [])).toEqual([{ text: 'G90', severity: null }]);
});

test('columns count UTF-16 units: a character of two units before them moves them by two', () => {
  // U+1F6AA is two UTF-16 units; "X1" then begins at column 6.
  const line = '(\u{1F6AA})X1';
  expect(short(markLine(line, [{ columns: [5, 7], severity: 'hold' }]))).toBe('(\u{1F6AA})[h:X1]');
});

test('where underlines lie over each other the graver one is drawn', () => {
  const pieces = markLine('G1 X5 F0', [
    { columns: [1, 9], severity: 'note' },
    { columns: [4, 6], severity: 'stop' },
  ]);
  expect(short(pieces)).toBe('[n:G1 ][s:X5][n: F0]');
});

test('columns past a line that was cut underline nothing and lose nothing', () => {
  const pieces = markLine('G1 X5', [{ columns: [90, 99], severity: 'stop' }]);
  expect(pieces.map((piece) => piece.text).join('')).toBe('G1 X5');
});

test('an empty line stays a line', () => {
  expect(markLine('', [{ columns: [1, 2], severity: 'stop' }])).toEqual([
    { text: '', severity: null },
  ]);
});

test('control characters are seen, one for one; a tab stays', () => {
  expect(visible('G1\u0000\tX1\u001a\u007f')).toBe('G1\u2400\tX1\u241a\u2421');
});
