import { LETTER } from '../blocks/block';
import { codeName } from '../blocks/code-groups';
import { depthLetter, readCycleWords } from './cycle-words';
import type { Motion } from './events';
import { moveStraight, standAt } from './motions';
import { refuse, type Run } from './run';

/**
 * Motions that one block may make; more is a slip of the pen (L or Q), and following it would take
 * unbounded time.
 */
const MOST_PARTS = 20_000;

/**
 * Carries out one block of a canned cycle (NISTIR 6556 3.5.16): every part of it is a motion of its own.
 * `u`, `v` and `w` are the axes of the selected plane and its depth axis.
 */
export function drill(run: Run, code: number, feed: number): void {
  const { machine, cycle } = run;
  if (refuseCombination(run, code)) return;
  const start = depthOf(run);
  const repeats = readCycleWords(run, code, start);
  if (repeats === 0) return;
  const { isAbsolute } = machine;
  const zero = depthBase(run);
  const retract = cycle.retract + (isAbsolute ? zero : start);
  const depth = cycle.depth + (isAbsolute ? zero : retract);
  if (!(depth <= retract))
    return refuse(
      run,
      'cycle-plane',
      { letters: 'R' },
      {
        code: codeName('G', code),
        retract: retract - zero,
        depth: depth - zero,
        by: depth - retract,
      },
    );
  const pecks = cycle.peck > 0 ? (retract - depth) / cycle.peck : 1;
  if (!(repeats * (pecks + 2) <= MOST_PARTS)) return refuseParts(run, code);
  if (start < retract) toDepth(run, retract, 'rapid', NaN);
  const clear = clearLevel(run, Math.max(start, retract), retract);
  for (let repeat = 0; repeat < repeats; repeat++) {
    overHole(run, repeat);
    if (depthOf(run) !== retract) toDepth(run, retract, 'rapid', NaN);
    drillHole(run, { code, retract, depth, clear, feed });
  }
}

/** What the published language forbids a cycle beside itself. */
function refuseCombination(run: Run, code: number): boolean {
  const { machine, block } = run;
  const what = codeName('G', code);
  let other = '';
  if (machine.compensation !== 'off') other = machine.compensation === 'left' ? 'G41' : 'G42';
  else if (machine.feedMode === 'inverse-time') other = 'G93';
  else if (block.has(LETTER.A)) other = 'A';
  if (other === '') return false;
  refuse(run, 'modal-conflict', { code: what }, { reason: 'in-cycle', what, other });
  return true;
}

function refuseParts(run: Run, code: number): void {
  refuse(
    run,
    'out-of-range-word',
    { letters: 'QL' },
    {
      letter: run.block.has(LETTER.Q) ? 'Q' : 'L',
      what: codeName('G', code),
      value: MOST_PARTS,
      needs: 'fewer-parts',
    },
  );
}

function clearLevel(run: Run, level: number, retract: number): number {
  if (run.machine.returnTo === 'G99') return retract;
  if (run.controller.switches.cycleReturn === 'line' || run.dialect.isStrict) return level;
  return Math.max(run.cycle.seriesLevel, retract);
}

interface Hole {
  readonly code: number;
  readonly retract: number;
  readonly depth: number;
  readonly clear: number;
  readonly feed: number;
}

function drillHole(run: Run, hole: Hole): void {
  const { depth, clear, feed, code } = hole;
  switch (code) {
    case 730:
    case 830:
      return peck(run, hole);
    case 870:
      return boreBackwards(run, hole);
    case 840:
    case 850:
    case 890:
      toDepth(run, depth, 'feed', feed);
      if (code === 890) dwell(run);
      return toDepth(run, clear, 'feed', feed);
    case 880:
      // The operator draws the tool out by hand; from here it stands at the clear level.
      toDepth(run, depth, 'feed', feed);
      dwell(run);
      run.tell.stop({ code: 'M0', place: run.machine.place({ code: 'G88' }) });
      return standAtDepth(run, clear);
    default:
      toDepth(run, depth, 'feed', feed);
      if (code === 820 || code === 860) dwell(run);
      return inHole(run, clear);
  }
}

