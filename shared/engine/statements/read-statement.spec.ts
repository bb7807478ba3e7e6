import { describe, expect, test } from 'vitest';
import type { Grammar } from '../expressions/grammar';
import { showExpression } from '../expressions/testing/show-expression';
import { LineWords } from '../lexer/line-words';
import { readLine } from '../lexer/read-line';
import { readStatement } from './read-statement';
import type { Flow, Label, Setting, Statement } from './statement';

/** Facts sheet 12.1 and 12.2 for the dialects; `strict` is NISTIR 6556 alone. */
const GRAMMARS: Readonly<Record<string, Grammar>> = {
  ngc: { isMacro: false, isStrict: false },
  strict: { isMacro: false, isStrict: true },
  macro: { isMacro: true, isStrict: false },
};

function read(text: string, grammar: string): { line: LineWords; statement: Statement } {
  const line = new LineWords();
  line.bytes = new TextEncoder().encode(`${text}\n`);
  readLine(line.bytes, 0, line);
  expect(line.isStatement).toBe(true);
  return { line, statement: readStatement(line, GRAMMARS[grammar]!) };
}

const letter = (index: number) => String.fromCharCode(65 + index);
const showSetting = ({ parameter, value }: Setting) =>
  `${showExpression(parameter)}=${showExpression(value)}`;
const showLabel = (label: Label) =>
  'name' in label ? `<${label.name}>` : showExpression(label.number);

function showFlow(flow: Flow): string {
  switch (flow.kind) {
    case 'goto':
      return `${flow.condition ? `if ${showExpression(flow.condition)} ` : ''}goto ${showExpression(flow.target)}`;
    case 'then':
      return `if ${showExpression(flow.condition)} then ${flow.settings.map(showSetting).join(' ')}`;
    case 'while':
      return `while${flow.condition ? ` ${showExpression(flow.condition)}` : ''} do ${flow.loop}`;
    case 'end':
      return `end ${flow.loop}`;
    default:
      return [`o${showLabel(flow.label)}`, flow.keyword, ...flow.values.map(showExpression)].join(
        ' ',
      );
  }
}

const show = ({ words, settings, flow }: Statement): string =>
  [
    ...words.map((word) => letter(word.letter) + showExpression(word.value)),
    ...settings.map(showSetting),
    ...(flow ? [showFlow(flow)] : []),
  ].join(' ');

const faultsOf = (line: LineWords) =>
  line.faults.map(({ problem, from, to, facts, voids }) => {
    const reason = facts['reason'] ?? facts['what'];
    return `${from}-${to} ${problem} ${String(reason)}${voids ? '' : ' (carried out)'}`;
  });

