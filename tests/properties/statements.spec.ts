import { expect, test } from 'vitest';
import { evaluate } from '../../shared/engine/expressions/evaluate';
import type { Grammar } from '../../shared/engine/expressions/grammar';
import { LineWords } from '../../shared/engine/lexer/line-words';
import { readLine } from '../../shared/engine/lexer/read-line';
import { ParameterStore } from '../../shared/engine/parameters/parameter-store';
import { readStatement } from '../../shared/engine/statements/read-statement';
import type { Statement } from '../../shared/engine/statements/statement';
import { COUNTS, SEED } from '../counts';
import { mutate, randomNumbers } from './mutate';

const GRAMMARS: readonly Grammar[] = [
  { isMacro: false, isStrict: false },
  { isMacro: true, isStrict: false },
  { isMacro: false, isStrict: true },
];

/** Words and oddities of plain blocks. */
const PIECES: readonly string[] = [
  'G0',
  'G1',
  'N10',
  'X1',
  'Y-2.5',
  'Z+3.',
  'I.5',
  'X 1 2',
  'F100',
  'M3',
  'MO6',
  'T1',
  'X1E3',
  'J -8.775e-05',
  'Y1.23456789012345678',
  'X1.2.3',
  'X1,5',
  'X1,R2',
  'X',
  'HELLO',
  'M3O',
  '/',
  '$',
  ')',
  '(a comment)',
  '(a (nested) one)',
  '\t',
];

const encode = (text: string) => new TextEncoder().encode(text);

function readPlain(text: string): LineWords {
  const line = new LineWords();
  line.bytes = encode(`${text}\n`);
  readLine(line.bytes, 0, line);
  return line;
}

const wordsOf = (line: LineWords) =>
  Array.from({ length: line.count }, (_, word) => [
    line.letters[word],
    line.values[word],
    line.starts[word],
    line.ends[word],
  ]);

test('plain words beside a setting are the words of the plain line, with its faults', () => {
  const random = randomNumbers(SEED);
  let compared = 0;
  for (let round = 0; round < COUNTS.statements; round++) {
    const pieces = Array.from({ length: 1 + random(6) }, () => PIECES[random(PIECES.length)]!);
    const text = pieces.join(random(2) === 0 ? ' ' : '');
    const plain = readPlain(text);
    const statement = readPlain(`${text}(s)#1=1`);
    // A comment that never closes, or a percent sign, takes the setting with it.
    if (!statement.isStatement) continue;
    readStatement(statement, GRAMMARS[0]!);
    expect(statement.isVoid, text).toBe(plain.isVoid);
    // Behind a fault that voids the block nothing more is read.
    if (plain.isVoid) continue;
    expect(wordsOf(statement), text).toEqual(wordsOf(plain));
    expect(statement.faults, text).toEqual(plain.faults);
    compared++;
  }
  expect(compared).toBeGreaterThan(COUNTS.statements / 4);
});

const STATEMENTS: readonly string[] = [
  '#3=15 #3=6 G1 X#3 F100',
  '#1=[1 + acos[0] - [#3 ** [4.0/2]]]',
  'G[50+4] G0 X[#1*COS[#2+90]] Y[#1*SIN[#2]]',
  'X#140,R#144 Z[-#<gap>-2.1]',
  '#<_depth>=#[#1+2] (depth) ##5=ATAN[1]/[2]',
  'N10 IF[#139EQ1]GOTO20',
  'IF [#1 EQ #0] THEN #2=30',
  'WHILE [#1 LT 3] DO1',
  'o100 if [#5399 LT 0 OR #<a> EQ 1]',
  'O<fetch> call [1] [#2 MOD 3] [EXISTS[#<b>]]',
  '/N5 O1000 (NAME)',
  '#3000=1 (DOOR)',
  'G1G#143Y0D1',
];

function expressionsOf({ words, settings }: Statement) {
  return [...words.map(({ value }) => value), ...settings.map(({ value }) => value)];
}

test('a mutated statement is read and worked out in a bounded time, and never throws', () => {
  for (let round = 0; round < COUNTS.statements; round++) {
    const grammar = GRAMMARS[round % GRAMMARS.length]!;
    const bytes = mutate(encode(STATEMENTS[round % STATEMENTS.length]!), SEED + round);
    const text = new TextDecoder('latin1').decode(bytes);
    const line = new LineWords();
    line.bytes = Uint8Array.from([...bytes, 10]);
    const store = new ParameterStore(grammar, new Map(), new Map());
    const before = performance.now();
    try {
      for (let at = 0; at < line.bytes.length;) {
        at = readLine(line.bytes, at, line);
        if (!line.isStatement) continue;
        const statement = readStatement(line, grammar);
        if (line.isVoid) continue;
        for (const expression of expressionsOf(statement)) evaluate(expression, store, grammar);
      }
    } catch (error) {
      throw new Error(`Round ${round} failed on ${JSON.stringify(text)}`, { cause: error });
    }
    // A line takes microseconds; a second is a reader that hangs, on however slow a machine.
    expect(performance.now() - before, text).toBeLessThan(1_000);
  }
});
