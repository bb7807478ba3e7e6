import type { LineWords } from '../lexer/line-words';
import { LETTER, letterBits, letterName, type Block } from './block';
import { GROUP, NO_GROUP, TABLE_LENGTH, codeName } from './code-groups';

/** How one controller sorts codes and reads numbers. */
export interface BlockDialect {
  readonly g: Int8Array;
  readonly m: Int8Array;
  /** Refuse what NISTIR 6556 refuses. */
  readonly isStrict: boolean;
  /** Millimetres of one least increment where numbers without a point count them, else 0. */
  readonly increment: number;
}

/** NISTIR 6556 3.2.5. */
const MOST_M_WORDS = 4;
/** NISTIR 6556 3.2.1: five digits. */
const HIGHEST_LINE_NUMBER = 99_999;
/** NISTIR 6556 3.2.2.1: ten times a G number lies within this of a whole number. */
const CODE_ROUNDING = 0.001;

/** Sorts the words of a line into `block`; what cannot stand together becomes a fault of the line. */
export function parseBlock(words: LineWords, block: Block, dialect: BlockDialect): void {
  const { letters, values, count } = words;
  const { wordOf, codes, codeWords } = block;
  const { g } = dialect;
  if (block.mCount > 0) clearMiscellaneous(block);
  if (block.others.length > 0) block.others.length = 0;
  block.groups = 0;
  let seen = 0;
  for (let word = 0; word < count; word++) {
    const letter = letters[word]!;
    if (letter === LETTER.G) {
      // The first code of its group, a whole number: nearly all of them.
      const code = values[word]! | 0;
      const group = code === values[word] && code >>> 0 < WHOLE_CODES ? g[code * 10]! : NO_GROUP;
      if (group < 0 || (block.groups & CAREFUL) !== 0 || (block.groups & (1 << group)) !== 0) {
        addG(words, block, dialect, word);
        continue;
      }
      block.groups |= 1 << group;
      codes[group] = code * 10;
      codeWords[group] = word;
    } else if (letter === LETTER.M) addM(words, block, dialect, word);
    else {
      const bit = 1 << letter;
      if ((seen & bit) !== 0) noteRepeated(words, letter, word);
      seen |= bit;
      wordOf[letter] = word;
    }
  }
  block.seen = seen;
  if ((seen & NUMBERED) !== 0) checkLineNumber(words, block, dialect);
  if (dialect.increment > 0) countIncrements(words, dialect.increment);
  if ((block.groups & CLAIMS) !== 0) checkClaims(words, block, dialect);
}

const WHOLE_CODES = TABLE_LENGTH / 10;
/** Groups beside which another code may be a conflict although its own group is free. */
const CAREFUL = (1 << GROUP.motion) | (1 << GROUP.cycle);

function clearMiscellaneous(block: Block): void {
  block.mCount = 0;
  block.mist = false;
  block.flood = false;
}

const NUMBERED = letterBits('N');

function addG(words: LineWords, block: Block, dialect: BlockDialect, word: number): void {
  const scaled = words.values[word]! * 10;
  const tenths = Math.round(scaled);
  if (!(Math.abs(scaled - tenths) <= CODE_ROUNDING) || tenths < 0)
    return noteBadCode(words, 'G', word);
  const group = tenths < TABLE_LENGTH ? dialect.g[tenths]! : NO_GROUP;
  if (group < 0) block.others.push({ letter: 'G', tenths, word });
  else addCode(block, group, tenths, word, dialect.isStrict);
}

function addM(words: LineWords, block: Block, dialect: BlockDialect, word: number): void {
  const value = words.values[word]!;
  const tenths = Math.round(value) * 10;
  if (!(Math.abs(value * 10 - tenths) <= CODE_ROUNDING) || tenths < 0)
    return noteBadCode(words, 'M', word);
  block.mCount++;
  if (dialect.isStrict && block.mCount > MOST_M_WORDS)
    noteConflict(words, word, { reason: 'm-words', most: MOST_M_WORDS });
  const group = tenths < TABLE_LENGTH ? dialect.m[tenths]! : NO_GROUP;
  if (group < 0) block.others.push({ letter: 'M', tenths, word });
  else addCode(block, group, tenths, word, dialect.isStrict);
}

/** Puts a code into its group; a group that has one already is a conflict, and the later one holds. */
export function addCode(
  block: Block,
  group: number,
  code: number,
  word: number,
  isStrict: boolean,
): void {
  if (group === GROUP.coolant) {
    if (code === 70) block.mist = true;
    else if (code === 80) block.flood = true;
    // Mist and flood may both be on; only the published language wants them on separate lines.
    if (!isStrict && block.hasGroup(group) && code !== 90 && block.codes[group] !== 90) return;
  }
  if (block.hasGroup(group) && group !== GROUP.idle) noteSameGroup(block, group, group, code, word);
  // Cycles are a group of their own to router controllers; the published language has one group.
  else if (isStrict && group === GROUP.motion && block.hasGroup(GROUP.cycle))
    noteSameGroup(block, GROUP.cycle, group, code, word);
  else if (isStrict && group === GROUP.cycle && block.hasGroup(GROUP.motion))
    noteSameGroup(block, GROUP.motion, group, code, word);
  block.groups |= 1 << group;
  block.codes[group] = code;
  block.codeWords[group] = word;
}

