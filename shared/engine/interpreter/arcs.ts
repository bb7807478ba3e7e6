import { LETTER } from '../blocks/block';
import { GROUP } from '../blocks/code-groups';
import type { Motion } from './events';
import { PLANES } from './machine';
import type { Circle, Target } from './kept';
import { standAt } from './motions';
import { refuse, tellProblem, type Run } from './run';
import { wholeNumber } from './whole-number';

const { I, J, K, P, R } = LETTER;
export const TURN = 2 * Math.PI;
const QUARTER = Math.PI / 2;
/**
 * NISTIR 6556: |R| may fall short of half the chord by this part of it, for rounding alone. Posts round a
 * semicircle to three decimals, so that other controllers allow their arc tolerance (common practice, no source).
 */
const CHORD_SLACK = 1e-12;
/** NISTIR 6556 3.5.3.2: the two radii may differ by 0.002 mm, or 0.0002 inch. */
const STRICT_TOLERANCE_MM = 0.002;
const STRICT_TOLERANCE_INCH = 0.0002 * 25.4;
/** Radii are compared after an addition and a root, so their last digits mean nothing. */
export const RADIUS_ROUNDING = 1e-9;

/** More turns in one block are a slip of the pen. */
const MOST_TURNS = 1_000;
const OTHER_USES_OF_P = (1 << GROUP.once) | (1 << GROUP.path) | (1 << GROUP.workOffset);

/** Sums of decimals part in their last digits; an end this close to the start is the start, mm. */
export const SAME_POINT = 1e-9;

/** Centre letters of each plane in plane order, the third that has no meaning there, and its axis letters. */
const CENTRES = [
  { u: I, v: J, other: K, ends: [LETTER.X, LETTER.Y] },
  { u: K, v: I, other: J, ends: [LETTER.Z, LETTER.X] },
  { u: J, v: K, other: I, ends: [LETTER.Y, LETTER.Z] },
] as const;

/**
 * Carries out G2 (`turning` −1) or G3 (+1). Where the arc cannot be worked out that is told, and the walk
 * goes on from its stated end.
 */
export function moveArc(run: Run, turning: 1 | -1, to: Target, feed: number): void {
  const { machine } = run;
  const index = machine.planeIndex;
  const fromU = index === 0 ? machine.x : index === 1 ? machine.z : machine.y;
  const fromV = index === 0 ? machine.y : index === 1 ? machine.x : machine.z;
  const toU = index === 0 ? to.x : index === 1 ? to.z : to.y;
  const toV = index === 0 ? to.y : index === 1 ? to.x : to.z;
  const circle = findCircle(run, turning, fromU, fromV, toU, toV);
  if (!circle) return standAt(run, to);
  tellArc(run, to, circle, arcTurn(run, turning, circle, fromU, fromV, toU, toV), feed);
}

/** Moves along an arc that is known, tells it, and stands at its end; `turn` in radians, > 0 counterclockwise. */
export function tellArc(run: Run, to: Target, circle: Circle, turn: number, feed: number): void {
  const { machine, motion } = run;
  const index = machine.planeIndex;
  const startU = (index === 0 ? machine.x : index === 1 ? machine.z : machine.y) - circle.u;
  const startV = (index === 0 ? machine.y : index === 1 ? machine.x : machine.z) - circle.v;
  const endU = (index === 0 ? to.x : index === 1 ? to.z : to.y) - circle.u;
  const endV = (index === 0 ? to.y : index === 1 ? to.x : to.z) - circle.v;
  motion.kind = 'arc';
  motion.by = 'program';
  motion.fromX = machine.x;
  motion.fromY = machine.y;
  motion.fromZ = machine.z;
  motion.fromA = machine.a;
  motion.toX = to.x;
  motion.toY = to.y;
  motion.toZ = to.z;
  motion.toA = to.a;
  motion.plane = PLANES[index]!;
  motion.centreU = circle.u;
  motion.centreV = circle.v;
  motion.radius = circle.radius;
  motion.turn = turn;
  setExtremes(motion, index, quartersPassed(turn, startU, startV, endU, endV));
  const depth = index === 0 ? to.z - machine.z : index === 1 ? to.y - machine.y : to.x - machine.x;
  const along = circle.radius * turn;
  motion.length = Math.sqrt(along * along + depth * depth);
  motion.moves = motion.length !== 0;
  motion.feed = machine.feedMode === 'inverse-time' ? feed * motion.length : feed;
  machine.x = to.x;
  machine.y = to.y;
  machine.z = to.z;
  machine.a = to.a;
  run.tell.motion(motion);
}

/** The angle from start to end on a circle, whole turns of a P word included; a full turn where they are one point. */
export function arcTurn(
  run: Run,
  turning: 1 | -1,
  circle: Circle,
  fromU: number,
  fromV: number,
  toU: number,
  toV: number,
): number {
  const isFull = Math.abs(toU - fromU) + Math.abs(toV - fromV) <= SAME_POINT;
  const turn = isFull
    ? turning * TURN
    : findTurn(turning, fromU - circle.u, fromV - circle.v, toU - circle.u, toV - circle.v);
  return run.block.has(P) && takesTurns(run) ? turn + turning * TURN * extraTurns(run) : turn;
}

