import { Kept, PlainLines, Seen } from '../../lexer/plain-lines';
import { findTurn, quartersPassed, RADIUS_ROUNDING, SAME_POINT, setExtremes, TURN } from '../arcs';
import { SETTING } from '../machine';
import type { Motion } from '../events';
import type { Run } from '../run';
import { handOver, Open, openSeconds } from './pace';
import type { QuietWatch } from './quiet-watch';

const enum Here {
  /** Where the head stands, and where the line leads: machine mm. */
  x,
  y,
  z,
  toX,
  toY,
  toZ,
  /** In force, and of the line at hand, mm/min; and what follows from it: min/mm, mm/s, s/mm. */
  feed,
  newFeed,
  perFeed,
  speed,
  perSpeed,
  /** Reached by straight feed motion. */
  lowX,
  highX,
  lowY,
  highY,
  lowZ,
  highZ,
  /** The room in which feed motion is quiet. */
  minX,
  maxX,
  minY,
  maxY,
  minZ,
  maxZ,
  unit,
  baseX,
  baseY,
  baseZ,
  /** Of the arc at hand, machine mm. */
  centreU,
  centreV,
  length,
  /** Its direction where it starts and where it ends, of length 1; its rise is the same all along. */
  startX,
  startY,
  endX,
  endY,
  up,
  arcTolerance,
  greatestFeed,
  minutes,
  mostMinutes,
  feedLength,
  /** One over the accelerations. */
  slowX,
  slowY,
  slowZ,
  count,
}

/**
 * Carries out quiet lines: plain ones whose motion no rule is curious about (see Quiet). It does what the
 * interpreter would do with them, and leaves the first line that is anything else, or whose motion is not
 * quiet, to it. Its steps are short on purpose: the just-in-time compiler took longer over one loop that
 * did all of it, with everything in local variables, than over a million lines.
 */
export class QuietLines {
  /** What the last call has read: lines, those of them with words, and which of them was the last written on. */
  lines = 0;
  blocks = 0;
  lastWritten = 0;
  private readonly plain = new PlainLines();
  /** The line of those read ahead that comes next. */
  private next = 0;
  private readonly longest: number;
  /** The figures of the motion at hand. An array, so that they stay unboxed from line to line. */
  private readonly here = new Float64Array(Here.count);
  /** Lines behind the ones now read. */
  private firstLine = 0;
  private isAbsolute = true;
  private isBlended = true;
  private isArcReadable = false;
  private isFeedQuiet = false;
  /** Whether the head stands where feed motion is quiet. */
  private isInFeedRoom = false;
  /** Motion code in force. */
  private mode = 0;
  private motions = 0;
  private isFollowed = false;
  private paceState = new Float64Array(0);

  constructor(
    private readonly run: Run,
    private readonly watch: QuietWatch,
  ) {
    this.longest = run.controller.longestBlock;
  }

  /** Whatever was read ahead is no more: its bytes may be others now. */
  forget(): void {
    this.plain.count = this.next = 0;
  }

  /** Whether the machine stands so that lines can be quiet at all. */
  isOpen(): boolean {
    const { run, watch } = this;
    const { machine } = run;
    return (
      watch.isPossible &&
      (machine.motionCode === 0 ||
        machine.motionCode === 10 ||
        machine.motionCode === 20 ||
        machine.motionCode === 30) &&
      machine.unsetAxes === 0 &&
      machine.isSet(SETTING.distance) &&
      machine.feedMode === 'per-minute' &&
      machine.compensation === 'off' &&
      !machine.isOffset &&
      run.loneMachineMove === undefined &&
      run.unknown === undefined &&
      run.dialect.increment === 0 &&
      !run.dialect.isStrict &&
      watch.refresh()
    );
  }

  /**
   * Reads from `at` on, where `firstLine` lines lie behind, and returns where the first line begins that it
   * leaves. The text ends with a line end.
   */
  read(bytes: Uint8Array, at: number, end: number, firstLine: number): number {
    const { plain } = this;
    this.lines = this.blocks = this.lastWritten = 0;
    for (;;) {
      this.findNext(at);
      if (this.next === plain.count) {
        plain.read(bytes, at, end);
        this.next = 0;
        if (plain.count === 0) return at;
      }
      this.carryOut(firstLine);
      at = plain.starts[this.next]!;
      if (this.next < plain.count || at >= end) return at;
    }
  }

