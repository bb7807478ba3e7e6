import type { Expression } from '../expressions/expression';
import type { ExpressionReader } from '../expressions/read-expression';
import { CLASS_OF, isLetter, LINE_END, OPEN_COMMENT, SEMICOLON } from '../lexer/bytes';
import * as rare from '../lexer/rare-words';
import { CONTROL_WORDS, nearestControlWord } from './control-words';
import type { Flow, FlowKeyword, Label, LabelledFlow, Setting } from './statement';

const HASH = 35;
const LESS = 60;
const OPEN = 91;
/** Arguments of one call: they become #1 … #30. */
const MOST_ARGUMENTS = 30;

/** Reads settings too, as the reader of a whole statement does. */
export interface FlowReader extends ExpressionReader {
  setting(): Setting | undefined;
}

/** How many bracketed values each control word takes, least and most. */
const VALUES: Readonly<Record<FlowKeyword, readonly [number, number]>> = {
  sub: [0, 0],
  endsub: [0, 1],
  call: [0, MOST_ARGUMENTS],
  return: [0, 1],
  if: [1, 1],
  elseif: [1, 1],
  else: [0, 0],
  endif: [0, 0],
  while: [1, 1],
  endwhile: [0, 0],
  do: [0, 0],
  repeat: [1, 1],
  endrepeat: [0, 0],
  break: [0, 0],
  continue: [0, 0],
};

/** What a line of a macro dialect says about which block comes next; `word` stands where reading is. */
export function readFlow(reader: FlowReader, word: string): Flow | undefined {
  const start = reader.at;
  reader.at += word.length;
  switch (word) {
    case 'GOTO':
      return readGoto(reader, start, undefined);
    case 'IF':
      return readIf(reader, start);
    case 'WHILE':
      return readWhile(reader, start);
    case 'DO':
      return readLoop(reader, start, 'while', undefined);
    case 'END':
      return readLoop(reader, start, 'end', undefined);
    default:
      return notFollowed(reader, start);
  }
}

function readIf(reader: FlowReader, start: number): Flow | undefined {
  const condition = readCondition(reader, start);
  if (!condition) return undefined;
  const word = controlWord(reader);
  if (word === 'GOTO') {
    reader.at += word.length;
    return readGoto(reader, start, condition);
  }
  if (word !== 'THEN') return reader.fail('if-without-then', start);
  reader.at += word.length;
  const settings: Setting[] = [];
  while (reader.peek() === HASH) {
    const setting = reader.setting();
    if (!setting) return undefined;
    settings.push(setting);
  }
  if (settings.length === 0) return notFollowed(reader, start);
  return { kind: 'then', condition, settings, ...rangeFrom(reader, start) };
}

function readGoto(
  reader: FlowReader,
  start: number,
  condition: Expression | undefined,
): Flow | undefined {
  if (isEnd(reader)) return reader.fail('goto-target', start);
  const target = reader.operand();
  return target && { kind: 'goto', condition, target, ...rangeFrom(reader, start) };
}

/** A WHILE without a condition, like a lone DO, goes round for ever. */
function readWhile(reader: FlowReader, start: number): Flow | undefined {
  const condition = reader.peek() === OPEN ? reader.bracketed() : undefined;
  if (reader.line.isVoid) return undefined;
  if (controlWord(reader) !== 'DO') return reader.fail('while-without-do', start);
  reader.at += 'DO'.length;
  return readLoop(reader, start, 'while', condition);
}

function readLoop(
  reader: FlowReader,
  start: number,
  what: 'while' | 'end',
  condition: Expression | undefined,
): Flow | undefined {
  const { line } = reader;
  reader.peek();
  const from = reader.at;
  while (rare.isDigit(line.bytes[reader.at]!)) reader.at++;
  if (reader.at === from) return reader.fail('loop-number', start);
  const loop = Number(line.text(from, reader.at));
  const range = rangeFrom(reader, start);
  return what === 'end'
    ? { kind: 'end', loop, ...range }
    : { kind: 'while', condition, loop, ...range };
}

function readCondition(reader: FlowReader, start: number): Expression | undefined {
  return reader.peek() === OPEN ? reader.bracketed() : reader.fail('condition', start);
}

