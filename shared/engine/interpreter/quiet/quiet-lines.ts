import { Kept, PlainLines, Seen } from '../../lexer/plain-lines';
import { findTurn, quartersPassed, RADIUS_ROUNDING, SAME_POINT, setExtremes, TURN } from '../arcs';
import { SETTING } from '../machine';
import type { Motion } from '../events';
import type { Run } from '../run';
import { handOver, Open, openSeconds } from './pace';
import type { QuietWatch } from './quiet-watch';

/**
 * Carries out quiet lines: plain ones whose motion no rule is curious about (see Quiet). It does what the
 * interpreter would do with them, with everything that stays the same from block to block in local
 * variables, and leaves the first line that is anything else, or whose motion is not quiet, to it.
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
    const { run, watch, plain, longest } = this;
    const { machine, motion } = run;
    const { quiet, stretch } = watch;
    const pace = watch.pace!;
    const { state: paceState, slownesses } = pace;
    const { x: slowX, y: slowY, z: slowZ } = slownesses;
    const { unit, baseX, baseY, baseZ } = machine;
    const isBlended = machine.path === 'G64';
    const isArcReadable = quiet.hasArcs && machine.planeIndex === 0 && !machine.isArcCentreAbsolute;
    const { feedMinutes: mostMinutes } = quiet;
    const greatestFeed = Math.min(quiet.greatestFeed, pace.slowestFeed * 60);
    const { minX, minY, minZ, maxX, maxY, maxZ } = quiet.feed;
    const isFollowed = watch.followers.length > 0;
    let { x, y, z, feed } = machine;
    let perFeed = 1 / feed;
    let speed = feed / 60;
    let perSpeed = 60 / feed;
    let isFeedQuiet = 0 < feed && feed <= greatestFeed;
    let { isAbsolute } = machine;
    let mode = machine.motionCode;
    let { motions, feedLength, feedMinutes } = stretch;
    let lowX = Infinity;
    let lowY = Infinity;
    let lowZ = Infinity;
    let highX = -Infinity;
    let highY = -Infinity;
    let highZ = -Infinity;
    let isInFeedRoom = minX <= x && x <= maxX && minY <= y && y <= maxY && minZ <= z && z <= maxZ;
    let { lines, blocks, lastWritten } = this;
    let feedLine = 0;
    let feedFrom = 0;
    let feedTo = 0;
    let distanceLine = 0;
    let distanceFrom = 0;
    let distanceTo = 0;
    let modeLine = 0;
    let modeFrom = 0;
    let modeTo = 0;

    const { starts, ends, codes, values, codeFrom, codeTo } = plain;
    let line = this.next;
    for (; line < plain.count; line++) {
      const seen = plain.seen[line]!;
      if (ends[line]! - starts[line]! > longest) break;
      if (seen === 0) {
        lines++;
        // Blanks alone are a line that is written on.
        if (ends[line]! > starts[line]!) lastWritten = lines;
        continue;
      }
      let code = mode;
      if ((seen & Seen.code) !== 0) {
        code = codes[line]! * 10;
        if (code > 30) {
          // G90 and G91 alone, as posts write them around an incremental stretch.
          if ((code !== 900 && code !== 910) || (seen & ~(Seen.code | Seen.number)) !== 0) break;
          lines++;
          blocks++;
          lastWritten = lines;
          if ((code === 900) !== isAbsolute) {
            isAbsolute = code === 900;
            distanceLine = lines;
            distanceFrom = codeFrom[line]!;
            distanceTo = codeTo[line]!;
          }
          continue;
        }
      }
      const at = line * Kept.count;
      let newFeed = feed;
      if ((seen & Seen.feed) !== 0) {
        newFeed = values[at + Kept.feed]! * unit;
        if (!(newFeed > 0)) break;
        perFeed = 1 / newFeed;
        speed = newFeed / 60;
        perSpeed = 60 / newFeed;
        isFeedQuiet = newFeed <= greatestFeed;
      }
      if ((seen & Seen.axes) === 0) {
        // A feed alone is quiet; a code or a centre without an axis is not.
        if ((seen & ~(Seen.feed | Seen.number)) !== 0 || (seen & Seen.feed) === 0) break;
      } else {
        const toX =
          (seen & Seen.x) === 0 ? x : values[at + Kept.x]! * unit + (isAbsolute ? baseX : x);
        const toY =
          (seen & Seen.y) === 0 ? y : values[at + Kept.y]! * unit + (isAbsolute ? baseY : y);
        const toZ =
          (seen & Seen.z) === 0 ? z : values[at + Kept.z]! * unit + (isAbsolute ? baseZ : z);
        if (code === 10) {
          if ((seen & Seen.centre) !== 0 || !isInFeedRoom || !isFeedQuiet) break;
          // Most points lie among those before, which are in the room.
          if (!(lowX <= toX && toX <= highX && lowY <= toY && toY <= highY)) {
            if (!(minX <= toX && toX <= maxX && minY <= toY && toY <= maxY)) break;
          }
          if (!(minZ <= toZ && toZ <= maxZ)) break;
          const dx = toX - x;
          const dy = toY - y;
          const dz = toZ - z;
          const length = Math.sqrt(dx * dx + dy * dy + dz * dz);
          if (length !== 0) {
            const minutes = feedMinutes + length * perFeed;
            if (!(minutes < mostMinutes)) break;
            feedMinutes = minutes;
            feedLength += length;
            motions++;
            // Pace.followLine for a feed that no axis limits, in place: a call would box every figure.
            const part = 1 / length;
            const alongX = dx * part;
            const alongY = dy * part;
            const alongZ = dz * part;
            const handed = isBlended ? handOver(paceState, alongX, alongY, alongZ, speed) : 0;
            if (paceState[Open.length] !== 0)
              paceState[Open.seconds]! += openSeconds(paceState, handed);
            paceState[Open.length] = length;
            paceState[Open.enter] = handed < speed ? handed : speed;
            paceState[Open.speed] = speed;
            paceState[Open.perSpeed] = perSpeed;
            paceState[Open.slowness] = Math.max(
              Math.abs(alongX) * slowX,
              Math.abs(alongY) * slowY,
              Math.abs(alongZ) * slowZ,
            );
            paceState[Open.endX] = alongX;
            paceState[Open.endY] = alongY;
            paceState[Open.endZ] = alongZ;
            if (toX < lowX) lowX = toX;
            if (toX > highX) highX = toX;
            if (toY < lowY) lowY = toY;
            if (toY > highY) highY = toY;
            if (toZ < lowZ) lowZ = toZ;
            if (toZ > highZ) highZ = toZ;
            if (isFollowed) {
              motion.fromX = x;
              motion.fromY = y;
              motion.fromZ = z;
              motion.toX = toX;
              motion.toY = toY;
              motion.toZ = toZ;
              motion.feed = newFeed;
              setStraight(motion, 'feed');
              this.tellFollowers(firstLine + lines + 1);
            }
          }
        } else {
          // Rapids and arcs go by the motion itself, because a call would box every figure handed to it.
          motion.fromX = x;
          motion.fromY = y;
          motion.fromZ = z;
          motion.toX = toX;
          motion.toY = toY;
          motion.toZ = toZ;
          if (code === 0) {
            if ((seen & Seen.centre) !== 0 || !this.moveAtRapid()) break;
            isInFeedRoom =
              minX <= toX &&
              toX <= maxX &&
              minY <= toY &&
              toY <= maxY &&
              minZ <= toZ &&
              toZ <= maxZ;
          } else {
            if ((seen & Seen.centre) === 0 || !isArcReadable || !isFeedQuiet) break;
            motion.centreU = (seen & Seen.i) === 0 ? x : x + values[at + Kept.i]! * unit;
            motion.centreV = (seen & Seen.j) === 0 ? y : y + values[at + Kept.j]! * unit;
            motion.feed = newFeed;
            if (!this.findArc(code === 20 ? -1 : 1)) break;
            const minutes = feedMinutes + motion.length * perFeed;
            if (!(minutes < mostMinutes)) break;
            feedMinutes = minutes;
            feedLength += motion.length;
            pace.followArc(motion, isBlended);
            stretch.take(motion);
            isInFeedRoom = true;
          }
          if (motion.moves) {
            motions++;
            if (isFollowed) this.tellFollowers(firstLine + lines + 1);
          }
        }
        x = toX;
        y = toY;
        z = toZ;
      }
      lines++;
      blocks++;
      lastWritten = lines;
      if (newFeed !== feed) {
        feed = newFeed;
        feedLine = lines;
        feedFrom = plain.feedFrom[line]!;
        feedTo = plain.feedTo[line]!;
      }
      if (code !== mode) {
        mode = code;
        modeLine = lines;
        modeFrom = codeFrom[line]!;
        modeTo = codeTo[line]!;
      }
    }
    this.next = line;

    stretch.motions = motions;
    stretch.feedLength = feedLength;
    stretch.feedMinutes = feedMinutes;
    stretch.widen(lowX, lowY, lowZ, highX, highY, highZ);
    machine.x = x;
    machine.y = y;
    machine.z = z;
    machine.feed = feed;
    machine.motionCode = mode;
    machine.isAbsolute = isAbsolute;
    if (distanceLine > 0)
      machine.noteSetAt(SETTING.distance, firstLine + distanceLine, distanceFrom, distanceTo);
    if (feedLine > 0) machine.noteSetAt(SETTING.feed, firstLine + feedLine, feedFrom, feedTo);
    if (modeLine > 0) machine.noteSetAt(SETTING.motionMode, firstLine + modeLine, modeFrom, modeTo);
    this.lines = lines;
    this.blocks = blocks;
    this.lastWritten = lastWritten;
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

  /** Works the motion out as an arc in the XY plane about its centre; false where it is not quiet. */
  private findArc(turning: 1 | -1): boolean {
    const { motion, controller } = this.run;
    const { minX, minY, minZ, maxX, maxY, maxZ } = this.watch.quiet.feed;
    const { fromX, fromY, toX, toY, centreU, centreV } = motion;
    const startU = fromX - centreU;
    const startV = fromY - centreV;
    const endU = toX - centreU;
    const endV = toY - centreV;
    const radius = Math.sqrt(startU * startU + startV * startV);
    const endRadius = Math.sqrt(endU * endU + endV * endV);
    const difference = Math.abs(radius - endRadius);
    if (radius === 0 || !(difference <= controller.arcTolerance + RADIUS_ROUNDING)) return false;
    const isFull = Math.abs(toX - fromX) + Math.abs(toY - fromY) <= SAME_POINT;
    const turn = isFull ? turning * TURN : findTurn(turning, startU, startV, endU, endV);
    motion.kind = 'arc';
    motion.by = 'program';
    motion.plane = 'xy';
    motion.radius = radius;
    motion.turn = turn;
    motion.moves = true;
    setExtremes(motion, 0, quartersPassed(turn, startU, startV, endU, endV));
    if (!(minX <= motion.minX && motion.maxX <= maxX)) return false;
    if (!(minY <= motion.minY && motion.maxY <= maxY)) return false;
    if (!(minZ <= motion.minZ && motion.maxZ <= maxZ)) return false;
    const along = radius * turn;
    const rise = motion.toZ - motion.fromZ;
    motion.length = Math.sqrt(along * along + rise * rise);
    return true;
  }

  private tellFollowers(line: number): void {
    const { machine, motion } = this.run;
    machine.line = line;
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
