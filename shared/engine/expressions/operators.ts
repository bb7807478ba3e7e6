import type { BinaryOperator } from './expression';
import { roundHalfAway, type Reason } from './functions';
import type { Grammar } from './grammar';
import * as ranges from './interval';
import type { Interval } from './interval';

const asNumber = (is: boolean): number => (is ? 1 : 0);

/** Two numbers joined; AND, OR and XOR ask for nought or not, or work on bits in macro dialects. */
export function join(
  operator: BinaryOperator,
  a: number,
  b: number,
  { isMacro }: Grammar,
): number | Reason {
  switch (operator) {
    case '**':
      return powerOf(a, b);
    case '*':
      return a * b;
    case '/':
      return b === 0 ? 'division' : a / b;
    case 'MOD':
      return b === 0 ? 'division' : ranges.remainderOf(a, b);
    case '+':
      return a + b;
    case '-':
      return a - b;
    case 'AND':
      return isMacro ? bitwise(a, b, (left, right) => left & right) : asNumber(a !== 0 && b !== 0);
    case 'OR':
      return isMacro ? bitwise(a, b, (left, right) => left | right) : asNumber(a !== 0 || b !== 0);
    case 'XOR':
      return isMacro
        ? bitwise(a, b, (left, right) => left ^ right)
        : asNumber((a !== 0) !== (b !== 0));
    case 'EQ':
      return asNumber(a === b);
    case 'NE':
      return asNumber(a !== b);
    case 'GT':
      return asNumber(a > b);
    case 'GE':
      return asNumber(a >= b);
    case 'LT':
      return asNumber(a < b);
    case 'LE':
      return asNumber(a <= b);
  }
}

function powerOf(a: number, b: number): number | Reason {
  if (a === 0 && b < 0) return 'division';
  return a < 0 && !Number.isInteger(b) ? 'power' : a ** b;
}

const MOST_BITS = 2 ** 31;

/** Whole numbers of 32 bits; a fraction is rounded first (common practice, no source). */
function bitwise(a: number, b: number, work: (a: number, b: number) => number): number | Reason {
  const left = roundHalfAway(a);
  const right = roundHalfAway(b);
  const fits = (value: number) => -MOST_BITS <= value && value < MOST_BITS;
  return fits(left) && fits(right) ? work(left, right) : 'domain';
}

/** All that an operator may give over two intervals. */
export function joinOver(
  operator: BinaryOperator,
  a: Interval,
  b: Interval,
  { isMacro }: Grammar,
): Interval {
  switch (operator) {
    case '**':
      return ranges.power(a, b);
    case '*':
      return ranges.multiply(a, b);
    case '/':
      return ranges.divide(a, b);
    case 'MOD':
      return ranges.remainder(a, b);
    case '+':
      return ranges.interval(a.least + b.least, a.greatest + b.greatest);
    case '-':
      return ranges.interval(a.least - b.greatest, a.greatest - b.least);
    case 'AND':
    case 'OR':
    case 'XOR':
      return isMacro ? bitsOver(operator, a, b) : truthOver(operator, truth(a), truth(b));
    case 'EQ':
    case 'NE':
      return not(operator === 'NE', equal(a, b));
    case 'GT':
      return not(false, above(a, b, false));
    case 'GE':
      return not(false, above(a, b, true));
    case 'LT':
      return not(true, above(a, b, true));
    case 'LE':
      return not(true, above(a, b, false));
  }
}

type Truth = boolean | 'unknown';

/** An undecided condition is anything from nought to one. */
function not(isTurned: boolean, is: Truth): Interval {
  if (is === 'unknown') return ranges.EITHER;
  const value = asNumber(is !== isTurned);
  return { least: value, greatest: value };
}

function equal(a: Interval, b: Interval): Truth {
  if (a.greatest < b.least || b.greatest < a.least) return false;
  return a.least === a.greatest && b.least === b.greatest ? true : 'unknown';
}

function above(a: Interval, b: Interval, orEqual: boolean): Truth {
  if (orEqual ? a.least >= b.greatest : a.least > b.greatest) return true;
  return (orEqual ? a.greatest < b.least : a.greatest <= b.least) ? false : 'unknown';
}

/** Whether a value is other than nought. */
function truth(a: Interval): Truth {
  if (!ranges.holds(a, 0)) return true;
  return a.least === 0 && a.greatest === 0 ? false : 'unknown';
}

function truthOver(operator: 'AND' | 'OR' | 'XOR', a: Truth, b: Truth): Interval {
  if (operator === 'XOR')
    return a === 'unknown' || b === 'unknown' ? ranges.EITHER : not(false, a !== b);
  const decides = operator === 'OR';
  if (a === decides || b === decides) return not(false, decides);
  return not(false, a === 'unknown' || b === 'unknown' ? 'unknown' : !decides);
}

/** Two values of nought or more give none below; AND none above the smaller of them. */
function bitsOver(operator: 'AND' | 'OR' | 'XOR', a: Interval, b: Interval): Interval {
  const greatest = Math.round(Math.max(a.greatest, b.greatest));
  if (a.least < 0 || b.least < 0 || !(greatest < MOST_BITS))
    return { least: -MOST_BITS, greatest: MOST_BITS - 1 };
  if (operator === 'AND')
    return { least: 0, greatest: Math.round(Math.min(a.greatest, b.greatest)) };
  return { least: 0, greatest: 2 ** (32 - Math.clz32(greatest)) - 1 };
}