  /** Lines read ahead stay good while others are carried out elsewhere. */
  private findNext(at: number): void {
    const { starts, count } = this.plain;
    while (this.next < count && starts[this.next]! < at) this.next++;
    if (this.next < count && starts[this.next] !== at) this.next = count;
  }

  private carryOut(firstLine: number): void {
    this.enter(firstLine);
    this.takeLines();
    this.leave();
  }

  /** Takes over how the machine stands, and what is quiet. */
  private enter(firstLine: number): void {
    const { run, watch, here } = this;
    const { machine } = run;
    const { quiet, pace, stretch } = watch;
    const { feed: room } = quiet;
    const { slownesses, slowestFeed } = pace!;
    this.firstLine = firstLine;
    this.isAbsolute = machine.isAbsolute;
    this.isBlended = machine.path === 'G64';
    this.isArcReadable = quiet.hasArcs && machine.planeIndex === 0 && !machine.isArcCentreAbsolute;
    this.mode = machine.motionCode;
    this.motions = 0;
    here[Here.x] = machine.x;
    here[Here.y] = machine.y;
    here[Here.z] = machine.z;
    here[Here.unit] = machine.unit;
    here[Here.baseX] = machine.baseX;
    here[Here.baseY] = machine.baseY;
    here[Here.baseZ] = machine.baseZ;
    here[Here.arcTolerance] = run.controller.arcTolerance + RADIUS_ROUNDING;
    here[Here.greatestFeed] = Math.min(quiet.greatestFeed, slowestFeed * 60);
    here[Here.mostMinutes] = quiet.feedMinutes;
    here[Here.minutes] = stretch.feedMinutes;
    here[Here.feedLength] = stretch.feedLength;
    here[Here.slowX] = slownesses.x;
    here[Here.slowY] = slownesses.y;
    here[Here.slowZ] = slownesses.z;
    here[Here.minX] = room.minX;
    here[Here.minY] = room.minY;
    here[Here.minZ] = room.minZ;
    here[Here.maxX] = room.maxX;
    here[Here.maxY] = room.maxY;
    here[Here.maxZ] = room.maxZ;
    here[Here.lowX] = here[Here.lowY] = here[Here.lowZ] = Infinity;
    here[Here.highX] = here[Here.highY] = here[Here.highZ] = -Infinity;
    this.isInFeedRoom = this.isFeedRoom(machine.x, machine.y, machine.z);
    this.isFollowed = watch.followers.length > 0;
    this.paceState = pace!.state;
    this.setFeed(machine.feed);
    here[Here.feed] = machine.feed;
  }

  /** Hands back how the machine stands, and what was gathered. */
  private leave(): void {
    const { run, watch, here, isAbsolute, mode } = this;
    const { machine } = run;
    const { stretch } = watch;
    machine.x = here[Here.x]!;
    machine.y = here[Here.y]!;
    machine.z = here[Here.z]!;
    machine.feed = here[Here.feed]!;
    machine.motionCode = mode;
    machine.isAbsolute = isAbsolute;
    stretch.motions += this.motions;
    stretch.feedLength = here[Here.feedLength]!;
    stretch.feedMinutes = here[Here.minutes]!;
    stretch.widen(
      here[Here.lowX]!,
      here[Here.lowY]!,
      here[Here.lowZ]!,
      here[Here.highX]!,
      here[Here.highY]!,
      here[Here.highZ]!,
    );
  }

