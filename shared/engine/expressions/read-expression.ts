import { CONTINUES_NUMBER, isLetter } from '../lexer/bytes';
import type { LineWords } from '../lexer/line-words';
import * as rare from '../lexer/rare-words';
import type { BinaryOperator, Expression, FunctionName, ParameterReference } from './expression';
import { COMPARISONS, functionsOf, joinOperands, OPERATORS, type Grammar } from './grammar';

const HASH = 35;
const PLUS = 43;
const MINUS = 45;
const POINT = 46;
const SLASH = 47;
const LESS = 60;
const GREATER = 62;
const OPEN = 91;
const CLOSE = 93;
const UNDERSCORE = 95;
const SMALL_E = 101;
const SMALL_Q = 113;

/** Brackets and signs `#` within one another. Controllers stop at five or so; nobody writes twenty. */
const DEEPEST = 100;
/** Values of one line; as many operators at most, so that working one out never goes deeper. */
const MOST_VALUES = 1_000;
const LONGEST_NAME = 100;

/**
 * Reads expressions out of a line. What cannot be read becomes a fault of the line that voids its block,
 * and gives `undefined`; `at` is then wherever reading stopped.
 */
export class ExpressionReader {
  at = 0;
  private depth = 0;
  private values = 0;
  private readonly functions: readonly FunctionName[];

  constructor(
    readonly line: LineWords,
    readonly grammar: Grammar,
  ) {
    this.functions = functionsOf(grammar);
  }

  /** The byte at hand, blanks passed over. */
  peek(): number {
    const { bytes } = this.line;
    while (rare.isBlank(bytes[this.at]!)) this.at++;
    return bytes[this.at]!;
  }

  /** `#5`, `[…]`, a number, or a function of one; a sign in front where the dialect has it. */
  operand(): Expression | undefined {
    const from = this.at;
    if (++this.values > MOST_VALUES) return this.fail('too-many-values', from);
    const byte = this.peek();
    if (byte !== PLUS && byte !== MINUS) return this.unsigned('');
    this.at++;
    const next = this.peek();
    const isNumber = rare.isDigit(next) || next === POINT;
    if (isNumber) return this.number(byte === MINUS ? '-' : '');
    // NISTIR 6556 has the sign in the number alone, so `-#7` is `[0-#7]` there.
    if (this.grammar.isStrict) return this.fail('sign', from, this.at + 1);
    const of = this.unsigned('');
    return of && byte === MINUS ? { kind: 'minus', of } : of;
  }

  /** Operands and operators, as they stand between brackets. */
  expression(): Expression | undefined {
    const first = this.operand();
    if (!first) return undefined;
    const operands = [first];
    const operators: BinaryOperator[] = [];
    for (let operator = this.operator(); operator; operator = this.operator()) {
      const operand = this.operand();
      if (!operand) return undefined;
      operators.push(operator);
      operands.push(operand);
    }
    if (operators.length === 0) return first;
    return joinOperands(operands, operators, this.grammar);
  }

  /** `[…]`, where the opening bracket is at hand. */
  bracketed(): Expression | undefined {
    const from = this.at;
    if (++this.depth > DEEPEST) return this.fail('too-deep', from);
    this.at++;
    const inside = this.expression();
    this.depth--;
    if (!inside) return undefined;
    if (this.peek() === CLOSE) {
      this.at++;
      return inside;
    }
    const isEnd = this.at >= this.line.end;
    return this.fail(isEnd ? 'bracket-not-closed' : 'operator', isEnd ? from : this.at);
  }

  /** `#5`, `##5`, `#[#1+2]`, `#<name>`, where the `#` is at hand. */
  parameter(): ParameterReference | undefined {
    const from = this.at++;
    const byte = this.peek();
    if (byte === LESS) {
      // NISTIR 6556 knows parameters by number alone.
      if (this.grammar.isStrict) return this.fail('named', from, this.at + 1);
      const name = this.name();
      return name === undefined
        ? undefined
        : { kind: 'parameter', name, from: this.since(from), to: this.here };
    }
    if (byte === UNDERSCORE) return this.failName(from);
    if (++this.depth > DEEPEST) return this.fail('too-deep', from);
    const number = this.unsigned('');
    this.depth--;
    return number && { kind: 'parameter', number, from: this.since(from), to: this.here };
  }

  /** What stands between `<` and `>`, in lower case and without blanks. */
  name(): string | undefined {
    const { line } = this;
    const from = this.at++;
    let name = '';
    for (; line.bytes[this.at] !== GREATER; this.at++) {
      if (this.at >= line.end) return this.fail('name-not-closed', from);
      if (!rare.isBlank(line.bytes[this.at]!)) name += line.text(this.at, this.at + 1);
      if (name.length > LONGEST_NAME) return this.fail('name-too-long', from);
    }
    this.at++;
    return name === '' ? this.fail('name-empty', from, this.at) : name.toLowerCase();
  }

