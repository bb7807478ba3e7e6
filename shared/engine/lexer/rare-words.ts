import { CLASS_OF, CONTINUES_NUMBER, isLetter, LINE_END, POWERS_OF_TEN } from './bytes';
import { MOST_WORDS, type LineWords } from './line-words';

/** What one line in a thousand holds: kept out of the hot path so that it stays small. */

const SPACE = 32;
const TAB = 9;
const POINT = 46;
const LETTER_N = 13;

/** Characters of a long text that a finding shows. */
const SHOWN = 24;
/**
 * No word of any machine is larger: a thousand kilometres in millimetres. Up to here sums and squares of
 * coordinates stay far from where doubles end.
 */
const LARGEST = 1e9;
/** So many characters hold at most 15 digits and a point, which a double holds exactly. */
const EXACT_DIGITS = 15;
/** Words that steer the flow in macro dialects. */
const LONGEST_FLOW_WORD = 6;
const FLOW_WORDS: readonly string[] = ['IF', 'WHILE', 'DO', 'END', 'GOTO', 'THEN', 'WEND'];

const isDigit = (byte: number): boolean => 48 <= byte && byte <= 57;
const isBlank = (byte: number): boolean => byte === SPACE || byte === TAB;

/** Leaves a bracketed comment at its closing bracket, or at the line end when it never closes. */
export function skipComment(line: LineWords, open: number): number {
  const { bytes } = line;
  let at = open + 1;
  let depth = 1;
  let nested = -1;
  for (; CLASS_OF[bytes[at]!] !== LINE_END; at++) {
    line.bits |= bytes[at]!;
    if (bytes[at] === 40) {
      if (nested < 0) nested = at;
      depth++;
    } else if (bytes[at] === 41 && --depth === 0) break;
  }
  line.comment(open + 1, at, false);
  if (nested >= 0)
    line.fault({
      problem: 'nested-comment',
      from: nested,
      to: nested + 1,
      facts: { closed: depth === 0 },
      voids: false,
    });
  else if (depth > 0)
    line.fault({
      problem: 'unreadable-block',
      from: open,
      to: at,
      facts: { reason: 'comment-not-closed', what: '(' },
      voids: false,
    });
  return depth === 0 ? at + 1 : at;
}

/** A number that the hot path would not take: long, with blanks inside, with an exponent, or none at all. */
export function readRestOfValue(line: LineWords, start: number, letter: number): number {
  const { bytes } = line;
  let at = start + 1;
  while (isBlank(bytes[at]!)) at++;
  const sign = bytes[at] === 45 ? '-' : '';
  if (bytes[at] === 43 || bytes[at] === 45) at++;
  while (isBlank(bytes[at]!)) at++;
  const first = at;
  const end = endOfNumber(line, at);
  if (end < 0) return readValueless(line, start, letter, at);
  at = end;
  let text = '';
  let isExact = true;
  if (CONTINUES_NUMBER[bytes[at]!] === 1) {
    const rest = noteContinuation(line, start, at);
    if (rest > at) isExact = false;
    text = bytes[at] === 46 || bytes[at] === 44 ? '' : line.text(at, rest);
    at = rest;
  }
  const value =
    isExact && end - first <= EXACT_DIGITS
      ? exactValue(line, first, end, sign)
      : Number(sign + withoutBlanks(line, first, end) + text);
  noteOddities(line, { letter, start, first, end, value });
  putWord(line, letter, value, start, Math.max(end, text === '' ? end : at));
  return at;
}

/** One past the last digit or point of the number at `at`, blanks inside it allowed; -1 without digits. */
function endOfNumber(line: LineWords, at: number): number {
  const { bytes } = line;
  let end = -1;
  let hasDigit = false;
  let hasPoint = false;
  for (; ; at++) {
    const byte = bytes[at]!;
    if (isDigit(byte)) hasDigit = true;
    else if (byte === POINT && !hasPoint) hasPoint = true;
    else if (isBlank(byte)) continue;
    else return hasDigit ? end : -1;
    end = at + 1;
  }
}

/** At most 15 digits, read as in the hot path but in doubles: mantissa and power of ten are both exact. */
function exactValue(line: LineWords, first: number, end: number, sign: string): number {
  const { bytes } = line;
  let mantissa = 0;
  let decimals = -1;
  for (let at = first; at < end; at++) {
    const byte = bytes[at]!;
    if (byte === POINT) decimals = 0;
    else if (isDigit(byte)) {
      mantissa = mantissa * 10 + (byte - 48);
      if (decimals >= 0) decimals++;
    }
  }
  const value = decimals > 0 ? mantissa / POWERS_OF_TEN[decimals]! : mantissa;
  return sign === '-' ? -value : value;
}