  /** Carries out the lines that were read ahead, up to the first that is not quiet. */
  private takeLines(): void {
    const { plain, longest } = this;
    const { starts, ends, count } = plain;
    let line = this.next;
    for (; line < count; line++) {
      let seen = plain.seen[line]!;
      if (ends[line]! - starts[line]! > longest) break;
      if ((seen & Seen.comment) !== 0) {
        if (!this.isQuietComment(line)) break;
        seen &= ~Seen.comment;
      }
      if (seen === 0) {
        this.lines++;
        // Blanks or a comment alone are a line that is written on.
        if (ends[line]! > starts[line]!) this.lastWritten = this.lines;
        continue;
      }
      let code = this.mode;
      if ((seen & Seen.code) !== 0) code = plain.codes[line]! * 10;
      if (code > 30) {
        if (!this.takesDistance(line, code, seen)) break;
        continue;
      }
      if ((seen & Seen.feed) !== 0) {
        const feed = plain.values[line * Kept.count + Kept.feed]! * this.here[Here.unit]!;
        if (!(feed > 0)) break;
        this.setFeed(feed);
      }
      if ((seen & Seen.axes) !== 0) {
        this.aim(line, seen);
        if (!this.moves(line, code, seen)) break;
      }
      // A feed or a line number alone is quiet; a code or a centre without an axis is not.
      else if ((seen & ~(Seen.feed | Seen.number)) !== 0) break;
      this.blocks++;
      this.lastWritten = ++this.lines;
      if ((seen & Seen.feed) !== 0) this.keepFeed(line);
      if (code !== this.mode) {
        this.mode = code;
        this.note(SETTING.motionMode, plain.codeFrom[line]!, plain.codeTo[line]!);
      }
    }
    this.next = line;
  }

  private isQuietComment(line: number): boolean {
    const { plain, watch } = this;
    return watch.isQuietComment(plain.bytes, plain.commentFrom[line]!, plain.commentTo[line]!);
  }

  /** G90 and G91 alone, as posts write them around an incremental stretch. */
  private takesDistance(line: number, code: number, seen: number): boolean {
    if ((code !== 900 && code !== 910) || (seen & ~(Seen.code | Seen.number)) !== 0) return false;
    const { plain } = this;
    this.blocks++;
    this.lastWritten = ++this.lines;
    if ((code === 900) === this.isAbsolute) return true;
    this.isAbsolute = code === 900;
    this.note(SETTING.distance, plain.codeFrom[line]!, plain.codeTo[line]!);
    return true;
  }

  private setFeed(feed: number): void {
    const { here } = this;
    here[Here.newFeed] = feed;
    here[Here.perFeed] = 1 / feed;
    here[Here.speed] = feed / 60;
    here[Here.perSpeed] = 60 / feed;
    this.isFeedQuiet = 0 < feed && feed <= here[Here.greatestFeed]!;
  }

  private keepFeed(line: number): void {
    const { here, plain } = this;
    if (here[Here.newFeed] === here[Here.feed]) return;
    here[Here.feed] = here[Here.newFeed]!;
    this.note(SETTING.feed, plain.feedFrom[line]!, plain.feedTo[line]!);
  }

  /** Notes which word of the line just counted set a mode. */
  private note(setting: number, from: number, to: number): void {
    this.run.machine.noteSetAt(setting, this.firstLine + this.lines, from, to);
  }

  private isFeedRoom(x: number, y: number, z: number): boolean {
    const { minX, minY, minZ, maxX, maxY, maxZ } = this.watch.quiet.feed;
    return minX <= x && x <= maxX && minY <= y && y <= maxY && minZ <= z && z <= maxZ;
  }

  /** Works out where the axis words of a line lead. */
  private aim(line: number, seen: number): void {
    const { here, isAbsolute } = this;
    const { values } = this.plain;
    const at = line * Kept.count;
    const unit = here[Here.unit]!;
    const x = here[Here.x]!;
    const y = here[Here.y]!;
    const z = here[Here.z]!;
    let toX = x;
    let toY = y;
    let toZ = z;
    if ((seen & Seen.x) !== 0)
      toX = values[at + Kept.x]! * unit + (isAbsolute ? here[Here.baseX]! : x);
    if ((seen & Seen.y) !== 0)
      toY = values[at + Kept.y]! * unit + (isAbsolute ? here[Here.baseY]! : y);
    if ((seen & Seen.z) !== 0)
      toZ = values[at + Kept.z]! * unit + (isAbsolute ? here[Here.baseZ]! : z);
    here[Here.toX] = toX;
    here[Here.toY] = toY;
    here[Here.toZ] = toZ;
  }

  /** Takes the motion of a line; false where it is not quiet. */
  private moves(line: number, code: number, seen: number): boolean {
    const hasCentre = (seen & Seen.centre) !== 0;
    if (code === 10) return !hasCentre && this.feeds();
    if (code === 0) return !hasCentre && this.rapids();
    if (!hasCentre || !this.isArcReadable || !this.isFeedQuiet) return false;
    const { here, plain } = this;
    const at = line * Kept.count;
    const unit = here[Here.unit]!;
    const i = (seen & Seen.i) === 0 ? 0 : plain.values[at + Kept.i]! * unit;
    const j = (seen & Seen.j) === 0 ? 0 : plain.values[at + Kept.j]! * unit;
    here[Here.centreU] = here[Here.x]! + i;
    here[Here.centreV] = here[Here.y]! + j;
    return this.bends(code === 20 ? -1 : 1);
  }