/** Whether a P word beside an arc counts its turns: not in the published language, nor where P is of another code. */
export function takesTurns({ block, controller, dialect }: Run): boolean {
  if (dialect.isStrict || controller.language !== 'rs274ngc') return false;
  return (block.groups & OTHER_USES_OF_P) === 0;
}

/** A P word counts the turns begun, so that P1 adds none to what the end point says (common practice, no source). */
function extraTurns(run: Run): number {
  const { block } = run;
  const value = block.value(P);
  const begun = wholeNumber(value);
  if (begun >= 1 && begun <= MOST_TURNS) return begun - 1;
  const what = block.written(block.wordOf[P]!);
  const needs = Number.isNaN(begun) ? 'whole' : begun < 1 ? 'positive' : 'fewer';
  tellProblem(run, 'out-of-range-word', { letters: 'P' }, { letter: 'P', what, value, needs });
  return 0;
}

/** The angle from start to end in the direction of the arc, by one arc tangent of sine and cosine. */
export function findTurn(
  turning: 1 | -1,
  startU: number,
  startV: number,
  endU: number,
  endV: number,
): number {
  const turn = Math.atan2(startU * endV - startV * endU, startU * endU + startV * endV);
  if (turning > 0) return turn <= 0 ? turn + TURN : turn;
  return turn >= 0 ? turn - TURN : turn;
}

/** The circle of an arc as its words give it; undefined, and told, where they give none. */
export function findCircle(
  run: Run,
  turning: 1 | -1,
  fromU: number,
  fromV: number,
  toU: number,
  toV: number,
): Circle | undefined {
  const { block } = run;
  const { plane } = run.machine;
  const letters = CENTRES[run.machine.planeIndex]!;
  const hasCentre = block.has(letters.u) || block.has(letters.v);
  // Posts write the third centre word as nought on a helix; any other value is a slip of the plane.
  if (block.has(letters.other) && (run.dialect.isStrict || block.value(letters.other) !== 0)) {
    const what = String.fromCharCode(65 + letters.other);
    refuse(run, 'arc-impossible', { letters: 'IJK' }, { reason: 'centre-letter', what, plane });
    return undefined;
  }
  if (block.has(R) && hasCentre) {
    refuse(run, 'arc-impossible', { letters: 'IJKR' }, { reason: 'radius-and-centre' });
    return undefined;
  }
  if (run.dialect.isStrict && !letters.ends.some((letter) => block.has(letter))) {
    const code = run.machine.motionMode;
    refuse(run, 'missing-word', undefined, {
      code,
      letter: `${plane[0]} or ${plane[1]}`.toUpperCase(),
    });
    return undefined;
  }
  if (block.has(R)) return circleByRadius(run, turning, fromU, fromV, toU, toV);
  if (!hasCentre) {
    tellProblem(run, 'arc-centre-missing', undefined, { plane: run.machine.plane });
    return undefined;
  }
  return circleByCentre(run, fromU, fromV, toU, toV);
}

/** Math.hypot guards against overflow that no machine reaches, at several times the cost. */
const distance = (u: number, v: number): number => Math.sqrt(u * u + v * v);

function circleByCentre(
  run: Run,
  fromU: number,
  fromV: number,
  toU: number,
  toV: number,
): Circle | undefined {
  const { circle } = run;
  if (!placeCentre(run, fromU, fromV)) return undefined;
  const start = distance(fromU - circle.u, fromV - circle.v);
  const end = distance(toU - circle.u, toV - circle.v);
  circle.radius = start;
  if (start === 0) {
    tellProblem(run, 'arc-impossible', { letters: 'IJK' }, { reason: 'no-radius' });
    return undefined;
  }
  const difference = Math.abs(start - end);
  const tolerance = arcTolerance(run);
  if (!(difference <= tolerance + RADIUS_ROUNDING))
    tellProblem(
      run,
      'arc-radius-mismatch',
      { letters: 'XYZIJK' },
      {
        start,
        end,
        by: difference,
        tolerance,
      },
    );
  return circle;
}

/**
 * Puts the centre of `circle` where the centre words say; false, and told, where they do not say it. Counted from
 * program zero both are needed; counted from the start of the arc one left out is nought.
 */
export function placeCentre(run: Run, fromU: number, fromV: number): boolean {
  const { block, machine, circle } = run;
  const letters = CENTRES[machine.planeIndex]!;
  const { unit } = machine;
  const wordU = block.has(letters.u) ? block.value(letters.u) * unit : 0;
  const wordV = block.has(letters.v) ? block.value(letters.v) * unit : 0;
  if (!machine.isArcCentreAbsolute) {
    circle.u = fromU + wordU;
    circle.v = fromV + wordV;
    return true;
  }
  if (!block.has(letters.u) || !block.has(letters.v)) {
    tellProblem(run, 'arc-centre-missing', undefined, { plane: machine.plane, reason: 'one-word' });
    return false;
  }
  const index = machine.planeIndex;
  circle.u = wordU + (index === 0 ? machine.baseX : index === 1 ? machine.baseZ : machine.baseY);
  circle.v = wordV + (index === 0 ? machine.baseY : index === 1 ? machine.baseX : machine.baseZ);
  return true;
}

