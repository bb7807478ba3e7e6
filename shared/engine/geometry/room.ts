import type { Prism } from './prism';

/** Kept from every border of a room (mm), so that rounding never lets a motion in that a rule would judge. */
const MARGIN = 1e-6;

/** A box of the gauge point, machine mm; open to all sides until something narrows it. */
export class Room {
  minX = -Infinity;
  minY = -Infinity;
  minZ = -Infinity;
  maxX = Infinity;
  maxY = Infinity;
  maxZ = Infinity;

  open(): void {
    this.minX = this.minY = this.minZ = -Infinity;
    this.maxX = this.maxY = this.maxZ = Infinity;
  }

  /** Leaves no point in it. */
  close(): void {
    this.minX = Infinity;
  }

  get isClosed(): boolean {
    return !(this.minX < this.maxX && this.minY < this.maxY && this.minZ < this.maxZ);
  }

  /** Keeps it within a box; sides left out are open. */
  within(box: {
    readonly x?: readonly [number, number];
    readonly y?: readonly [number, number];
    readonly z?: readonly [number, number];
  }): void {
    if (box.x) this.minX = Math.max(this.minX, box.x[0] + MARGIN);
    if (box.x) this.maxX = Math.min(this.maxX, box.x[1] - MARGIN);
    if (box.y) this.minY = Math.max(this.minY, box.y[0] + MARGIN);
    if (box.y) this.maxY = Math.min(this.maxY, box.y[1] - MARGIN);
    if (box.z) this.minZ = Math.max(this.minZ, box.z[0] + MARGIN);
    if (box.z) this.maxZ = Math.min(this.maxZ, box.z[1] - MARGIN);
  }

  above(z: number): void {
    this.minZ = Math.max(this.minZ, z + MARGIN);
  }

  /**
   * Keeps it on one side of a solid: the side of the table on which the point lies farthest from it, or
   * above it. Closed where the point lies in it or under it.
   */
  apartFrom(bounds: Prism, x: number, y: number, z: number): void {
    const left = bounds.minX - x;
    const right = x - bounds.maxX;
    const front = bounds.minY - y;
    const back = y - bounds.maxY;
    const farthest = Math.max(left, right, front, back);
    if (farthest > MARGIN) {
      if (farthest === left) this.maxX = Math.min(this.maxX, bounds.minX - MARGIN);
      else if (farthest === right) this.minX = Math.max(this.minX, bounds.maxX + MARGIN);
      else if (farthest === front) this.maxY = Math.min(this.maxY, bounds.minY - MARGIN);
      else this.minY = Math.max(this.minY, bounds.maxY + MARGIN);
    } else if (z > bounds.maxZ) this.above(bounds.maxZ);
    else this.close();
  }
}