  /** Takes the motion as a straight one at feed; false where it is not quiet. */
  private feeds(): boolean {
    const { here } = this;
    if (!this.isInFeedRoom || !this.isFeedQuiet) return false;
    const x = here[Here.x]!;
    const y = here[Here.y]!;
    const z = here[Here.z]!;
    const toX = here[Here.toX]!;
    const toY = here[Here.toY]!;
    const toZ = here[Here.toZ]!;
    if (!(here[Here.minX]! <= toX && toX <= here[Here.maxX]!)) return false;
    if (!(here[Here.minY]! <= toY && toY <= here[Here.maxY]!)) return false;
    if (!(here[Here.minZ]! <= toZ && toZ <= here[Here.maxZ]!)) return false;
    const dx = toX - x;
    const dy = toY - y;
    const dz = toZ - z;
    const length = Math.sqrt(dx * dx + dy * dy + dz * dz);
    if (length === 0) return true;
    const minutes = here[Here.minutes]! + length * here[Here.perFeed]!;
    if (!(minutes < here[Here.mostMinutes]!)) return false;
    here[Here.minutes] = minutes;
    here[Here.feedLength]! += length;
    this.motions++;
    if (toX < here[Here.lowX]!) here[Here.lowX] = toX;
    if (toX > here[Here.highX]!) here[Here.highX] = toX;
    if (toY < here[Here.lowY]!) here[Here.lowY] = toY;
    if (toY > here[Here.highY]!) here[Here.highY] = toY;
    if (toZ < here[Here.lowZ]!) here[Here.lowZ] = toZ;
    if (toZ > here[Here.highZ]!) here[Here.highZ] = toZ;
    here[Here.x] = toX;
    here[Here.y] = toY;
    here[Here.z] = toZ;
    // Pace.followLine for a feed that no axis limits, in place: a call would box every figure.
    const { paceState: state } = this;
    const speed = here[Here.speed]!;
    const part = 1 / length;
    const alongX = dx * part;
    const alongY = dy * part;
    const alongZ = dz * part;
    const handed = this.isBlended ? handOver(state, alongX, alongY, alongZ, speed) : 0;
    if (state[Open.length] !== 0) state[Open.seconds]! += openSeconds(state, handed);
    const slowX = Math.abs(alongX) * here[Here.slowX]!;
    const slowY = Math.abs(alongY) * here[Here.slowY]!;
    const slowZ = Math.abs(alongZ) * here[Here.slowZ]!;
    const slower = slowX > slowY ? slowX : slowY;
    const slowness = slower > slowZ ? slower : slowZ;
    state[Open.length] = length;
    state[Open.enter] = handed < speed ? handed : speed;
    state[Open.speed] = speed;
    state[Open.perSpeed] = here[Here.perSpeed]!;
    state[Open.slowness] = slowness;
    state[Open.acceleration] = 1 / slowness;
    state[Open.endX] = alongX;
    state[Open.endY] = alongY;
    state[Open.endZ] = alongZ;
    if (this.isFollowed) this.showFeed(x, y, z);
    return true;
  }