test.each([
  // Words with computed values (NISTIR 6556 3.2.2).
  ['ngc', 'G1 X[1+2*3] Y2', 'G1 X(1 + (2 * 3)) Y2'],
  ['ngc', 'G[50+4] G0 X1', 'G(50 + 4) G0 X1'],
  ['ngc', 'G0X#7Y[0-#7]Z SQRT[9]', 'G0 X#7 Y(0 - #7) ZSQRT(9)'],
  ['ngc', 'g1g#143y0d1', 'G1 G#143 Y0 D1'],
  ['ngc', 'X-#7 Y+[1] Z-SQRT[4]', 'X-#7 Y1 Z-SQRT(4)'],
  ['ngc', 'X[-#<gap>-2.1]', 'X(-#<gap> - 2.1)'],
  ['ngc', 'N10 T#1', 'N10 T#1'],
  ['ngc', '/X#1', 'X#1'],
  ['ngc', 'X # 1 Y[ 1 + 2 ]', 'X#1 Y(1 + 2)'],
  ['ngc', 'x sqrt [ 4 ] y a tan[1]/[2]', 'XSQRT(4) YATAN(1, 2)'],
  ['ngc', 'IFIX[2.5]', 'IFIX(2.5)'],
  ['ngc', 'T1 (tool) M6 X#1 ; and so on', 'T1 M6 X#1'],
  // Precedence (3.2.2.3): **, then * / MOD, then + - AND OR XOR, from left to right.
  ['ngc', '#1=[2+3*4**2]', '#1=(2 + (3 * (4 ** 2)))'],
  ['ngc', '#1=[2**3**2]', '#1=((2 ** 3) ** 2)'],
  ['ngc', '#1=[10-4-3]', '#1=((10 - 4) - 3)'],
  ['ngc', '#1=[-7 MOD 3]', '#1=(-7 MOD 3)'],
  ['ngc', '#1=[3 AND 1 + 4]', '#1=((3 AND 1) + 4)'],
  // Comparisons bind less, and logic that joins them less still (facts sheet 12.2.4).
  ['ngc', '#1=[1+1 EQ 2]', '#1=((1 + 1) EQ 2)'],
  ['ngc', '#1=[#1 EQ 1 AND #2 LT 3]', '#1=((#1 EQ 1) AND (#2 LT 3))'],
  // Settings.
  ['ngc', '#3=15 #3=6', '#3=15 #3=6'],
  ['ngc', '##1=5', '##1=5'],
  ['ngc', '#[#1+2]=#2', '#(#1 + 2)=#2'],
  ['ngc', '#<Clear Z>=5 #<_Feed>=250', '#<clearz>=5 #<_feed>=250'],
  ['ngc', '#1=EXISTS[#<a>]', '#1=EXISTS(<a>)'],
  ['macro', '#140=26.00(Width)', '#140=26'],
  ['macro', '#1=#2+1', '#1=(#2 + 1)'],
  ['macro', '#1=ATAN[#2]/#3', '#1=(ATAN(#2) / #3)'],
  ['macro', '#1=ATAN[#2]/[#3]', '#1=ATAN(#2, #3)'],
  ['macro', '#1=#2 OR 1 AND 3', '#1=(#2 OR (1 AND 3))'],
  ['macro', '#1=BIN[#2]', '#1=BIN(#2)'],
  ['macro', '#3000=1 (DOOR OPEN)', '#3000=1'],
  // Flow of macro dialects (facts sheet 12.1.5, 12.1.6).
  ['macro', 'IF[#139EQ1]GOTO20', 'if (#139 EQ 1) goto 20'],
  ['macro', 'N10 IF [#1 GT 3] GOTO #2', 'N10 if (#1 GT 3) goto #2'],
  ['macro', 'GOTO [#1+1]', 'goto (#1 + 1)'],
  ['macro', 'IF [#1 EQ #0] THEN #2=30', 'if (#1 EQ #0) then #2=30'],
  ['macro', 'WHILE[#1LT3]DO1', 'while (#1 LT 3) do 1'],
  ['macro', 'DO 2', 'while do 2'],
  ['macro', 'END1 (loop)', 'end 1'],
  // Labels and o-words (12.2).
  ['ngc', 'o100 sub', 'o100 sub'],
  ['ngc', 'O<Fetch Tool> call [10] [#1+2]', 'o<fetchtool> call 10 (#1 + 2)'],
  ['ngc', 'o101 if [#1 EQ 2]', 'o101 if (#1 EQ 2)'],
  ['ngc', 'o30 repeat [4]', 'o30 repeat 4'],
  ['ngc', 'o50 return', 'o50 return'],
  ['ngc', 'o[#1] call', 'o#1 call'],
  ['macro', 'O1000 (NAME)', 'o1000 program'],
  ['macro', 'O0001', 'o1 program'],
  ['macro', ':1000', 'o1000 program'],
  ['macro', 'ORECTANGLE(..)', 'o<rectangle> program'],
  ['macro', 'O100 G90', 'G90 o100 program'],
  ['macro', 'N5 O1000', 'N5 o1000 program'],
])('reads in %s: %s', (grammar, text, shown) => {
  const { line, statement } = read(text, grammar);
  expect(show(statement)).toBe(shown);
  expect(faultsOf(line)).toEqual([]);
});

