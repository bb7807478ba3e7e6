import type { Offsets } from '../shop/setup';

export interface Origin {
  x: number | undefined;
  y: number | undefined;
  z: number | undefined;
  a: number | undefined;
}

/** Work offsets in machine mm, and the two shifts that lie on top of the active one. */
export class WorkOffsets {
  private readonly origins = new Map<string, Origin>();
  /** G92: one shift over all offsets. */
  readonly preset = { x: 0, y: 0, z: 0, a: 0 };
  /** What G92.2 leaves behind for G92.3. */
  readonly presetKept = { x: 0, y: 0, z: 0, a: 0 };
  /** G52. */
  readonly local = { x: 0, y: 0, z: 0, a: 0 };

  constructor(offsets: Offsets) {
    for (const [name, { x, y, z, a }] of Object.entries(offsets.work))
      this.origins.set(name, { x, y, z, a });
  }

  origin(name: string): Origin {
    let origin = this.origins.get(name);
    if (!origin) {
      origin = { x: undefined, y: undefined, z: undefined, a: undefined };
      this.origins.set(name, origin);
    }
    return origin;
  }
}
