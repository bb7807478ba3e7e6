import { LETTER, letterBits, type OtherCode } from '../blocks/block';
import { codeName, GROUP } from '../blocks/code-groups';
import { evaluate } from '../expressions/evaluate';
import type { Value } from '../expressions/value';
import type { Statement } from '../statements/statement';
import type { Follower } from './follower';
import { macroArguments } from './macro-arguments';
import { tellProblem, type Run } from './run';
import { callKey } from './steer';
import { wholeNumber } from './whole-number';

const { G, L, M, P } = LETTER;

/** Codes that call: M98 and G65 another program, M97 a line of this one (facts sheet 12.1.7 to 12.1.9). */
export type CallCode = 'M97' | 'M98' | 'G65';
const CALL_CODES: readonly string[] = ['M97', 'M98', 'G65'];

/** What a calling block asks for. */
export interface Call {
  readonly code: CallCode;
  /** The program, or for M97 the line number. */
  readonly number: number;
  readonly times: number;
  /** Of G65: the local variables it gives. */
  readonly given: ReadonlyMap<number, Value> | undefined;
}

/** Digits of a program's number where the ones before them say how often it is called. */
const PACKED = 10_000;

/** The code among those of the block that calls something and has no meaning of the setup's own. */
export function findCall(run: Run): OtherCode | undefined {
  return run.block.others.find(({ letter, tenths }) => isCall(run, codeName(letter, tenths)));
}

/** The code by which a statement calls something, or '': found before anything of it is stored. */
export function callOf(run: Run, { words }: Statement): CallCode | '' {
  for (const { letter, value } of words) {
    if (letter !== G && letter !== M) continue;
    const worth = evaluate(value, run.parameters, run.grammar);
    if (typeof worth !== 'number') continue;
    const name = codeName(letter === G ? 'G' : 'M', Math.round(worth * 10));
    if (isCall(run, name)) return name as CallCode;
  }
  return '';
}

function isCall(run: Run, name: string): boolean {
  return !run.dialect.isStrict && CALL_CODES.includes(name) && !run.declared.has(name);
}

/** Reads a call off its block; tells what it lacks. `valueOf` gives what a word is worth. */
export function readCall(
  run: Run,
  { letter, tenths }: OtherCode,
  valueOf: (word: number) => Value,
): Call | undefined {
  const { block } = run;
  const code = codeName(letter, tenths) as CallCode;
  if (!block.has(P)) {
    tellProblem(run, 'missing-word', { code }, { code, letter: 'P' });
    return undefined;
  }
  const number = wholeWord(run, P);
  const times = block.has(L) ? wholeWord(run, L) : 1;
  if (number === undefined || times === undefined) return undefined;
  const given = code === 'G65' ? macroArguments(block.words, valueOf) : undefined;
  const isPacked = code === 'M98' && run.controller.switches.packedM98 && number >= PACKED;
  if (!isPacked) return { code, number, times, given };
  return { code, number: number % PACKED, times: times * Math.floor(number / PACKED), given };
}

function wholeWord(run: Run, letter: number): number | undefined {
  const { block } = run;
  const value = block.value(letter);
  const whole = wholeNumber(value);
  if (whole >= 0) return whole;
  const name = String.fromCharCode(65 + letter);
  const what = block.written(block.wordOf[letter]!);
  const needs = value < 0 ? 'not-negative' : 'whole';
  tellProblem(run, 'out-of-range-word', { letters: name }, { letter: name, what, value, needs });
  return undefined;
}

/** Calls what the block asks for, or tells that it is not there. */
export function makeCall(run: Run, follower: Follower, call: Call): void {
  const { code, number, times, given } = call;
  const words = { letters: 'P', code };
  if (code !== 'M97') {
    const locals = given ? ({ kind: 'macro', given } as const) : ({ kind: 'shared' } as const);
    return callKey(run, follower, String(number), words, times, locals);
  }
  const { program } = follower.frame;
  const start = program.findNumber(number, follower.line);
  if (start === undefined)
    tellProblem(run, 'subprogram-missing', words, { reason: 'line', what: `N${number}` });
  else
    follower.call({ program, start, key: `N${number}`, times, locals: { kind: 'shared' } }, words);
}

/** Leaves of the block what is carried out before the call: nothing of a G65 but its modes. */
export function takeCallOut({ block }: Run, call: OtherCode): void {
  const { others } = block;
  others.splice(others.indexOf(call), 1);
  if (call.letter === 'M') {
    block.seen &= ~((1 << P) | (1 << L));
    return;
  }
  block.seen &= letterBits('N');
  block.groups &= ~MACHINE_GROUPS;
  for (let at = others.length - 1; at >= 0; at--)
    if (others[at]!.letter === 'M') others.splice(at, 1);
}

/** M words of a G65 block are arguments. */
const MACHINE_GROUPS =
  (1 << GROUP.stop) |
  (1 << GROUP.change) |
  (1 << GROUP.spindle) |
  (1 << GROUP.coolant) |
  (1 << GROUP.override);
