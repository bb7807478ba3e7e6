import { ownGreatest, ownLeast } from '../../geometry/path';
import type { Motion } from '../events';

/** Quiet motion gathered since anything else was read, under one state of the machine. */
export class Stretch {
  /** Motions of some length. */
  motions = 0;
  /** Where they go, where the first starts left out: machine mm of the gauge point. */
  minX = Infinity;
  minY = Infinity;
  minZ = Infinity;
  maxX = -Infinity;
  maxY = -Infinity;
  maxZ = -Infinity;
  /** Path length of feed motion, mm. */
  feedLength = 0;
  /** Minutes of feed motion, each at the feed of its F word. */
  feedMinutes = 0;

  widen(minX: number, minY: number, minZ: number, maxX: number, maxY: number, maxZ: number): void {
    if (minX < this.minX) this.minX = minX;
    if (minY < this.minY) this.minY = minY;
    if (minZ < this.minZ) this.minZ = minZ;
    if (maxX > this.maxX) this.maxX = maxX;
    if (maxY > this.maxY) this.maxY = maxY;
    if (maxZ > this.maxZ) this.maxZ = maxZ;
  }

  /** Widens it by where a motion itself goes: its end, and what an arc bulges past its start. */
  take(motion: Motion): void {
    const { fromX, fromY, fromZ, toX, toY, toZ } = motion;
    const minX = ownLeast(fromX, toX, motion.minX);
    const minY = ownLeast(fromY, toY, motion.minY);
    const minZ = ownLeast(fromZ, toZ, motion.minZ);
    const maxX = ownGreatest(fromX, toX, motion.maxX);
    const maxY = ownGreatest(fromY, toY, motion.maxY);
    const maxZ = ownGreatest(fromZ, toZ, motion.maxZ);
    if (minX < this.minX) this.minX = minX;
    if (minY < this.minY) this.minY = minY;
    if (minZ < this.minZ) this.minZ = minZ;
    if (maxX > this.maxX) this.maxX = maxX;
    if (maxY > this.maxY) this.maxY = maxY;
    if (maxZ > this.maxZ) this.maxZ = maxZ;
  }

  clear(): void {
    this.motions = 0;
    this.minX = this.minY = this.minZ = Infinity;
    this.maxX = this.maxY = this.maxZ = -Infinity;
    this.feedLength = this.feedMinutes = 0;
  }
}