  /** Takes the motion as an arc in the XY plane about the centre; false where it is not quiet. */
  private bends(turning: 1 | -1): boolean {
    const { here } = this;
    const x = here[Here.x]!;
    const y = here[Here.y]!;
    const z = here[Here.z]!;
    const toX = here[Here.toX]!;
    const toY = here[Here.toY]!;
    const toZ = here[Here.toZ]!;
    const centreU = here[Here.centreU]!;
    const centreV = here[Here.centreV]!;
    const startU = x - centreU;
    const startV = y - centreV;
    const endU = toX - centreU;
    const endV = toY - centreV;
    const startSquare = startU * startU + startV * startV;
    const endSquare = endU * endU + endV * endV;
    const radius = Math.sqrt(startSquare);
    const difference = Math.abs(radius - Math.sqrt(endSquare));
    if (radius === 0 || !(difference <= here[Here.arcTolerance]!)) return false;
    const isFull = Math.abs(toX - x) + Math.abs(toY - y) <= SAME_POINT;
    const turn = isFull ? turning * TURN : findTurn(turning, startU, startV, endU, endV);
    const passed = quartersPassed(turn, startU, startV, endU, endV);
    let minX = x < toX ? x : toX;
    let maxX = x < toX ? toX : x;
    let minY = y < toY ? y : toY;
    let maxY = y < toY ? toY : y;
    const minZ = z < toZ ? z : toZ;
    const maxZ = z < toZ ? toZ : z;
    if ((passed & 1) !== 0 && centreU + radius > maxX) maxX = centreU + radius;
    if ((passed & 2) !== 0 && centreV + radius > maxY) maxY = centreV + radius;
    if ((passed & 4) !== 0 && centreU - radius < minX) minX = centreU - radius;
    if ((passed & 8) !== 0 && centreV - radius < minY) minY = centreV - radius;
    if (!(here[Here.minX]! <= minX && maxX <= here[Here.maxX]!)) return false;
    if (!(here[Here.minY]! <= minY && maxY <= here[Here.maxY]!)) return false;
    if (!(here[Here.minZ]! <= minZ && maxZ <= here[Here.maxZ]!)) return false;
    const around = Math.abs(radius * turn);
    const rise = toZ - z;
    const square = around * around + rise * rise;
    const length = Math.sqrt(square);
    const minutes = here[Here.minutes]! + length * here[Here.perFeed]!;
    if (!(minutes < here[Here.mostMinutes]!)) return false;
    here[Here.minutes] = minutes;
    here[Here.feedLength]! += length;
    this.motions++;
    this.isInFeedRoom = true;
    // Where it goes itself: its end, and what it bulges past its start.
    minX = minX === x && x < toX ? toX : minX;
    minY = minY === y && y < toY ? toY : minY;
    maxX = maxX === x && toX < x ? toX : maxX;
    maxY = maxY === y && toY < y ? toY : maxY;
    if (minX < here[Here.lowX]!) here[Here.lowX] = minX;
    if (maxX > here[Here.highX]!) here[Here.highX] = maxX;
    if (minY < here[Here.lowY]!) here[Here.lowY] = minY;
    if (maxY > here[Here.highY]!) here[Here.highY] = maxY;
    if (toZ < here[Here.lowZ]!) here[Here.lowZ] = toZ;
    if (toZ > here[Here.highZ]!) here[Here.highZ] = toZ;
    const along = turn < 0 ? -around : around;
    const atStart = along / Math.sqrt(startSquare * square);
    const atEnd = along / Math.sqrt(endSquare * square);
    here[Here.length] = length;
    here[Here.up] = rise / length;
    here[Here.startX] = -startV * atStart;
    here[Here.startY] = startU * atStart;
    here[Here.endX] = -endV * atEnd;
    here[Here.endY] = endU * atEnd;
    this.timeArc();
    here[Here.x] = toX;
    here[Here.y] = toY;
    here[Here.z] = toZ;
    if (this.isFollowed) this.showArc(x, y, z, turn, radius);
    return true;
  }

  /** Pace.followArc for a feed that no axis limits; its tangents are those of arcTangent. */
  private timeArc(): void {
    const { here, paceState: state } = this;
    const speed = here[Here.speed]!;
    const up = here[Here.up]!;
    const handed = this.isBlended
      ? handOver(state, here[Here.startX]!, here[Here.startY]!, up, speed)
      : 0;
    if (state[Open.length] !== 0) state[Open.seconds]! += openSeconds(state, handed);
    const slowX = here[Here.slowX]!;
    const slowY = here[Here.slowY]!;
    const slowness = slowX > slowY ? slowX : slowY;
    state[Open.length] = here[Here.length]!;
    state[Open.enter] = handed < speed ? handed : speed;
    state[Open.speed] = speed;
    state[Open.perSpeed] = here[Here.perSpeed]!;
    state[Open.slowness] = slowness;
    state[Open.acceleration] = 1 / slowness;
    state[Open.endX] = here[Here.endX]!;
    state[Open.endY] = here[Here.endY]!;
    state[Open.endZ] = up;
  }

