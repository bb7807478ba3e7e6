import { describe, expect, test } from 'vitest';
import { LineWords } from '../lexer/line-words';
import type { Expression } from './expression';
import { evaluate, isFailure, type ParameterReader, type Worth } from './evaluate';
import type { Grammar } from './grammar';
import { ExpressionReader } from './read-expression';
import type { Value } from './value';

const PUBLISHED: Grammar = { isMacro: false, isStrict: false };
const MACRO: Grammar = { isMacro: true, isStrict: false };

/** #1 … by number; what is not given is null. */
const reading = (values: Readonly<Record<number, Value>>): ParameterReader => ({
  read: (number) => values[number] ?? null,
  readNamed: () => null,
  exists: (name) => name === 'there',
});

function parse(text: string, grammar: Grammar): Expression {
  const line = new LineWords();
  line.bytes = new TextEncoder().encode(`${text}\n`);
  line.end = text.length;
  const expression = new ExpressionReader(line, grammar).expression();
  expect(line.faults).toEqual([]);
  return expression!;
}

const work = (
  text: string,
  values: Readonly<Record<number, Value>> = {},
  grammar = PUBLISHED,
): Worth => evaluate(parse(text, grammar), reading(values), grammar);

test.each([
  // NISTIR 6556 3.2.2.3: three levels, from left to right (rows EXP-02, -03, -04 of the facts sheet).
  ['[1 + acos[0] - [#3 ** [4.0/2]]]', 82],
  ['2.0 / 3 * 1.5 - 5.5 / 11.0', 0.5],
  ['2+3*4**2', 50],
  ['2**3**2', 64],
  ['10-4-3', 3],
  ['-7 MOD 3', 2],
  ['7 MOD 3 + 1', 2],
  ['2 AND 3', 1],
  ['0 XOR -2', 1],
  ['1 XOR 1', 0],
  ['1+1 AND 0', 0],
  ['3 AND 1 + 4', 5],
  // 3.2.2.4: FIX down, FUP up, ROUND half away from nought (EXP-05).
  ['FIX[2.8]', 2],
  ['FIX[-2.8]', -3],
  ['FUP[2.8]', 3],
  ['FUP[-2.8]', -2],
  ['ROUND[2.5]', 3],
  ['ROUND[-2.5]', -3],
  ['ROUND[2.4999]', 2],
  // Angles in degrees, ATAN with its quadrant (EXP-06).
  ['SIN[30]', 0.5],
  ['COS[60]', 0.5],
  ['TAN[45]', 1],
  ['ATAN[1]/[-1]', 135],
  ['ATAN[-1]/[0]', -90],
  ['ASIN[1]', 90],
  ['ABS[-4]', 4],
  ['SQRT[2]', Math.SQRT2],
  ['LN[EXP[2]]', 2],
  // 3.2.2.2: # binds tighter than any operator, and may be given by another (EXP-08).
  ['#3+2', 5],
  ['##3', 3],
  ['#[#3+0.00005]', 3],
  // Facts sheet 12.2.4: comparisons give 0 or 1 and bind less than arithmetic.
  ['1+1 EQ 2', 1],
  ['#3 GT 3', 0],
  ['#3 GE 3', 1],
  ['EXISTS[#<there>]', 1],
  ['EXISTS[#<nowhere>]', 0],
])('%s is %d', (text, value) => {
  expect(work(text, { 3: 3 })).toBeCloseTo(value, 12);
});

test.each([
  // Facts sheet 12.1.3: FIX and FUP toward and away from nought, logic on bits.
  ['FIX[-2.8]', -2],
  ['FUP[-2.8]', -3],
  ['6 AND 3', 2],
  ['6 OR 3', 7],
  ['6 XOR 3', 5],
  ['BCD[12]', 0x12],
  ['BIN[18]', 12],
  ['ATAN[1]', 45],
  // 12.1.2: null counts as nought, but is equal only to null.
  ['#1+5', 5],
  ['#1 EQ #0', 1],
  ['#1 EQ 0', 0],
  ['#1 NE 0', 1],
  ['#1 LT 1', 1],
])('%s is %d in a macro dialect', (text, value) => {
  expect(work(text, {}, MACRO)).toBeCloseTo(value, 12);
});

