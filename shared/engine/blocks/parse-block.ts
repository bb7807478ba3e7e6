import type { LineWords } from '../lexer/line-words';
import type { Block } from './block';
import { LETTER, letterName } from './block';
import { GROUP, NO_GROUP, codeName } from './code-groups';

/** How this controller sorts codes: built-in groups with what the setup declares taken out. */
export interface CodeTable {
  readonly g: Int8Array;
  readonly m: Int8Array;
  readonly isStrict: boolean;
}

/** NISTIR 6556 3.2.5: no more than four M words a line. */
const MOST_M_WORDS = 4;

/** Sorts the words of a line into `block`; conflicts become faults of the line. */
export function parseBlock(words: LineWords, block: Block, table: CodeTable): void {
  const { letters, count } = words;
  block.groups = 0;
  block.mCount = 0;
  block.mist = false;
  block.flood = false;
  if (block.others.length > 0) block.others.length = 0;
  let seen = 0;
  for (let word = 0; word < count; word++) {
    const letter = letters[word]!;
    if (letter === LETTER.G) addG(words, block, table, word);
    else if (letter === LETTER.M) addM(words, block, table, word);
    else {
      const bit = 1 << letter;
      if ((seen & bit) !== 0) noteRepeated(words, letter, word);
      seen |= bit;
      block.wordOf[letter] = word;
    }
  }
  block.seen = seen;
}

function addG(words: LineWords, block: Block, table: CodeTable, word: number): void {
  const scaled = words.values[word]! * 10;
  const tenths = Math.round(scaled);
  // NISTIR 6556 3.2.2.1: ten times a G number lies within 0.001 of a whole number.
  if (!(Math.abs(scaled - tenths) <= 0.001) || tenths < 0) return noteBadCode(words, 'G', word);
  const group = tenths < table.g.length ? table.g[tenths]! : NO_GROUP;
  if (group < 0) {
    block.others.push({ letter: 'G', tenths, word });
    return;
  }
  addCode(words, block, group, tenths, word);
}

function addM(words: LineWords, block: Block, table: CodeTable, word: number): void {
  const value = words.values[word]!;
  const tenths = Math.round(value) * 10;
  if (!(Math.abs(value * 10 - tenths) <= 0.001) || tenths < 0) return noteBadCode(words, 'M', word);
  block.mCount++;
  if (table.isStrict && block.mCount > MOST_M_WORDS)
    noteConflict(words, word, { reason: 'm-words', most: MOST_M_WORDS });
  const group = tenths < table.m.length ? table.m[tenths]! : NO_GROUP;
  if (group < 0) {
    block.others.push({ letter: 'M', tenths, word });
    return;
  }
  if (group === GROUP.coolant && !table.isStrict && tenths !== 90) {
    if (tenths === 70) block.mist = true;
    else block.flood = true;
    if (block.hasGroup(group) && block.codes[group] !== 90) return;
  } else if (tenths === 70) block.mist = true;
  else if (tenths === 80) block.flood = true;
  addCode(words, block, group, tenths, word);
}

function addCode(words: LineWords, block: Block, group: number, code: number, word: number): void {
  const bit = 1 << group;
  if ((block.groups & bit) !== 0) {
    const letter = letterName(words.letters[word]!) as 'G' | 'M';
    const other = codeName(letter, block.codes[group]!);
    const same = other === codeName(letter, code);
    // The same code twice says nothing new; it is refused only where the published language refuses it.
    noteConflict(words, word, {
      reason: same ? 'repeated-code' : 'same-group',
      what: codeName(letter, code),
      other,
    });
  }
  block.groups |= bit;
  block.codes[group] = code;
  block.codeWords[group] = word;
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
  const what = words.text(words.starts[word]!, words.ends[word]!);
  words.fault({
    problem: 'out-of-range-word',
    from: words.starts[word]!,
    to: words.ends[word]!,
    facts: { letter, what, value: words.values[word]!, needs: 'code' },
    voids: true,
  });
}