  /** Says what was wrong with the bytes from `from` on, and gives up the expression. */
  fail(reason: string, from: number, to = this.at): undefined {
    const { line } = this;
    const last = Math.min(Math.max(to, from + 1), line.end);
    const what = line.text(from, Math.min(last, from + rare.SHOWN)).trimEnd();
    line.fault({
      problem: 'unreadable-block',
      from,
      to: Math.max(from, last),
      facts: { reason, what },
      voids: true,
    });
    return undefined;
  }

  /** One past what has been read, blanks behind it left out; counted from the line's first byte. */
  get here(): number {
    let { at } = this;
    while (rare.isBlank(this.line.bytes[at - 1]!)) at--;
    return this.since(at);
  }

  since(at: number): number {
    return at - this.line.start;
  }

  private unsigned(sign: string): Expression | undefined {
    const byte = this.peek();
    if (byte === HASH) return this.parameter();
    if (byte === OPEN) return this.bracketed();
    if (isLetter(byte)) return this.functionCall();
    return this.number(sign);
  }

  /** A decimal, read as the plain lexer reads one, with the same faults. */
  private number(sign: string): Expression | undefined {
    const { line } = this;
    const from = this.at;
    const end = rare.endOfNumber(line, from);
    if (end < 0) {
      const isEnd = from >= line.end;
      return this.fail(isEnd ? 'value-missing' : 'value', isEnd ? from - 1 : from, from + 1);
    }
    this.at = end;
    let exponent = '';
    if (CONTINUES_NUMBER[line.bytes[end]!] === 1 && !this.hasOperator(end)) {
      this.at = rare.noteContinuation(line, from, end);
      if (line.isVoid) return undefined;
      exponent = line.text(end, this.at);
    }
    rare.noteBlanks(line, from, from, end);
    const value = rare.decimalValue(line, from, end, sign, exponent);
    return Number.isFinite(value) ? { kind: 'number', value } : this.fail('too-large', from);
  }

  /** Whether the E behind a number is that of EQ and no exponent. */
  private hasOperator(at: number): boolean {
    return (this.line.bytes[at]! | 32) === SMALL_E && (this.line.bytes[at + 1]! | 32) === SMALL_Q;
  }

  private functionCall(): Expression | undefined {
    const { line } = this;
    const from = this.at;
    const word = this.functions.find((name) => this.takesWord(name));
    if (word) return this.functionOf(word, from);
    if (!this.grammar.isStrict && this.takesWord('EXISTS')) return this.exists(from);
    return this.fail('function', from, Math.max(rare.endOfText(line, from), from + 1));
  }

  private functionOf(name: FunctionName, from: number): Expression | undefined {
    const first = this.argument(from);
    if (!first) return undefined;
    const of = [first];
    if (name === 'ATAN') {
      const hasSecond = this.peek() === SLASH;
      // NISTIR 6556 3.2.2.4 gives ATAN two parts; macro dialects take one as well.
      if (!hasSecond && !this.grammar.isMacro) return this.fail('atan', from);
      const before = this.at;
      if (hasSecond) this.at++;
      if (hasSecond && this.peek() === OPEN) {
        const second = this.bracketed();
        if (!second) return undefined;
        of.push(second);
      } else if (!this.grammar.isMacro) return this.fail('atan', from);
      else this.at = before;
    }
    return { kind: 'function', name, of, from: this.since(from), to: this.here };
  }

  private argument(from: number): Expression | undefined {
    if (this.peek() !== OPEN) return this.fail('function', from);
    return this.bracketed();
  }

  /** `EXISTS[#<name>]`: 1 if the name has been given a value. */
  private exists(from: number): Expression | undefined {
    if (this.peek() !== OPEN) return this.fail('function', from);
    this.at++;
    if (this.peek() !== HASH) return this.fail('exists', from);
    this.at++;
    if (this.peek() !== LESS) return this.fail('exists', from);
    const name = this.name();
    if (name === undefined) return undefined;
    if (this.peek() !== CLOSE) return this.fail('bracket-not-closed', from);
    this.at++;
    return { kind: 'exists', name };
  }

  private operator(): BinaryOperator | undefined {
    if (this.peek() === CLOSE) return undefined;
    const from = this.at;
    const operator = OPERATORS.find((each) => this.takesWord(each));
    if (operator && this.grammar.isStrict && COMPARISONS.includes(operator))
      return this.fail('comparison', from);
    return operator;
  }

  /** Passes over `word` if it stands here, blanks inside it and either case allowed. */
  private takesWord(word: string): boolean {
    const { bytes } = this.line;
    let { at } = this;
    if ((bytes[at]! & ~32) !== (word.charCodeAt(0) & ~32)) return false;
    for (let i = 0; i < word.length; i++) {
      while (rare.isBlank(bytes[at]!)) at++;
      const byte = bytes[at++]!;
      if ((isLetter(byte) ? byte & ~32 : byte) !== word.charCodeAt(i)) return false;
    }
    this.at = at;
    return true;
  }

  private failName(from: number): undefined {
    let to = this.at;
    while (to < this.line.end && this.line.bytes[to] !== GREATER) to++;
    return this.fail('misspelt-name', from, to + 1);
  }
}