test('what was never set stays so until it is worked with', () => {
  expect(work('#1', {}, MACRO)).toBe(null);
  expect(work('-#1', {}, MACRO)).toBe(null);
  expect(work('[#1]', {}, MACRO)).toBe(null);
  expect(work('#1*2', {}, MACRO)).toBe(0);
});

test.each([
  // Facts sheet 10.6 and 13.7.
  ['1/0', 'division'],
  ['1 MOD 0', 'division'],
  ['0 ** -1', 'division'],
  ['[0-8]**0.5', 'power'],
  ['SQRT[-1]', 'domain'],
  ['LN[0]', 'domain'],
  ['ACOS[2]', 'domain'],
  ['ASIN[-1.5]', 'domain'],
  ['EXP[1000]', 'too-large'],
  ['10**400', 'too-large'],
  ['#1.5', 'not-whole'],
  ['#5/[#5-#5]', 'division'],
  ['1+SQRT[0-1]*2', 'domain'],
])('%s fails: %s', (text, reason) => {
  expect(work(text, { 5: 1 })).toMatchObject({ reason });
});

test('decimals are those of parseFloat, to the last bit', () => {
  const decimals = ['0.1', '.3', '5.', '0.30000000000000004', '123456789.123456789', '00012.50'];
  for (const text of decimals) expect(work(text)).toBe(Number.parseFloat(text));
});

describe('of a value within bounds', () => {
  const bounds = (least: number, greatest: number) => ({ least, greatest, of: '#5' });
  const over = (text: string, grammar = PUBLISHED) =>
    work(text, { 1: bounds(-2, 3), 2: 10 }, grammar);

  test.each([
    ['#1+#2', 8, 13],
    ['#2-#1', 7, 12],
    ['#1*2', -4, 6],
    ['#1*#1', -6, 9],
    ['#2/#1', -Infinity, Infinity],
    ['-#1', -3, 2],
    ['ABS[#1]', 0, 3],
    ['#1**2', 0, 9],
    ['FIX[#1/2]', -1, 1],
    ['#1 MOD 3', 0, 3],
    ['#1 GT 1', 0, 1],
    ['#1 AND 1', 0, 1],
    ['SQRT[#1]', 0, Math.sqrt(3)],
    ['LN[#1]', -Infinity, Math.log(3)],
    ['SIN[#1*100]', -1, 1],
    ['ATAN[#1]/[-1]', -180, 180],
    ['TAN[#1*100]', -Infinity, Infinity],
  ])('%s lies in %d … %d', (text, least, greatest) => {
    const worth = over(text) as { least: number; greatest: number };
    expect(worth).toMatchObject({ of: '#5' });
    expect(worth.least).toBeCloseTo(least, 9);
    expect(worth.greatest).toBeCloseTo(greatest, 9);
  });

  test.each([
    // Decided whatever the value is.
    ['#1 GT 4', 0],
    ['#1 LE 3', 1],
    ['#1 EQ 7', 0],
    ['#1 NE 7', 1],
    ['#1 AND 0', 0],
    ['#1 OR 5', 1],
    ['#1*0', 0],
  ])('%s is %d', (text, value) => {
    expect(over(text)).toBe(value);
  });

  test.each([
    ['SQRT[#1-4]', 'domain'],
    ['#1/0', 'division'],
    ['ACOS[#1+4]', 'domain'],
  ])('%s fails whatever it is: %s', (text, reason) => {
    const worth = over(text);
    expect(isFailure(worth) && worth.reason).toBe(reason);
  });

  test('may turn out never to have been set', () => {
    expect(over('#1 EQ #0', MACRO)).toMatchObject({ least: 0, greatest: 1 });
  });
});
