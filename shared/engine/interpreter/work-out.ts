import { LETTER, letterBits, letterName } from '../blocks/block';
import {
  evaluate,
  isFailure,
  parameterNumber,
  type Failure,
  type Worth,
} from '../expressions/evaluate';
import type { Expression } from '../expressions/expression';
import { isBounds, type Bounds, type Value } from '../expressions/value';
import { MOST_WORDS, type LineWords } from '../lexer/line-words';
import { LARGEST } from '../lexer/rare-words';
import type { ParameterKey } from '../parameters/parameter-name';
import type { ComputedWord, Setting, Statement } from '../statements/statement';
import { raiseOrPause } from './macro-stops';
import type { Run } from './run';
import { forgetUnknownWords, noteUnknownWords, type WordBounds } from './unknown-position';

const AXIS_WORDS = letterBits('XYZA');

interface Range {
  readonly from: number;
  readonly to: number;
}

/**
 * Works out the words of a statement into the line they stand in, and stores its settings. All of it is read
 * before any of it is stored, and all is stored before the block is carried out (NISTIR 6556 3.2.3). What
 * cannot be worked out is a fault of the line that voids the block, and then nothing is stored.
 */
export function workOut(run: Run, statement: Statement): void {
  const { words } = run.block;
  workOutWords(run, statement.words);
  const assigned = workOutSettings(run, statement.settings);
  if (words.isVoid) return forgetUnknownWords(run);
  store(run, assigned);
}

/**
 * As workOut, for the words of a call: any of them may be known only within bounds. Gives the words that are,
 * by their place in the line.
 */
export function workOutArguments(run: Run, statement: Statement): ReadonlyMap<number, Bounds> {
  const { words } = run.block;
  const bounded = new Map<number, Bounds>();
  let count = 0;
  for (const word of statement.words) {
    const worth = evaluate(word.value, run.parameters, run.grammar);
    if (worth === null || count >= MOST_WORDS) continue;
    const isBounded = !isFailure(worth) && isBounds(worth);
    const isArgument = isBounded && !NEVER_ARGUMENTS.includes(word.letter);
    const value = isArgument ? worth.least : plainValue(run, word, worth);
    if (isArgument) bounded.set(count, worth);
    putWord(words, count++, word, value);
  }
  words.count = count;
  const assigned = workOutSettings(run, statement.settings);
  if (!words.isVoid) store(run, assigned);
  return bounded;
}

/** Which program is called, and how often, has to be known. */
const NEVER_ARGUMENTS: readonly number[] = [LETTER.G, LETTER.L, LETTER.M, LETTER.N, LETTER.P];

/** What a condition, a target or an argument is worth; undefined, and a fault of the line, when nothing. */
export function workOutValue(run: Run, expression: Expression, range: Range): Value | undefined {
  const worth = evaluate(expression, run.parameters, run.grammar);
  if (!isFailure(worth)) return worth;
  noteFailure(run, worth, range);
  return undefined;
}

/** Settings that stand behind a condition: `IF [c] THEN #1=2`. */
export function carryOutSettingsOf(run: Run, settings: readonly Setting[]): void {
  const assigned = workOutSettings(run, settings);
  if (!run.block.words.isVoid) store(run, assigned);
}

function workOutWords(run: Run, written: readonly ComputedWord[]): void {
  const { words } = run.block;
  const unknown: WordBounds[] = [];
  let of = '';
  let count = 0;
  for (const word of written) {
    const worth = evaluate(word.value, run.parameters, run.grammar);
    // A word whose variable was never set is left out with its letter (facts sheet 12.1.2).
    if (worth === null || count >= MOST_WORDS) continue;
    const value = plainValue(run, word, worth);
    if (!isFailure(worth) && isBounds(worth)) {
      unknown.push({ word: count, bounds: worth });
      of ||= worth.of;
    }
    putWord(words, count++, word, value);
  }
  words.count = count;
  if (unknown.length > 0 && !words.isVoid) noteUnknownWords(run, unknown, of);
}

function putWord(words: LineWords, at: number, word: ComputedWord, value: number): void {
  words.letters[at] = word.letter;
  words.values[at] = value;
  words.starts[at] = words.start + word.from;
  words.ends[at] = words.start + word.to;
}

/** One number for the block to go by; a word that has none voids it. */
function plainValue(run: Run, word: ComputedWord, worth: Exclude<Worth, null>): number {
  if (typeof worth === 'number') {
    if (word.value.kind !== 'number' && !(Math.abs(worth) <= LARGEST))
      noteFailure(run, { reason: 'too-large', what: letterName(word.letter) }, word);
    return worth;
  }
  if (isFailure(worth)) {
    noteFailure(run, worth, word);
    return NaN;
  }
  const isAxis = (AXIS_WORDS & (1 << word.letter)) !== 0;
  const isBounded = Math.abs(worth.least) <= LARGEST && Math.abs(worth.greatest) <= LARGEST;
  if (!isAxis || !isBounded) noteDepends(run, word, worth.of);
  return worth.least;
}

interface Assigned extends Range {
  readonly key: ParameterKey;
  readonly value: Value;
}

function workOutSettings(run: Run, settings: readonly Setting[]): Assigned[] {
  const { parameters, grammar } = run;
  const assigned: Assigned[] = [];
  for (const setting of settings) {
    const key = setting.parameter.name ?? parameterNumber(setting.parameter, parameters, grammar);
    const value = evaluate(setting.value, parameters, grammar);
    if (typeof key === 'object') {
      if (isFailure(key)) noteFailure(run, key, setting);
      else noteDepends(run, setting, key.of);
    } else if (isFailure(value)) noteFailure(run, value, setting);
    else {
      const { from, to } = setting;
      assigned.push({ key, value, from, to });
    }
  }
  return assigned;
}

function store(run: Run, assigned: readonly Assigned[]): void {
  for (const { key, value, from, to } of assigned) {
    if (raiseOrPause(run, key, value, { from, to })) continue;
    const failure = run.parameters.set(key, value);
    if (failure) noteFailure(run, failure, { from, to });
  }
}

function noteDepends(run: Run, range: Range, of: string): void {
  const { words } = run.block;
  words.fault({
    problem: 'not-modelled',
    from: words.start + range.from,
    to: words.start + range.to,
    facts: { what: textOf(run, range), reason: 'depends', of },
    voids: true,
  });
}

function noteFailure(run: Run, { reason, what }: Failure, range: Range): void {
  if (reason === 'unknown') return noteDepends(run, range, what);
  const { words } = run.block;
  const isSystem = reason === 'system';
  words.fault({
    problem: isSystem ? 'not-modelled' : 'out-of-range-word',
    from: words.start + range.from,
    to: words.start + range.to,
    facts: isSystem
      ? { what: textOf(run, range), reason: 'system-parameter' }
      : { letter: what, what: textOf(run, range), needs: reason },
    // A setting that is not followed leaves the motion of its block as it is.
    voids: !isSystem,
  });
}

function textOf(run: Run, { from, to }: Range): string {
  const { words } = run.block;
  return words.text(words.start + from, words.start + to);
}