function withoutBlanks(line: LineWords, first: number, end: number): string {
  let text = '';
  for (let at = first; at < end; at++)
    if (!isBlank(line.bytes[at]!)) text += String.fromCharCode(line.bytes[at]!);
  return text;
}

/** What follows a number too closely: an exponent is read with it, a second point or a comma spoils it. */
function noteContinuation(line: LineWords, start: number, at: number): number {
  const { bytes } = line;
  const byte = bytes[at]!;
  if (byte === POINT || byte === 44) {
    let to = at;
    while (bytes[to] === POINT || bytes[to] === 44 || isDigit(bytes[to]!)) to++;
    line.fault({
      problem: 'unreadable-block',
      from: start,
      to,
      facts: { reason: byte === 44 ? 'comma' : 'two-points', what: line.text(start, to) },
      voids: true,
    });
    return to;
  }
  const exponent = exponentAfter(line, at);
  if (exponent === '') return at;
  const to = at + exponent.length;
  line.fault({
    problem: 'unreadable-block',
    from: start,
    to,
    facts: { reason: 'exponent', what: line.text(start, to) },
    voids: false,
  });
  return to;
}

interface OddNumber {
  readonly letter: number;
  readonly start: number;
  readonly first: number;
  readonly end: number;
  readonly value: number;
}

function noteOddities(line: LineWords, { letter, start, first, end, value }: OddNumber): void {
  if (!(Math.abs(value) <= LARGEST) && letter !== LETTER_N)
    line.fault({
      problem: 'unreadable-block',
      from: start,
      to: end,
      facts: { reason: 'too-large', what: line.text(start, Math.min(end, start + SHOWN)) },
      voids: true,
    });
  for (let at = first; at < end; at++)
    if (isBlank(line.bytes[at]!)) {
      line.fault({
        problem: 'odd-characters',
        from: start,
        to: end,
        facts: { what: line.text(start, Math.min(end, start + SHOWN)), byte: SPACE },
        voids: false,
      });
      return;
    }
}

function exponentAfter(line: LineWords, at: number): string {
  const { bytes } = line;
  let to = at + 1;
  if (bytes[to] === 43 || bytes[to] === 45) to++;
  const from = to;
  while (isDigit(bytes[to]!)) to++;
  return to === from || to - from > 3 ? '' : line.text(at, to);
}

function putWord(line: LineWords, letter: number, value: number, start: number, end: number): void {
  const { count } = line;
  if (count < MOST_WORDS) {
    line.letters[count] = letter;
    line.values[count] = value;
    line.starts[count] = start;
    line.ends[count] = end;
  }
  line.count = count + 1;
}

/** A letter with no number behind it: a computed value, a letter for a digit, text, or simply nothing. */
function readValueless(line: LineWords, start: number, letter: number, at: number): number {
  const { bytes } = line;
  const byte = bytes[at]!;
  const textEnd = endOfText(line, start);
  if (
    FLOW_WORDS.includes(
      line.text(start, Math.min(textEnd, start + LONGEST_FLOW_WORD)).toUpperCase(),
    )
  )
    return skipFlow(line, start);
  if (byte === 35 || byte === 91 || (isLetter(byte) && isFunctionCall(line, at)))
    return skipComputed(line, start, at);
  if (isDigitLike(byte) && (isDigit(bytes[at + 1]!) || isDigit(bytes[at - 1]!)))
    return readLetterForDigit(line, start, at);
  const isText = textEnd > start + 1;
  const to = isText ? textEnd : Math.max(at, start + 1);
  line.fault({
    problem: 'unreadable-block',
    from: start,
    to: isText ? to : endWithoutBlanks(line, to),
    facts: {
      reason: isText ? 'text' : 'no-number',
      what: line.text(start, Math.min(to, start + SHOWN)).trimEnd(),
      letter: String.fromCharCode(65 + letter),
    },
    voids: true,
  });
  return to;
}

/** One past the letters that stand together from `start` on. */
function endOfText(line: LineWords, start: number): number {
  let to = start + 1;
  while (isLetter(line.bytes[to]!)) to++;
  return to;
}

function endWithoutBlanks(line: LineWords, to: number): number {
  while (isBlank(line.bytes[to - 1]!)) to--;
  return to;
}