/** G83 lifts to the clear level after every peck, G73 only backs off. */
function peck(run: Run, { code, retract, depth, clear, feed }: Hole): void {
  const { cycle, controller } = run;
  const backOff = controller.switches.peckBackOff;
  let level = retract - cycle.peck;
  for (; level > depth; level -= cycle.peck) {
    toDepth(run, level, 'feed', feed);
    if (code === 730) inHole(run, Math.min(level + backOff, retract));
    else {
      inHole(run, clear);
      inHole(run, Math.min(level + backOff, retract));
    }
  }
  toDepth(run, depth, 'feed', feed);
  inHole(run, clear);
}

function boreBackwards(run: Run, { depth, clear, feed }: Hole): void {
  const { cycle, machine } = run;
  const [u, v] = planePosition(run);
  const back = cycle.back + (machine.isAbsolute ? depthBase(run) : depth);
  overPoint(run, u + cycle.shiftU, v + cycle.shiftV);
  inHole(run, depth);
  overPoint(run, u, v);
  toDepth(run, back, 'feed', feed);
  toDepth(run, depth, 'feed', feed);
  overPoint(run, u + cycle.shiftU, v + cycle.shiftV);
  inHole(run, clear);
  overPoint(run, u, v);
}

function dwell(run: Run): void {
  const { cycle, controller } = run;
  if (Number.isNaN(cycle.dwell)) return;
  const seconds = controller.dwell === 'milliseconds' ? cycle.dwell / 1000 : cycle.dwell;
  run.tell.dwell({ seconds, by: 'cycle' });
}

/** A rapid that runs at least partly inside the hole that this cycle is drilling. */
function inHole(run: Run, level: number): void {
  run.motion.inHole = true;
  toDepth(run, level, 'rapid', NaN);
  run.motion.inHole = false;
}

function depthOf({ machine }: Run): number {
  const index = machine.planeIndex;
  return index === 0 ? machine.z : index === 1 ? machine.y : machine.x;
}
function depthBase({ machine }: Run): number {
  const index = machine.planeIndex;
  return index === 0 ? machine.baseZ : index === 1 ? machine.baseY : machine.baseX;
}
function planePosition({ machine }: Run): readonly [number, number] {
  const index = machine.planeIndex;
  if (index === 0) return [machine.x, machine.y];
  return index === 1 ? [machine.z, machine.x] : [machine.y, machine.z];
}

function toDepth(run: Run, level: number, kind: Motion['kind'], feed: number): void {
  const { target, machine } = run;
  standTarget(run);
  if (machine.planeIndex === 0) target.z = level;
  else if (machine.planeIndex === 1) target.y = level;
  else target.x = level;
  moveStraight(run, kind, 'cycle', target, feed);
}

function standAtDepth(run: Run, level: number): void {
  const { target, machine } = run;
  standTarget(run);
  if (machine.planeIndex === 0) target.z = level;
  else if (machine.planeIndex === 1) target.y = level;
  else target.x = level;
  standAt(run, target);
}

function overPoint(run: Run, u: number, v: number): void {
  const { target, machine } = run;
  standTarget(run);
  if (machine.planeIndex === 0) {
    target.x = u;
    target.y = v;
  } else if (machine.planeIndex === 1) {
    target.z = u;
    target.x = v;
  } else {
    target.y = u;
    target.z = v;
  }
  moveStraight(run, 'rapid', 'cycle', target, NaN);
}

/** To the hole that the block names; in G91 every repeat goes on by the same increments. */
function overHole(run: Run, repeat: number): void {
  const { block, machine, target } = run;
  const { isAbsolute, unit, planeIndex } = machine;
  if (isAbsolute && repeat > 0) return;
  standTarget(run);
  const depth = depthLetter(planeIndex);
  const axis = (letter: number, from: number, base: number) =>
    letter !== depth && block.has(letter)
      ? block.value(letter) * unit + (isAbsolute ? base : from)
      : from;
  target.x = axis(LETTER.X, machine.x, machine.baseX);
  target.y = axis(LETTER.Y, machine.y, machine.baseY);
  target.z = axis(LETTER.Z, machine.z, machine.baseZ);
  moveStraight(run, 'rapid', 'cycle', target, NaN);
}

function standTarget({ target, machine }: Run): void {
  target.x = machine.x;
  target.y = machine.y;
  target.z = machine.z;
  target.a = machine.a;
}

export const isCycle = (code: number): boolean => code === 730 || (810 <= code && code <= 890);
