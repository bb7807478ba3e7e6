import { evaluate, isFailure } from '../expressions/evaluate';
import type { Expression } from '../expressions/expression';
import { isBounds, type Bounds, type Value } from '../expressions/value';
import type { Locals } from '../flow/call-stack';
import { labelKey, type Link } from '../flow/pair-shapes';
import type { Flow, Label, LabelledFlow } from '../statements/statement';
import type { Words } from './events';
import type { Follower } from './follower';
import { tellProblem, type Run } from './run';
import { wholeNumber } from './whole-number';
import { carryOutSettingsOf, workOutValue } from './work-out';

type Range = Pick<Flow, 'from' | 'to'>;

/** Carries out a line that says which block comes next. What it cannot work out is a fault of the line. */
export function steer(run: Run, follower: Follower, flow: Flow): void {
  if (flow.kind === 'goto') return goto(run, follower, flow);
  if (flow.kind === 'then') {
    if (holds(run, follower, flow.condition, flow)) carryOutSettingsOf(run, flow.settings);
    return;
  }
  if (flow.kind === 'labelled' && flow.keyword === 'call') return call(run, follower, flow);
  const link = follower.frame.program.shapes.links.get(follower.line);
  // A part without its other parts has been told with the text's shape, and steers nothing.
  if (!link) return;
  if (flow.kind === 'while') takeWhile(run, follower, flow.condition, flow);
  else if (flow.kind === 'end') loopAgain(follower, link);
  else takeLabelled(run, follower, flow, link);
}

/** Whether a condition is decided, and how; undefined when it is not, or cannot be worked out at all. */
export function decided(run: Run, condition: Expression): boolean | undefined {
  const worth = evaluate(condition, run.parameters, run.grammar);
  return isFailure(worth) ? undefined : truth(worth);
}

/** Null is nought, and nought does not hold; bounds that leave nought out do. */
function truth(value: Value): boolean | undefined {
  if (value === null) return false;
  if (!isBounds(value)) return value !== 0;
  return value.least > 0 || value.greatest < 0 ? true : undefined;
}

function takeLabelled(run: Run, follower: Follower, flow: LabelledFlow & Range, link: Link): void {
  const { frame, line } = follower;
  switch (link.kind) {
    case 'if':
      return branch(run, follower, flow, link.next);
    case 'elseif':
      if (frame.seeksBranch) return branch(run, follower, flow, link.next);
      frame.line = link.end + 1;
      return;
    case 'else':
      if (!frame.seeksBranch) frame.line = link.end + 1;
      frame.seeksBranch = false;
      return;
    case 'endif':
      frame.seeksBranch = false;
      return;
    case 'while':
      return takeWhile(run, follower, flow.values[0], flow);
    case 'do':
      follower.turn(line);
      return;
    case 'repeat':
      return takeRepeat(run, follower, flow, link.end);
    case 'again':
      if (holdsAgain(run, follower, flow.values[0]!, flow)) frame.line = link.begin;
      else follower.leaveLoop(link.begin);
      return;
    case 'endloop':
      return loopAgain(follower, link);
    case 'break':
      follower.leaveLoop(link.loop.begin);
      frame.line = link.loop.end + 1;
      return;
    case 'continue':
      frame.line = link.loop.end;
      return;
    case 'sub':
      frame.line = link.end + 1;
      return;
    case 'endsub':
    case 'return':
      return giveBack(run, follower, flow);
  }
}

function branch(run: Run, follower: Follower, flow: LabelledFlow & Range, next: number): void {
  const { frame } = follower;
  frame.seeksBranch = !holds(run, follower, flow.values[0]!, flow);
  if (frame.seeksBranch) frame.line = next;
}

function takeWhile(
  run: Run,
  follower: Follower,
  condition: Expression | undefined,
  range: Range,
): void {
  const { frame, line } = follower;
  if (!condition || holdsAgain(run, follower, condition, range)) follower.turn(line);
  else {
    const link = frame.program.shapes.links.get(line);
    follower.leaveLoop(line);
    if (link && 'end' in link) frame.line = link.end + 1;
  }
}

function loopAgain({ frame }: Follower, link: Link): void {
  if ('begin' in link) frame.line = link.begin;
}

/** The count is worked out once, as the loop begins. */
function takeRepeat(run: Run, follower: Follower, flow: LabelledFlow & Range, end: number): void {
  const { frame, line } = follower;
  const turning = follower.turningAt(line);
  const left = turning ? turning.left - 1 : countOf(run, flow);
  if (left <= 0) {
    follower.leaveLoop(line);
    frame.line = end + 1;
    return;
  }
  follower.turn(line, left);
}

/** How often a repeat turns; where that is not known it is told, and walked once. */
function countOf(run: Run, flow: LabelledFlow & Range): number {
  const value = workOutValue(run, flow.values[0]!, flow);
  if (value === undefined) return 0;
  if (!isBounds(value)) return Math.round(value ?? 0);
  tellDepends(run, flow, value.of);
  return 1;
}

