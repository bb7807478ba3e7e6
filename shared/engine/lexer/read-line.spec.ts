import { describe, expect, test } from 'vitest';
import { LineWords } from './line-words';
import { readLine } from './read-line';

function lineOf(text: string): LineWords {
  const line = new LineWords();
  line.bytes = new TextEncoder().encode(`${text}\n`);
  expect(readLine(line.bytes, 0, line)).toBe(line.bytes.length);
  expect(line.end).toBe(line.bytes.length - 1);
  return line;
}

const wordsOf = (line: LineWords) =>
  Array.from({ length: line.count }, (_, index) => {
    return `${String.fromCharCode(65 + line.letters[index]!)}${line.values[index]!}`;
  }).join(' ');

const faultsOf = (line: LineWords) =>
  line.faults.map(({ problem, from, to, facts, voids }) => {
    const reason = facts['reason'] ?? facts['what'] ?? '';
    const why = reason === '' ? '' : ` ${String(reason)}`;
    return `${from}-${to} ${problem}${why}${voids ? '' : ' (carried out)'}`;
  });

test.each([
  // Words and blanks.
  ['', ''],
  ['   \t ', ''],
  ['G0 X10 Y-5.5', 'G0 X10 Y-5.5'],
  ['g0x10y-5.5', 'G0 X10 Y-5.5'],
  ['G0\tX 10  Y - 5.5', 'G0 X10 Y-5.5'],
  ['N10 G1 X.5 Y5. Z+3', 'N10 G1 X0.5 Y5 Z3'],
  ['G01X00010.500', 'G1 X10.5'],
  // Comments hold what they like.
  ['G0 (M6 T9) X1', 'G0 X1'],
  ['G0 X1 ; Y2 (not a comment', 'G0 X1'],
  ['(a ; b) X1', 'X1'],
  ['(ø “x” 1/2")', ''],
  // Marks.
  ['/G0 X1', 'G0 X1'],
  ['/2 G0 X1', 'G0 X1'],
  ['N10 /G0 X1', 'N10 G0 X1'],
  [':T1 M6', 'T1 M6'],
  ['% anything at all', ''],
])('reads %j as %j and finds nothing wrong', (text, words) => {
  const line = lineOf(text);
  expect(wordsOf(line)).toBe(words);
  expect(faultsOf(line)).toEqual([]);
});

test.each([
  // Numbers.
  ['G0 X', 'G0', ['3-4 unreadable-block no-number']],
  ['G0 X-', 'G0', ['3-5 unreadable-block no-number']],
  ['X1.2.3', 'X1.2', ['0-6 unreadable-block two-points']],
  ['X1,5', 'X1', ['0-4 unreadable-block comma']],
  ['X1E3', 'X1000', ['0-4 unreadable-block exponent (carried out)']],
  ['J -8.775e-05', 'J-0.00008775', ['0-12 unreadable-block exponent (carried out)']],
  ['N10 21 G40', 'N1021 G40', ['0-6 odd-characters N10 21 (carried out)']],
  ['X2000000000', 'X2000000000', ['0-11 unreadable-block too-large']],
  // Letters for digits.
  ['MO6', '', ['0-3 letter-for-digit MO6']],
  ['T1 MO6', 'T1', ['3-6 letter-for-digit MO6']],
  ['HO1', '', ['0-3 letter-for-digit HO1']],
  ['M3O', 'M3', ['0-3 letter-for-digit M3O']],
  ['Xl0', '', ['0-3 letter-for-digit Xl0']],
  // Text and stray marks.
  ['HELLO', '', ['0-5 unreadable-block text']],
  ['G0 X1 12', 'G0 X112', ['3-8 odd-characters X1 12 (carried out)']],
  ['...', '', ['0-1 unreadable-block stray-text']],
  ['G0 /X1', 'G0 X1', ['3-4 unreadable-block slash']],
  ['X1 $', 'X1', ['3-4 odd-characters $ (carried out)']],
  ['X1) Y2', 'X1 Y2', ['2-3 unreadable-block stray-bracket (carried out)']],
  ['<<<<<<< HEAD', '', ['0-7 odd-characters <<<<<<< (carried out)', '8-12 unreadable-block text']],
  // Comments.
  ['X1 (open', 'X1', ['3-8 unreadable-block comment-not-closed (carried out)']],
  ['X1 (a (b) c) Y2', 'X1 Y2', ['6-7 nested-comment (carried out)']],
  ['X1 (a (b c) Y2', 'X1', ['6-7 nested-comment (carried out)']],
])('reads %j as %j and says why not all of it', (text, words, faults) => {
  const line = lineOf(text);
  expect(wordsOf(line)).toBe(words);
  expect(faultsOf(line)).toEqual(faults);
});

test.each([
  'G1 X[1+2*3] Y2',
  'G1 X#5',
  'G1 X SQRT[4] Y2',
  'X-#5',
  '#1=5',
  'IF [#1 GT 3] GOTO 20',
  'WHILE[#1LT3]DO1',
  'GOTO 10',
  'o100 sub',
  'O<name> call [1]',
  'O1000 (NAME)',
  'N5 O1000',
  ':1001 (NAME)',
])('leaves %j to be read as a statement', (text) => {
  expect(lineOf(text).isStatement).toBe(true);
});

test.each(['G1 X5', '(#1=5)', 'X1 ; GOTO 5', ':T1 M6', ':10 G0 X1', 'MO6', 'G41 DO1', 'X5,R2'])(
  'takes %j for no statement',
  (text) => {
    expect(lineOf(text).isStatement).toBe(false);
  },
);

test('names a rounded corner and keeps the words around it', () => {
  const line = lineOf('X10,R2.5 Y3');
  expect(wordsOf(line)).toBe('X10 Y3');
  expect(faultsOf(line)).toEqual(['3-8 not-modelled corner (carried out)']);
});

test('a word ends where its number does, blanks behind it left out', () => {
  const line = lineOf('G0  X 1.5   Y2');
  const spans = Array.from({ length: line.count }, (_, word) => [
    line.starts[word],
    line.ends[word],
  ]);
  expect(spans).toEqual([
    [0, 2],
    [4, 9],
    [12, 14],
  ]);
});

test('keeps so many words of a line and says that there were more', () => {
  const line = lineOf('X1'.repeat(1_000));
  expect(line.count).toBe(200);
  expect(faultsOf(line)).toEqual(['0-400 unreadable-block too-many-words']);
});

describe('comments', () => {
  test('come decoded, whatever stands in them', () => {
    const line = lineOf('(6 mm ø) G0 (MSG, ÜBER 😀) ; Ende ä');
    expect(line.comments.map(({ from, to }) => line.decode(from, to))).toEqual([
      '6 mm ø',
      'MSG, ÜBER 😀',
      ' Ende ä',
    ]);
    expect(line.hasWide).toBe(true);
  });

  test('an invalid byte shows as the replacement character', () => {
    const line = new LineWords();
    line.bytes = Uint8Array.from([40, 0xfc, 98, 0xe2, 0x82, 41, 10]);
    readLine(line.bytes, 0, line);
    const [comment] = line.comments;
    expect(line.decode(comment!.from, comment!.to)).toBe('\ufffdb\ufffd\ufffd');
  });
});