/** `O100 …`, `o<name> …`, `O1000`; the letter is at hand. */
export function readLabelledFlow(reader: FlowReader): (LabelledFlow & Range) | undefined {
  const start = reader.at++;
  const label = readLabel(reader, start);
  if (!label) return undefined;
  const word = wordAt(reader);
  const keyword = CONTROL_WORDS.find((each) => each === word);
  if (!keyword) return readProgramLabel(reader, start, label, word);
  reader.at = wordEnd(reader);
  const values: Expression[] = [];
  while (reader.peek() === OPEN) {
    const value = reader.bracketed();
    if (!value) return undefined;
    values.push(value);
  }
  const [least, most] = VALUES[keyword];
  if (values.length < least) return reader.fail('condition', start);
  if (values.length > most) return reader.fail('flow-values', start);
  return { kind: 'labelled', label, keyword, values, ...rangeFrom(reader, start) };
}

/** A program begins with its number, a name or a number in brackets; anything else was meant to steer. */
function readProgramLabel(
  reader: FlowReader,
  start: number,
  label: Label,
  word: string,
): (LabelledFlow & Range) | undefined {
  // One letter is a word's: `O1000 G90`. More of them, or a name, and a control word was meant.
  if (word.length > 1) return failControlWord(reader, start, word);
  return { kind: 'labelled', label, keyword: 'program', values: [], ...rangeFrom(reader, start) };
}

/** A number, a name in `<>`, an expression, or bare text as some write a program's name. */
function readLabel(reader: FlowReader, start: number): Label | undefined {
  const byte = reader.peek();
  const { line } = reader;
  if (byte === LESS) {
    const name = reader.name();
    return name === undefined ? undefined : { name };
  }
  if (byte === HASH || byte === OPEN) {
    const number = reader.operand();
    return number && { number };
  }
  const from = reader.at;
  if (rare.isDigit(byte)) {
    while (rare.isDigit(line.bytes[reader.at]!)) reader.at++;
    return { number: { kind: 'number', value: Number(line.text(from, reader.at)) } };
  }
  if (!isLetter(byte)) return reader.fail('label', start);
  while (isNamePart(line.bytes[reader.at]!)) reader.at++;
  if (isEnd(reader)) return { name: line.text(from, reader.at).trimEnd().toLowerCase() };
  return reader.fail('label', start);
}

/** Letters, digits, underscores and points. */
const isNamePart = (byte: number): boolean =>
  isLetter(byte) || rare.isDigit(byte) || byte === UNDERSCORE || byte === POINT;
const UNDERSCORE = 95;
const POINT = 46;

function failControlWord(reader: FlowReader, start: number, word: string): undefined {
  const { line } = reader;
  line.fault({
    problem: 'unreadable-block',
    from: start,
    to: wordEnd(reader),
    facts: { reason: 'control-word', what: word, meant: nearestControlWord(word) },
    voids: true,
  });
  return undefined;
}

/** Control words of some dialects that have no place in either language here. */
function notFollowed(reader: FlowReader, start: number): undefined {
  const { line } = reader;
  while (!isEnd(reader)) reader.at++;
  let to = reader.at;
  while (rare.isBlank(line.bytes[to - 1]!)) to--;
  line.fault({
    problem: 'not-modelled',
    from: start,
    to,
    facts: { what: line.text(start, Math.min(to, start + rare.SHOWN)), reason: 'flow' },
    voids: true,
  });
  return undefined;
}

/** The macro control word at hand, blanks passed over. */
function controlWord(reader: FlowReader): string {
  reader.peek();
  return rare.flowWordAt(reader.line, reader.at);
}

/** The letters at hand, in lower case; '' for none. */
function wordAt(reader: FlowReader): string {
  const byte = reader.peek();
  if (!isLetter(byte)) return '';
  return reader.line.text(reader.at, wordEnd(reader)).toLowerCase();
}

const wordEnd = (reader: FlowReader): number => rare.endOfText(reader.line, reader.at);

/** Whether nothing but comments stands at hand. */
function isEnd(reader: FlowReader): boolean {
  const what = CLASS_OF[reader.peek()];
  return what === LINE_END || what === OPEN_COMMENT || what === SEMICOLON;
}

interface Range {
  readonly from: number;
  readonly to: number;
}

const rangeFrom = (reader: FlowReader, start: number): Range => ({
  from: reader.since(start),
  to: reader.here,
});