test.each([
  // Refusals of NISTIR 6556, by their numbers in the facts sheet, section 11.
  ['strict', '#1 5', ['1-4 odd-characters 1 5 (carried out)', '0-4 unreadable-block no-equals']],
  ['strict', 'G0 X[1+2', ['4-8 unreadable-block bracket-not-closed']],
  ['strict', 'G0 X ATAN[1]', ['5-12 unreadable-block atan']],
  ['strict', 'G0 X[1 EQ 1]', ['7-9 unreadable-block comparison']],
  ['strict', 'Y-#7', ['1-3 unreadable-block sign']],
  // Oddities of posted programs.
  ['ngc', '#1=#2+1', ['0-6 unreadable-block needs-brackets']],
  ['ngc', 'G0 X#_<clear_z>', ['4-15 unreadable-block misspelt-name']],
  ['ngc', 'X#<gap', ['2-6 unreadable-block name-not-closed']],
  ['ngc', 'X#', ['1-2 unreadable-block value-missing']],
  ['ngc', 'X[1+]', ['4-5 unreadable-block value']],
  ['ngc', 'X[1 $ 2]', ['4-5 unreadable-block operator']],
  ['ngc', 'X FOO[1]', ['2-5 unreadable-block function']],
  ['ngc', 'X#1 Y1,5', ['4-8 unreadable-block comma']],
  ['ngc', 'X#1 Y1.2.3', ['4-10 unreadable-block two-points']],
  ['ngc', 'X#1 Y1E2', ['4-8 unreadable-block exponent (carried out)']],
  ['ngc', 'X#1 MO6', ['4-7 letter-for-digit MO6']],
  ['ngc', 'X#1 Y', ['4-5 unreadable-block no-number']],
  ['ngc', 'X#1 /Y2', ['4-5 unreadable-block slash']],
  ['ngc', 'X#140,R#144', ['5-11 not-modelled corner (carried out)']],
  ['ngc', 'X#1 (open', ['4-9 unreadable-block comment-not-closed (carried out)']],
  ['ngc', 'o200 ensub', ['0-10 unreadable-block control-word']],
  ['ngc', 'o200 whlie [#1 LT 2]', ['0-10 unreadable-block control-word']],
  ['ngc', 'o200 if', ['0-7 unreadable-block condition']],
  ['ngc', 'o200 sub G0 X1', ['9-11 unreadable-block flow-company']],
  ['macro', 'G0 X#1 GOTO 5', ['7-11 unreadable-block flow-place']],
  ['macro', 'IF [#1 EQ 1] X5', ['0-13 unreadable-block if-without-then']],
  ['macro', 'WHILE [#1 EQ 1]', ['0-15 unreadable-block while-without-do']],
  ['macro', 'DO', ['0-2 unreadable-block loop-number']],
  ['macro', 'GOTO', ['0-4 unreadable-block goto-target']],
  ['macro', 'IF [#1 EQ 1] THEN G0 X5', ['0-23 not-modelled flow']],
  ['macro', 'ENDIF', ['0-5 not-modelled flow']],
])('says in %s what is wrong with %s', (grammar, text, faults) => {
  expect(faultsOf(read(text, grammar).line)).toEqual(faults);
});

test('names the control word that a misspelt one may mean', () => {
  const { line } = read('o200 ensub', 'ngc');
  expect(line.faults[0]!.facts).toEqual({ reason: 'control-word', what: 'ensub', meant: 'endsub' });
});

describe('hostile lines end in a finding', () => {
  test.each([
    ['brackets', 'X' + '['.repeat(60_000), 'too-deep'],
    ['indirections', 'X' + '#['.repeat(30_000), 'too-deep'],
    ['hashes', '#'.repeat(60_000), 'too-deep'],
    ['signs', 'X[' + '-'.repeat(60_000), 'value'],
    ['a long sum', 'X[1' + '+1'.repeat(30_000) + ']', 'too-many-values'],
    ['settings', '#1=1'.repeat(10_000), 'too-many-values'],
    ['computed words', 'X#1'.repeat(10_000), 'too-many-words'],
    ['digits', '#1=[' + '9'.repeat(400) + ']', 'too-large'],
  ])('%s', (_, text, reason) => {
    const { line } = read(text, 'ngc');
    expect(line.faults.map(({ facts }) => facts['reason'])).toContain(reason);
    expect(line.isVoid).toBe(true);
  });
});

test('keeps comments, marks and byte ranges of the line', () => {
  const { line, statement } = read('/N10 (a) X#1 (b) #2=3 ; c', 'ngc');
  expect(line.skippable).toBe(true);
  expect(line.comments.map(({ from, to }) => line.text(from, to))).toEqual(['a', 'b', ' c']);
  expect(statement.words.map(({ from, to }) => [from, to])).toEqual([
    [1, 4],
    [9, 12],
  ]);
  expect(statement.settings.map(({ from, to }) => [from, to])).toEqual([[17, 21]]);
});