export function arcTolerance(run: Run): number {
  if (!run.controller.switches.strict) return run.controller.arcTolerance;
  return run.machine.unit === 1 ? STRICT_TOLERANCE_MM : STRICT_TOLERANCE_INCH;
}

function circleByRadius(
  run: Run,
  turning: 1 | -1,
  fromU: number,
  fromV: number,
  toU: number,
  toV: number,
): Circle | undefined {
  const { circle } = run;
  const radius = run.block.value(R) * run.machine.unit;
  const du = toU - fromU;
  const dv = toV - fromV;
  const chord = distance(du, dv);
  if (chord === 0 || radius === 0) {
    tellProblem(
      run,
      'arc-impossible',
      { letters: 'R' },
      {
        reason: chord === 0 ? 'ends-where-it-starts' : 'no-radius',
      },
    );
    return undefined;
  }
  const half = chord / 2;
  const size = Math.abs(radius);
  const slack = run.dialect.isStrict ? half * CHORD_SLACK : arcTolerance(run) + RADIUS_ROUNDING;
  if (size < half - slack) {
    tellProblem(
      run,
      'arc-impossible',
      { letters: 'R' },
      {
        reason: 'radius-short',
        radius: size,
        halfChord: half,
        short: half - size,
      },
    );
    return undefined;
  }
  const toCentre = Math.sqrt(Math.max(0, size * size - half * half));
  // Left of the chord for a short counterclockwise arc; a clockwise or a long one swaps sides.
  const side = turning * Math.sign(radius);
  circle.u = fromU + du / 2 - (side * toCentre * dv) / chord;
  circle.v = fromV + dv / 2 + (side * toCentre * du) / chord;
  circle.radius = Math.max(size, half);
  return circle;
}

/** 0 to 3 from the positive first axis on, each holding the axis it begins with. */
function quarterOf(u: number, v: number): number {
  if (v >= 0) return u > 0 ? 0 : v > 0 ? 1 : 2;
  return u < 0 ? 2 : 3;
}

/**
 * Which of the four quadrant points an arc passes, bit 0 for the one on the positive first axis, bit 1 on
 * the positive second, and so on. An end that lies on one may count; it is an end of the arc anyway.
 */
export function quartersPassed(
  turn: number,
  startU: number,
  startV: number,
  endU: number,
  endV: number,
): number {
  const isCounter = turn > 0;
  const first = isCounter ? quarterOf(startU, startV) : quarterOf(endU, endV);
  const last = isCounter ? quarterOf(endU, endV) : quarterOf(startU, startV);
  let crossed = (last - first) & 3;
  // Back in the quarter it began in: either it never left, or it went all the way round.
  if (crossed === 0 && Math.abs(turn) > QUARTER) crossed = 4;
  let passed = 0;
  if (Math.abs(turn) >= TURN) crossed = 4;
  for (let quarter = first + 1; quarter <= first + crossed; quarter++) passed |= 1 << (quarter & 3);
  return passed;
}

/** True extremes: both ends and every quadrant point that the arc passes. */
export function setExtremes(motion: Motion, index: number, passed: number): void {
  const { centreU, centreV, radius, fromX, fromY, fromZ, toX, toY, toZ } = motion;
  motion.minX = fromX < toX ? fromX : toX;
  motion.maxX = fromX < toX ? toX : fromX;
  motion.minY = fromY < toY ? fromY : toY;
  motion.maxY = fromY < toY ? toY : fromY;
  motion.minZ = fromZ < toZ ? fromZ : toZ;
  motion.maxZ = fromZ < toZ ? toZ : fromZ;
  if (passed & 1) widenU(motion, index, centreU + radius);
  if (passed & 2) widenV(motion, index, centreV + radius);
  if (passed & 4) widenU(motion, index, centreU - radius);
  if (passed & 8) widenV(motion, index, centreV - radius);
}

function widenU(motion: Motion, index: number, value: number): void {
  if (index === 0) widenX(motion, value);
  else if (index === 1) widenZ(motion, value);
  else widenY(motion, value);
}
function widenV(motion: Motion, index: number, value: number): void {
  if (index === 0) widenY(motion, value);
  else if (index === 1) widenX(motion, value);
  else widenZ(motion, value);
}
function widenX(motion: Motion, x: number): void {
  if (x < motion.minX) motion.minX = x;
  if (x > motion.maxX) motion.maxX = x;
}
function widenY(motion: Motion, y: number): void {
  if (y < motion.minY) motion.minY = y;
  if (y > motion.maxY) motion.maxY = y;
}
function widenZ(motion: Motion, z: number): void {
  if (z < motion.minZ) motion.minZ = z;
  if (z > motion.maxZ) motion.maxZ = z;
}
