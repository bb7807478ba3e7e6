import { LETTER } from '../blocks/block';
import { codeName } from '../blocks/code-groups';
import { parameterKey, showParameter } from '../parameters/parameter-name';
import type { DeclaredCode } from '../shop/setup';
import type { Run } from './run';
import { restoreState, saveState } from './saved-state';
import { hold } from './held-tool';
import { wholeNumber } from './whole-number';

/** The meaning that the setup gives a code in this block, if its conditions hold. */
export function findDeclared(run: Run, name: string): DeclaredCode | undefined {
  const meanings = run.declared.get(name);
  if (!meanings) return undefined;
  return meanings.find((meaning) => holds(run, meaning.where));
}

function holds({ block }: Run, where: Readonly<Record<string, number>> | undefined): boolean {
  if (!where) return true;
  return Object.entries(where).every(([name, value]) => {
    const letter = name.charCodeAt(0) - 65;
    return block.has(letter) && block.value(letter) === value;
  });
}

/** Carries out the declared codes of a block, in the order in which they are written. */
export function doDeeds(run: Run): void {
  for (const { letter, tenths } of run.block.others) {
    const code = codeName(letter, tenths);
    const meaning = findDeclared(run, code);
    if (meaning) doDeed(run, code, meaning);
  }
}

function doDeed(run: Run, code: string, meaning: DeclaredCode): void {
  const { machine, tell } = run;
  const place = machine.place({ letters: Object.keys(meaning.where ?? {}).join(''), code });
  tell.deed({ code, does: meaning.does, place });
  if (meaning.does === 'save-state') saveState(run);
  else if (meaning.does === 'restore-state') restoreState(run);
  else if (meaning.does === 'alarm') raiseAlarm(run);
  else if (meaning.into !== undefined) noteInput(run, meaning.into, meaning);
  else if (meaning.does === 'set-current-tool') setCurrentTool(run, meaning);
  else if (meaning.does === 'coolant-off') machine.coolant.mist = machine.coolant.flood = false;
  else if (meaning.does === 'coolant-on') machine.coolant.flood = true;
}

/** Nothing more of the program is carried out, nor of the block. */
function raiseAlarm(run: Run): void {
  run.endedBy = 'alarm';
  run.refused = true;
}

/**
 * What an input reads is not known before the run: nought or one, or the value that the setup names. Waiting
 * gives that value, or the one that says that the time was up.
 */
function noteInput(run: Run, into: string, { does, when = 1, timeout }: DeclaredCode): void {
  const key = parameterKey(into);
  const values = does === 'wait-input' ? [when, timeout ?? when] : [0, 1, when];
  const least = Math.min(...values);
  const greatest = Math.max(...values);
  const of = showParameter(key);
  run.parameters.set(key, least === greatest ? least : { least, greatest, of });
}

/** The controller is told what the spindle holds; nothing moves. */
function setCurrentTool(run: Run, { from }: DeclaredCode): void {
  const letter = from && /^[A-Z]$/.test(from) ? from.charCodeAt(0) - 65 : LETTER.Q;
  if (!run.block.has(letter)) return;
  const number = wholeNumber(run.block.value(letter));
  hold(run, number >= 0 ? number : null);
}
