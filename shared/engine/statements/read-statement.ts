import * as kind from '../lexer/bytes';
import type { Grammar } from '../expressions/grammar';
import type { Expression } from '../expressions/expression';
import { ExpressionReader } from '../expressions/read-expression';
import { MOST_WORDS, type LineWords } from '../lexer/line-words';
import * as marks from '../lexer/marks';
import * as rare from '../lexer/rare-words';
import { readFlow, readLabelledFlow } from './read-flow';
import type { ComputedWord, Flow, Setting, Statement } from './statement';

const { CLASS_OF } = kind;
const LETTER_N = 13;
const MINUS = 45;
const PLUS = 43;
const POINT = 46;
const EQUALS = 61;
/** `*`, `+`, `-` and `/` behind a value. */
const OPERATOR_BYTES: readonly number[] = [42, PLUS, MINUS, 47];
/** Settings of one line that are read; NISTIR 6556's own reader takes 50. */
const MOST_SETTINGS = 100;

/**
 * Reads a line that the lexer marked as a statement. Plain words, comments and marks are read by the lexer's
 * own functions, so that they are the same words with the same faults as on any other line; all of them stand
 * in `line` afterwards, computed words with NaN for a value. After a fault that voids the block, nothing
 * more is read but the comments.
 */
export function readStatement(line: LineWords, grammar: Grammar): Statement {
  const reader = new StatementReader(line, grammar);
  reader.read();
  return { words: reader.words, settings: reader.settings, flow: reader.flow };
}

class StatementReader extends ExpressionReader {
  readonly words: ComputedWord[] = [];
  readonly settings: Setting[] = [];
  flow: Flow | undefined;

  constructor(line: LineWords, grammar: Grammar) {
    super(line, grammar);
    line.clearRare();
    line.isRare = line.isStatement = true;
    line.count = 0;
    this.at = line.start;
  }

  read(): void {
    const { line } = this;
    while (this.at < line.end) {
      if (!line.isVoid) this.readItem();
      else this.passOver();
    }
    if (line.count > MOST_WORDS) line.count = MOST_WORDS;
    if (this.flow && !line.isVoid) this.checkCompany(this.flow);
  }

  private readItem(): void {
    const { line, at } = this;
    // Settings and flow count as words, so that no slash, colon or percent sign may follow them.
    const count = this.flow || this.settings.length > 0 ? MOST_WORDS : line.count;
    switch (CLASS_OF[line.bytes[at]!]) {
      case kind.LETTER:
        return this.readLetter();
      case kind.LETTER_O:
        return this.readLetterO();
      case kind.BLANK:
        this.at++;
        return;
      case kind.OPEN_COMMENT:
        this.at = marks.skipComment(line, at);
        return;
      case kind.SEMICOLON:
        this.at = marks.skipLineComment(line, at + 1);
        return;
      case kind.SLASH:
        this.at = marks.readSlash(line, at, count);
        return;
      case kind.PERCENT:
        this.at = marks.readPercent(line, at, count);
        return;
      case kind.COLON:
        return this.readColon(count);
      case kind.PARAMETER: {
        const setting = this.setting();
        if (setting) this.settings.push(setting);
        return;
      }
      default:
        if (marks.isCorner(line, at)) return this.readCorner();
        this.at = marks.readOdd(line, at);
    }
  }

  /** Behind a fault only comments are still worth reading. */
  private passOver(): void {
    const { line, at } = this;
    const byte = CLASS_OF[line.bytes[at]!];
    if (byte === kind.OPEN_COMMENT) this.at = marks.skipComment(line, at);
    else if (byte === kind.SEMICOLON) this.at = marks.skipLineComment(line, at + 1);
    else {
      line.bits |= line.bytes[at]!;
      this.at++;
    }
  }

  /** Whether nothing but a line number has been read. */
  private get isFirst(): boolean {
    const { line, settings, flow } = this;
    if (flow || settings.length > 0) return false;
    return line.count === 0 || (line.count === 1 && line.letters[0] === LETTER_N);
  }