/** O and l, in either case, pass for a nought and a one. */
const isDigitLike = (byte: number): boolean => (byte | 32) === 111 || (byte | 32) === 108;

function readLetterForDigit(line: LineWords, start: number, at: number): number {
  const { bytes } = line;
  let to = at;
  while (isDigit(bytes[to]!) || isDigitLike(bytes[to]!)) to++;
  line.fault({
    problem: 'letter-for-digit',
    from: start,
    to,
    facts: { what: line.text(start, to), letter: line.text(at, at + 1) },
    voids: true,
  });
  return to;
}

function isFunctionCall(line: LineWords, at: number): boolean {
  const from = at;
  while (isLetter(line.bytes[at]!)) at++;
  return at - from >= 2 && line.bytes[at] === 91;
}

/** Passes over a computed value without working it out. */
function skipComputed(line: LineWords, start: number, from: number): number {
  const { bytes } = line;
  let at = from;
  let depth = 0;
  for (; CLASS_OF[bytes[at]!] !== LINE_END; at++) {
    const byte = bytes[at]!;
    if (byte === 91 || byte === 60) depth++;
    else if (byte === 93 || byte === 62) {
      if (--depth <= 0) {
        at++;
        break;
      }
    } else if (depth === 0 && byte !== 35 && at > from && !isDigit(byte)) {
      if (!isLetter(byte) || !isFunctionCall(line, at)) break;
      while (isLetter(bytes[at + 1]!)) at++;
    }
  }
  line.fault({
    problem: 'not-modelled',
    from: start,
    to: at,
    facts: { what: line.text(start, Math.min(at, start + SHOWN)), reason: 'computed' },
    voids: true,
  });
  return at;
}

/** `#1=…` sets a parameter; the whole rest of the line is its business. */
export function skipParameter(line: LineWords, from: number): number {
  let at = from;
  while (CLASS_OF[line.bytes[at]!] !== LINE_END && line.bytes[at] !== 40) at++;
  line.fault({
    problem: 'not-modelled',
    from,
    to: at,
    facts: { what: line.text(from, Math.min(at, from + SHOWN)), reason: 'parameter' },
    voids: true,
  });
  return at;
}

/** Passes over the rest of a block that steers the flow. */
function skipFlow(line: LineWords, start: number): number {
  const { bytes } = line;
  let at = start;
  while (CLASS_OF[bytes[at]!] !== LINE_END && bytes[at] !== 40 && bytes[at] !== 59) at++;
  let to = at;
  while (isBlank(bytes[to - 1]!)) to--;
  line.fault({
    problem: 'not-modelled',
    from: start,
    to,
    facts: { what: line.text(start, Math.min(to, start + SHOWN)), reason: 'flow' },
    voids: true,
  });
  return at;
}

/**
 * An O word names a program or, with words behind it, steers the flow. Behind other words it is a letter O
 * where a nought was meant.
 */
export function skipLabel(line: LineWords, start: number): number {
  const { bytes } = line;
  let at = start + 1;
  if (line.count > 0 && line.letters[line.count - 1] !== LETTER_N)
    return letterInNumber(line, start);
  while (isBlank(bytes[at]!)) at++;
  const from = at;
  if (bytes[at] === 60) while (CLASS_OF[bytes[at]!] !== LINE_END && bytes[at - 1] !== 62) at++;
  else while (isDigit(bytes[at]!)) at++;
  line.isRare = true;
  line.label = line.text(from, at) || line.text(start, start + 1);
  line.labelFrom = start;
  line.labelTo = at;
  while (isBlank(bytes[at]!)) at++;
  const isPlainNumber = isDigit(bytes[from]!) && !isLetter(bytes[at]!);
  return isPlainNumber && bytes[at] !== 91 ? at : skipFlow(line, start);
}

function letterInNumber(line: LineWords, start: number): number {
  const { bytes } = line;
  let to = start + 1;
  while (isDigit(bytes[to]!) || bytes[to] === POINT) to++;
  const word = line.count - 1;
  const isJoined = line.count <= MOST_WORDS && line.ends[word] === start;
  const from = isJoined ? line.starts[word]! : start;
  line.fault({
    problem: isJoined ? 'letter-for-digit' : 'unreadable-block',
    from,
    to,
    facts: isJoined
      ? { what: line.text(from, to), letter: line.text(start, start + 1) }
      : { reason: 'text', what: line.text(from, to) },
    voids: true,
  });
  return to;
}