function noteSameGroup(
  block: Block,
  otherGroup: number,
  group: number,
  code: number,
  word: number,
): void {
  const letter = letterName(block.words.letters[word]!);
  const what = codeName(letter, code);
  const other = codeName(letter, block.codes[otherGroup]!);
  noteConflict(block.words, word, {
    reason: otherGroup === group && what === other ? 'repeated-code' : 'same-group',
    what,
    other,
  });
}

function checkLineNumber(words: LineWords, block: Block, dialect: BlockDialect): void {
  const word = block.wordOf[LETTER.N]!;
  const value = words.values[word]!;
  if (dialect.isStrict && word > 0) {
    words.fault({
      problem: 'unreadable-block',
      from: words.starts[word]!,
      to: words.ends[word]!,
      facts: { reason: 'line-number-first', what: block.written(word) },
      voids: true,
    });
  }
  const isWhole = (value | 0) === value || Number.isInteger(value);
  if (0 <= value && isWhole && (!dialect.isStrict || value <= HIGHEST_LINE_NUMBER)) return;
  words.fault({
    problem: 'out-of-range-word',
    from: words.starts[word]!,
    to: words.ends[word]!,
    facts: {
      letter: 'N',
      what: block.written(word),
      value,
      needs: value < 0 ? 'not-negative' : Number.isInteger(value) ? 'five-digits' : 'whole',
    },
    // A line number steers nothing here, so only a strict controller stops for it.
    voids: dialect.isStrict,
  });
}

/** Lengths and angles; counts, codes, feeds and times are whole as they stand (common practice, no source). */
const INCREMENTAL_LETTERS = letterBits('ABCIJKQRUVWXYZ');

function countIncrements(words: LineWords, increment: number): void {
  for (let word = 0; word < words.count; word++) {
    const letter = words.letters[word]!;
    if ((INCREMENTAL_LETTERS & (1 << letter)) === 0 || hasPoint(words, word)) continue;
    const value = words.values[word]!;
    if (value === 0) continue;
    words.values[word] = value * increment;
    words.fault({
      problem: 'no-decimal-point',
      from: words.starts[word]!,
      to: words.ends[word]!,
      facts: {
        letter: letterName(letter),
        what: words.text(words.starts[word]!, words.ends[word]!),
        length: value * increment,
      },
      voids: false,
    });
  }
}

/** A word with a point says what it says, and so does one that was worked out: its variables hold decimals. */
function hasPoint({ bytes, starts, ends }: LineWords, word: number): boolean {
  for (let at = starts[word]!; at < ends[word]!; at++) {
    const byte = bytes[at];
    if (byte === POINT || byte === HASH || byte === OPEN_SQUARE) return true;
  }
  return false;
}
const POINT = 46;
const HASH = 35;
const OPEN_SQUARE = 91;

const CLAIMS = 1 << GROUP.once;
/** G10, G28, G30 and the setting codes of G92 and G52 each want the axis words for themselves. */
const CLAIMERS: readonly number[] = [100, 280, 281, 300, 301, 520, 920];

/**
 * One code that claims the axis words beside a motion code (NISTIR 6556 3.4). Posts write `G28 G0 Z0` and
 * `G91 G28 G0 Z0` on safety lines, and every controller reads them the same way, so that one passes.
 */
function checkClaims(words: LineWords, block: Block, dialect: BlockDialect): void {
  const code = block.codes[GROUP.once]!;
  if (!CLAIMERS.includes(code)) return;
  const hasCycle = block.hasGroup(GROUP.cycle) && block.codes[GROUP.cycle] !== 800;
  if (!block.hasGroup(GROUP.motion) && !hasCycle) return;
  const isHoming = code === 280 || code === 300;
  if (!dialect.isStrict && isHoming && !hasCycle && block.codes[GROUP.motion] === 0) return;
  const group = hasCycle ? GROUP.cycle : GROUP.motion;
  noteConflict(words, block.codeWords[GROUP.once]!, {
    reason: 'axis-words',
    what: codeName('G', code),
    other: codeName('G', block.codes[group]!),
  });
}

/** NISTIR 6556 3.2 knows no comment behind a semicolon. */
export function refuseLineComments(words: LineWords): void {
  const comment = words.comments.find((each) => each.isLine);
  if (!comment) return;
  words.fault({
    problem: 'unreadable-block',
    from: comment.from - 1,
    to: comment.to,
    facts: { reason: 'semicolon', what: ';' },
    voids: true,
  });
}

function noteConflict(
  words: LineWords,
  word: number,
  facts: Readonly<Record<string, string | number>>,
): void {
  words.fault({
    problem: 'modal-conflict',
    from: words.starts[word]!,
    to: words.ends[word]!,
    facts,
    voids: false,
  });
}

function noteRepeated(words: LineWords, letter: number, word: number): void {
  words.fault({
    problem: 'repeated-word',
    from: words.starts[word]!,
    to: words.ends[word]!,
    facts: { letter: letterName(letter), what: words.text(words.starts[word]!, words.ends[word]!) },
    voids: false,
  });
}

function noteBadCode(words: LineWords, letter: 'G' | 'M', word: number): void {
  words.fault({
    problem: 'out-of-range-word',
    from: words.starts[word]!,
    to: words.ends[word]!,
    facts: {
      letter,
      what: words.text(words.starts[word]!, words.ends[word]!),
      value: words.values[word]!,
      needs: 'code',
    },
    voids: true,
  });
}