  private readLetter(): void {
    const { line, at: start } = this;
    const letter = (line.bytes[start]! & 31) - 1;
    this.at++;
    let byte = this.peek();
    const signAt = this.at;
    if (byte === MINUS || byte === PLUS) {
      this.at++;
      byte = this.peek();
    }
    if (rare.isDigit(byte) || byte === POINT) {
      this.at = rare.readRestOfValue(line, start, letter);
      return this.takePlainWords();
    }
    if (signAt === this.at && this.steers(start)) return;
    if (!rare.beginsValue(line, this.at)) {
      this.at = rare.readNoValue(line, start, letter, this.at);
      return;
    }
    this.at = signAt;
    const value = this.operand();
    if (value) this.addWord(letter, value, start);
  }

  /** Whether a control word stands here, and is read. */
  private steers(start: number): boolean {
    const word = rare.flowWordAt(this.line, start);
    if (word === '') return false;
    // `IFIX[2.5]` is an I word with a function, `IF[` is none.
    this.at = start;
    if (!this.isFirst) this.fail('flow-place', start, start + word.length);
    else this.flow = readFlow(this, word);
    return true;
  }

  private readLetterO(): void {
    const { at } = this;
    if (!this.isFirst) this.at = marks.readOForNought(this.line, at);
    else this.flow = readLabelledFlow(this);
  }

  /** `:1000` alone on its line is another spelling of O1000; else the colon is only a mark. */
  private readColon(count: number): void {
    const { line, at } = this;
    this.at = count > 0 ? marks.readOdd(line, at) : marks.colonEnd(line, at);
    if (count === 0 && this.at > at + 1 && marks.isAlone(line, this.at)) {
      const number = Number(line.text(at + 1, this.at));
      this.flow = {
        kind: 'labelled',
        label: { number: { kind: 'number', value: number } },
        keyword: 'program',
        values: [],
        from: this.since(at),
        to: this.here,
      };
    }
  }

  private readCorner(): void {
    const from = this.at++;
    this.peek();
    this.at++;
    if (this.operand()) marks.noteCorner(this.line, from, this.line.start + this.here);
  }

  /** `#1=2`, where the `#` is at hand. */
  setting(): Setting | undefined {
    const from = this.at;
    if (this.settings.length >= MOST_SETTINGS) return this.fail('too-many-values', from);
    const parameter = this.parameter();
    if (!parameter) return undefined;
    if (this.peek() !== EQUALS) return this.fail('no-equals', from);
    this.at++;
    this.peek();
    // NISTIR 6556 3.2.3 wants one value there; macro dialects take operators without brackets.
    const value = this.grammar.isMacro ? this.expression() : this.operand();
    if (!value) return undefined;
    if (!this.grammar.isMacro && OPERATOR_BYTES.includes(this.peek()))
      return this.fail('needs-brackets', from, this.at + 1);
    return { parameter, value, from: this.since(from), to: this.here };
  }

  private takePlainWords(): void {
    const { line, words } = this;
    for (let word = words.length; word < Math.min(line.count, MOST_WORDS); word++)
      words.push({
        letter: line.letters[word]!,
        value: { kind: 'number', value: line.values[word]! },
        from: this.since(line.starts[word]!),
        to: this.since(line.ends[word]!),
      });
    if (line.count > MOST_WORDS) this.noteTooMany();
  }

  private addWord(letter: number, value: Expression, start: number): void {
    const { line } = this;
    rare.putWord(line, letter, NaN, start, line.start + this.here);
    if (line.count > MOST_WORDS) this.noteTooMany();
    else this.words.push({ letter, value, from: this.since(start), to: this.here });
  }

  private noteTooMany(): void {
    const { line } = this;
    line.fault({
      problem: 'unreadable-block',
      from: line.starts[0]!,
      to: line.ends[MOST_WORDS - 1]!,
      facts: { reason: 'too-many-words', words: line.count, most: MOST_WORDS },
      voids: true,
    });
  }

  /** What steers stands alone on its line; only a program's own label may have words behind it. */
  private checkCompany(flow: Flow): void {
    const { line } = this;
    const isProgram = flow.kind === 'labelled' && flow.keyword === 'program';
    const other = this.words.find((word) => word.letter !== LETTER_N);
    const stray = other ?? this.settings[0];
    if (stray && !isProgram)
      this.fail('flow-company', line.start + stray.from, line.start + stray.to);
  }
}