function goto(run: Run, follower: Follower, flow: Extract<Flow, { kind: 'goto' }>): void {
  const value = workOutValue(run, flow.target, flow);
  if (value === undefined) return;
  if (isBounds(value)) return tellDepends(run, flow, value.of);
  const { frame, line } = follower;
  const number = wholeNumber(value ?? 0);
  const to = number >= 0 ? frame.program.findNumber(number, line) : undefined;
  const isBackward = to !== undefined && to <= line;
  if (flow.condition) {
    const isTaken = isBackward ? holdsAgain : holds;
    if (!isTaken(run, follower, flow.condition, flow)) return;
  }
  const bytes = [flow.from, flow.to] as const;
  if (to === undefined)
    tellProblem(run, 'subprogram-missing', { bytes }, { reason: 'jump', what: `N${value ?? 0}` });
  else if (frame.program.entersLoop(line, to))
    tellProblem(run, 'unreadable-block', { bytes }, { reason: 'into-loop', what: `N${number}` });
  else follower.jump(to, isBackward);
}

function call(run: Run, follower: Follower, flow: LabelledFlow & Range): void {
  const key = keyOf(run, flow.label, flow);
  if (key === undefined) return;
  const given: Value[] = [];
  for (const value of flow.values) {
    const worth = workOutValue(run, value, flow);
    if (worth === undefined) return;
    given.push(worth);
  }
  callKey(run, follower, key, { bytes: [flow.from, flow.to] }, 1, { kind: 'subroutine', given });
}

/** Calls what stands under a label, or tells that nothing does. */
export function callKey(
  run: Run,
  follower: Follower,
  key: string,
  words: Words,
  times: number,
  locals: Locals,
): void {
  const found = follower.findCallee(key, locals.kind === 'subroutine' ? 'sub' : 'program');
  if (!found) {
    const what = key.startsWith('<') ? `o${key}` : `O${key}`;
    return tellProblem(run, 'subprogram-missing', words, { reason: 'call', what });
  }
  if (locals.kind === 'subroutine' && follower.isBehind(found))
    tellProblem(run, 'subprogram-missing', words, { reason: 'behind', what: `o${key}` });
  follower.call({ ...found, key, times, locals }, words);
}

function keyOf(run: Run, label: Label, range: Range): string | undefined {
  const written = labelKey(label);
  if (written !== undefined || 'name' in label) return written;
  const value = workOutValue(run, label.number, range);
  if (value === undefined) return undefined;
  if (!isBounds(value)) return String(wholeNumber(value ?? 0));
  tellDepends(run, range, value.of);
  return undefined;
}

/** Named parameters through which a subroutine hands a value back (common practice, no source). */
const RETURNED = '_value';
const HAS_RETURNED = '_value_returned';

function giveBack(run: Run, follower: Follower, flow: LabelledFlow & Range): void {
  const [written] = flow.values;
  const value = written && workOutValue(run, written, flow);
  follower.return();
  run.parameters.set(HAS_RETURNED, value === undefined ? 0 : 1);
  if (value !== undefined) run.parameters.set(RETURNED, value);
}

/** Whether a condition holds; one that is not decided goes by what the walk takes for it. */
function holds(run: Run, follower: Follower, condition: Expression, range: Range): boolean {
  const value = workOutValue(run, condition, range);
  if (value === undefined) return false;
  return truth(value) ?? decide(run, follower, value, range, '');
}

/**
 * As holds, for what leads back: a loop that has come round to the same machine and parameters comes round for
 * ever, or is left now, so it is left.
 */
function holdsAgain(run: Run, follower: Follower, condition: Expression, range: Range): boolean {
  const value = workOutValue(run, condition, range);
  if (value === undefined) return false;
  return truth(value) ?? decide(run, follower, value, range, worldOf(run, follower));
}

function decide(run: Run, follower: Follower, value: Value, range: Range, world: string): boolean {
  const { least, greatest, of } = value as Bounds;
  const { decisions, frame, line } = follower;
  const about = `${frame.program.text.name}:${line}:${least}:${greatest}:${of}:${world}`;
  if (world !== '' && decisions.knows(about)) {
    decisions.asked++;
    return false;
  }
  return decisions.decide(about, () => ({
    place: run.machine.place({ bytes: [range.from, range.to] }),
    condition: conditionText(run, range),
  }));
}

/** All that a block can change, in one text. */
function worldOf({ machine, parameters }: Run, { frames }: Follower): string {
  const { x, y, z, a, unit, planeIndex, isAbsolute, motionCode, feed, speed, turning } = machine;
  const { workOffset, lengthOffset, compensation, held, selectedTool, coolant } = machine;
  return [
    ...[x, y, z, a, unit, planeIndex, isAbsolute, motionCode, feed, speed, turning, workOffset],
    ...[lengthOffset, compensation, held.known, held.number, selectedTool, coolant.mist],
    ...[coolant.flood, machine.baseX, machine.baseY, machine.baseZ, parameters.fingerprint],
    frames.length,
  ].join(' ');
}

/** The bracket behind a control word, as written. */
function conditionText({ block: { words } }: Run, { from, to }: Range): string {
  const text = words.text(words.start + from, words.start + to);
  const open = text.indexOf('[');
  let depth = 0;
  for (let at = open; 0 <= at && at < text.length; at++) {
    if (text[at] === '[') depth++;
    else if (text[at] === ']' && --depth === 0) return text.slice(open, at + 1);
  }
  return text;
}

function tellDepends(run: Run, { from, to }: Range, of: string): void {
  const { words } = run.block;
  const what = words.text(words.start + from, words.start + to);
  tellProblem(run, 'not-modelled', { bytes: [from, to] }, { what, reason: 'depends', of });
}