  /** Tells those who follow quiet motion of the arc that led here. */
  private showArc(fromX: number, fromY: number, fromZ: number, turn: number, radius: number): void {
    const { here } = this;
    const { motion } = this.run;
    this.placeMotion(fromX, fromY, fromZ);
    const { toX, toY } = motion;
    const centreU = here[Here.centreU]!;
    const centreV = here[Here.centreV]!;
    motion.kind = 'arc';
    motion.by = 'program';
    motion.plane = 'xy';
    motion.centreU = centreU;
    motion.centreV = centreV;
    motion.radius = radius;
    motion.turn = turn;
    motion.moves = true;
    motion.feed = here[Here.newFeed]!;
    const passed = quartersPassed(
      turn,
      fromX - centreU,
      fromY - centreV,
      toX - centreU,
      toY - centreV,
    );
    setExtremes(motion, 0, passed);
    const along = radius * turn;
    const rise = motion.toZ - fromZ;
    motion.length = Math.sqrt(along * along + rise * rise);
    this.tellFollowers();
  }

  private placeMotion(fromX: number, fromY: number, fromZ: number): void {
    const { here } = this;
    const { motion } = this.run;
    motion.fromX = fromX;
    motion.fromY = fromY;
    motion.fromZ = fromZ;
    motion.toX = here[Here.toX]!;
    motion.toY = here[Here.toY]!;
    motion.toZ = here[Here.toZ]!;
  }

  /** Tells those who follow quiet motion of the straight one that led here. */
  private showFeed(fromX: number, fromY: number, fromZ: number): void {
    const { motion } = this.run;
    this.placeMotion(fromX, fromY, fromZ);
    motion.feed = this.here[Here.newFeed]!;
    setStraight(motion, 'feed');
    this.tellFollowers();
  }

  private rapids(): boolean {
    const { here } = this;
    const { motion } = this.run;
    this.placeMotion(here[Here.x]!, here[Here.y]!, here[Here.z]!);
    if (!this.moveAtRapid()) return false;
    here[Here.x] = motion.toX;
    here[Here.y] = motion.toY;
    here[Here.z] = motion.toZ;
    this.isInFeedRoom = this.isFeedRoom(motion.toX, motion.toY, motion.toZ);
    if (!motion.moves) return true;
    this.motions++;
    if (this.isFollowed) this.tellFollowers();
    return true;
  }

  /** Takes the motion as a rapid; false where it is not quiet. */
  private moveAtRapid(): boolean {
    const { quiet, stretch, pace } = this.watch;
    const { motion } = this.run;
    const { fromX, fromY, fromZ, toX, toY, toZ } = motion;
    const { minX, minY, minZ, maxX, maxY, maxZ } = quiet.rapid;
    if (!(minX <= toX && toX <= maxX && minY <= toY && toY <= maxY)) return false;
    if (!(minZ <= toZ && toZ <= maxZ)) return false;
    const isLift = fromX === toX && fromY === toY && fromZ <= toZ;
    if (!isLift) {
      if (!(minX <= fromX && fromX <= maxX && minY <= fromY && fromY <= maxY)) return false;
      if (!(minZ <= fromZ && fromZ <= maxZ)) return false;
    }
    setStraight(motion, 'rapid');
    motion.feed = NaN;
    if (!motion.moves) return true;
    pace!.rapid(motion);
    stretch.take(motion);
    return true;
  }

  private tellFollowers(): void {
    const { machine, motion } = this.run;
    machine.line = this.firstLine + this.lines + 1;
    for (const follow of this.watch.followers) follow(motion, machine);
  }
}

/** Completes a motion whose ends are known as a straight one. */
function setStraight(motion: Motion, kind: 'rapid' | 'feed'): void {
  const { fromX, fromY, fromZ, toX, toY, toZ } = motion;
  motion.kind = kind;
  motion.by = 'program';
  motion.minX = fromX < toX ? fromX : toX;
  motion.maxX = fromX < toX ? toX : fromX;
  motion.minY = fromY < toY ? fromY : toY;
  motion.maxY = fromY < toY ? toY : fromY;
  motion.minZ = fromZ < toZ ? fromZ : toZ;
  motion.maxZ = fromZ < toZ ? toZ : fromZ;
  const dx = toX - fromX;
  const dy = toY - fromY;
  const dz = toZ - fromZ;
  motion.length = Math.sqrt(dx * dx + dy * dy + dz * dz);
  motion.moves = motion.length !== 0;
}
