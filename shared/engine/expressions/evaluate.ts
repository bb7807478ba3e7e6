import type { BinaryOperator, Expression, ParameterReference } from './expression';
import { functionOf, functionOver, type Reason } from './functions';
import type { Grammar } from './grammar';
import { direction, directionOf, EITHER, EVERYTHING, type Interval } from './interval';
import { join, joinOver } from './operators';
import { isBounds, type Bounds, type Value } from './value';

/** What an expression reads. A reason stands for a parameter that does not exist. */
export interface ParameterReader {
  read(number: number): Value | Failure;
  readNamed(name: string): Value | Failure;
  exists(name: string): boolean;
}

/** A value that could not be worked out. */
export interface Failure {
  readonly reason: Reason;
  /** The figure or the name that is at fault, as a person would write it. */
  readonly what: string;
}

export type Worth = Value | Failure;

export const isFailure = (worth: Worth): worth is Failure =>
  typeof worth === 'object' && worth !== null && 'reason' in worth;

/** NISTIR 6556 3.2.2.1: a value that must be whole may lie within this of a whole number. */
const WHOLE_ROUNDING = 0.0001;

/**
 * What an expression is worth now. With numbers alone it is a number; with a value that is only known within
 * bounds it is bounds that hold every result such values can give. It never goes deeper than its reader let
 * brackets and operators stand within one another.
 */
export function evaluate(
  expression: Expression,
  parameters: ParameterReader,
  grammar: Grammar,
): Worth {
  switch (expression.kind) {
    case 'number':
      return expression.value;
    case 'parameter':
      return readParameter(expression, parameters, grammar);
    case 'minus':
      return negate(evaluate(expression.of, parameters, grammar));
    case 'exists':
      return parameters.exists(expression.name) ? 1 : 0;
    case 'binary': {
      const left = evaluate(expression.left, parameters, grammar);
      if (isFailure(left)) return left;
      const right = evaluate(expression.right, parameters, grammar);
      return isFailure(right) ? right : joinValues(expression.operator, left, right, grammar);
    }
    case 'function':
      return applyFunction(expression, parameters, grammar);
  }
}

function readParameter(
  reference: ParameterReference,
  parameters: ParameterReader,
  grammar: Grammar,
): Worth {
  if (reference.name !== undefined) return parameters.readNamed(reference.name);
  const number = parameterNumber(reference, parameters, grammar);
  if (typeof number === 'number') return parameters.read(number);
  return isFailure(number) ? number : { ...EVERYTHING, of: number.of };
}

/** Which parameter is meant: a whole number, or bounds where that is not known. */
export function parameterNumber(
  reference: ParameterReference,
  parameters: ParameterReader,
  grammar: Grammar,
): number | Bounds | Failure {
  const value = evaluate(reference.number!, parameters, grammar);
  if (isFailure(value) || isBounds(value)) return value;
  const number = value ?? 0;
  const whole = Math.round(number);
  if (Math.abs(number - whole) <= WHOLE_ROUNDING) return whole + 0;
  return { reason: 'not-whole', what: `#${number}` };
}

/** A sign before a variable that was never set leaves it so. */
function negate(value: Worth): Worth {
  if (typeof value === 'number') return -value;
  if (value === null || isFailure(value)) return value;
  return { least: -value.greatest, greatest: -value.least, of: value.of };
}

function joinValues(operator: BinaryOperator, left: Value, right: Value, grammar: Grammar): Worth {
  if (typeof left === 'number' && typeof right === 'number')
    return checked(join(operator, left, right, grammar), operator);
  if ((operator === 'EQ' || operator === 'NE') && (left === null || right === null))
    return compareWithNull(operator, left, right);
  const a = isBounds(left) ? left : point(left ?? 0);
  const b = isBounds(right) ? right : point(right ?? 0);
  const of = isBounds(left) ? left.of : isBounds(right) ? right.of : '';
  if (of === '') return checked(join(operator, a.least, b.least, grammar), operator);
  const isDivision = operator === '/' || operator === 'MOD';
  if (isDivision && b.least === 0 && b.greatest === 0)
    return { reason: 'division', what: operator };
  return settled(joinOver(operator, a, b, grammar), of);
}

/** Null is equal to null and to nothing else; what is unknown may turn out never to have been set. */
function compareWithNull(operator: 'EQ' | 'NE', left: Value, right: Value): Value {
  const bounds = isBounds(left) ? left : isBounds(right) ? right : undefined;
  if (bounds) return { ...EITHER, of: bounds.of };
  return (left === right) === (operator === 'EQ') ? 1 : 0;
}

function applyFunction(
  { name, of }: Extract<Expression, { kind: 'function' }>,
  parameters: ParameterReader,
  grammar: Grammar,
): Worth {
  const value = evaluate(of[0]!, parameters, grammar);
  if (isFailure(value)) return value;
  if (of.length > 1) {
    const second = evaluate(of[1]!, parameters, grammar);
    return isFailure(second) ? second : directionOfValues(value ?? 0, second ?? 0);
  }
  if (!isBounds(value)) return checked(functionOf(name, value ?? 0, grammar), name);
  const over = functionOver(name, value, grammar);
  return typeof over === 'string' ? { reason: over, what: name } : settled(over, value.of);
}

function directionOfValues(y: number | Bounds, x: number | Bounds): Worth {
  if (!isBounds(y) && !isBounds(x)) return directionOf(y, x);
  const of = isBounds(y) ? y.of : isBounds(x) ? x.of : '';
  return settled(direction(isBounds(y) ? y : point(y), isBounds(x) ? x : point(x)), of);
}

const point = (value: number): Interval => ({ least: value, greatest: value });

/** A result that is no finite number is none (facts sheet 13.7). */
function checked(result: number | Reason, what: string): Worth {
  if (typeof result === 'string') return { reason: result, what };
  return Number.isFinite(result) ? result : { reason: 'too-large', what };
}

/** Bounds that leave one value are that value. */
const settled = ({ least, greatest }: Interval, of: string): Value =>
  least === greatest ? least : { least, greatest, of };
