import { CLASS_OF, LETTER, LINE_END } from './bytes';
import { MOST_WORDS, type LineWords } from './line-words';

/** What one line in a thousand holds: kept out of the hot path so that it stays small. */

const SPACE = 32;
const TAB = 9;
const POINT = 46;
const LETTER_N = 13;

/** Characters of a long text that a finding shows. */
const SHOWN = 24;
/** Words that steer the flow in macro dialects. */
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
  line.comments.push({ from: open + 1, to: at, isLine: false });
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

/** A number the hot path would not take: many digits, blanks inside, an exponent, or none at all. */
export function readRestOfValue(line: LineWords, start: number, letter: number): number {
  const { bytes } = line;
  let at = start + 1;
  let text = '';
  let points = 0;
  let digits = 0;
  let inner = false;
  let end = start + 1;
  while (isBlank(bytes[at]!)) at++;
  if (bytes[at] === 43 || bytes[at] === 45) {
    if (bytes[at] === 45) text = '-';
    end = ++at;
  }
  for (;;) {
    const before = at;
    while (isBlank(bytes[at]!)) at++;
    const byte = bytes[at]!;
    if (isDigit(byte)) digits++;
    else if (byte === POINT && points === 0) points++;
    else break;
    if (before !== at && text.length > 0 && text !== '-') inner = true;
    text += String.fromCharCode(byte);
    end = ++at;
  }
  if (digits === 0) return readValueless(line, start, letter, at);
  const byte = bytes[at]!;
  if ((byte === 69 || byte === 101) && at === end) {
    const exponent = exponentAfter(line, at);
    if (exponent !== '') {
      at += exponent.length;
      end = at;
      text += exponent;
      line.fault({
        problem: 'unreadable-block',
        from: start,
        to: end,
        facts: { reason: 'exponent', what: line.text(start, end) },
        voids: false,
      });
    }
  } else if (byte === POINT || byte === 44) {
    while (bytes[at] === POINT || bytes[at] === 44 || isDigit(bytes[at]!)) at++;
    line.fault({
      problem: 'unreadable-block',
      from: start,
      to: at,
      facts: { reason: byte === 44 ? 'comma' : 'two-points', what: line.text(start, at) },
      voids: true,
    });
  }
  if (inner)
    line.fault({
      problem: 'odd-characters',
      from: start,
      to: end,
      facts: { what: line.text(start, end), byte: SPACE },
      voids: false,
    });
  const value = Number(text);
  if (!Number.isFinite(value))
    line.fault({
      problem: 'unreadable-block',
      from: start,
      to: end,
      facts: { reason: 'too-large', what: line.text(start, Math.min(end, start + SHOWN)) },
      voids: true,
    });
  putWord(line, letter, value, start, end, points);
  return at;
}

function exponentAfter(line: LineWords, at: number): string {
  const { bytes } = line;
  let to = at + 1;
  if (bytes[to] === 43 || bytes[to] === 45) to++;
  const from = to;
  while (isDigit(bytes[to]!)) to++;
  return to === from || to - from > 3 ? '' : line.text(at, to);
}

export function putWord(
  line: LineWords,
  letter: number,
  value: number,
  start: number,
  end: number,
  points: number,
): void {
  const { count } = line;
  if (count < MOST_WORDS) {
    line.letters[count] = letter;
    line.values[count] = value;
    line.starts[count] = start;
    line.ends[count] = end;
    line.points[count] = points;
  }
  line.count = count + 1;
}

/** A letter with no number behind it: a computed value, a letter for a digit, or simply nothing. */
function readValueless(line: LineWords, start: number, letter: number, at: number): number {
  const { bytes } = line;
  const byte = bytes[at]!;
  if (byte === 35 || byte === 91 || (CLASS_OF[byte] === LETTER && isFunctionCall(line, at)))
    return skipComputed(line, start, at);
  const next = byte | 32;
  if ((next === 111 || next === 108) && (isDigit(bytes[at + 1]!) || isDigit(bytes[at - 1]!))) {
    let to = at;
    while (isDigit(bytes[to]!) || (bytes[to]! | 32) === 111 || (bytes[to]! | 32) === 108) to++;
    line.fault({
      problem: 'letter-for-digit',
      from: start,
      to,
      facts: { what: line.text(start, to), letter: String.fromCharCode(byte) },
      voids: true,
    });
    return to;
  }
  let to = at;
  if (to === start + 1) while (CLASS_OF[bytes[to]!] === LETTER) to++;
  if (FLOW_WORDS.includes(line.text(start, Math.min(to, start + 5)).toUpperCase()))
    return skipFlow(line, start);
  line.fault({
    problem: 'unreadable-block',
    from: start,
    to: Math.max(to, start + 1),
    facts: {
      reason: to > start + 1 && to !== at ? 'text' : 'no-number',
      what: line.text(start, Math.max(to, start + 1)),
      letter: String.fromCharCode(65 + letter),
    },
    voids: true,
  });
  return Math.max(to, start + 1);
}

function isFunctionCall(line: LineWords, at: number): boolean {
  const from = at;
  while (CLASS_OF[line.bytes[at]!] === LETTER) at++;
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
      if (CLASS_OF[byte] !== LETTER || !isFunctionCall(line, at)) break;
      while (CLASS_OF[bytes[at + 1]!] === LETTER) at++;
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
  line.label = line.text(from, at) || line.text(start, start + 1);
  line.labelFrom = start;
  line.labelTo = at;
  while (isBlank(bytes[at]!)) at++;
  const isPlainNumber = isDigit(bytes[from]!) && CLASS_OF[bytes[at]!] !== LETTER;
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
