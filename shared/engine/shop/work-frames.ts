import type { Tool } from './setup';
import type { Shop } from './shop';

/** What of the machine's state places work coordinates in the machine. */
export interface WorkPlace {
  readonly workOffset: string;
  readonly originX: number | undefined;
  readonly originY: number | undefined;
  readonly originZ: number | undefined;
  readonly lengthOffset: number;
  readonly held: { readonly tool: Tool | undefined };
}
export interface Place3 {
  readonly x: number;
  readonly y: number;
  readonly z: number;
}

/**
 * Where work offsets lie as physical points: what the gauge point would read if it stood there. Values
 * that the program itself sets are remembered from when they were last in force; a value nobody gave
 * counts as 0, as the walk takes it.
 */
export interface WorkFrames {
  /** Origin of a work offset: the point where its X, Y and Z are all zero. */
  origin(name: string, now: WorkPlace): Place3;
  /** Whether all three axes of a work offset have a value, so that it can be placed in the machine. */
  isSet(name: string, now: WorkPlace): boolean;
}

export function openWorkFrames(shop: Shop): WorkFrames {
  const { offsets } = shop.setup;
  const seen = new Map<string, { x: number; y: number; z: number }>();
  return {
    isSet(name, now) {
      if (name === now.workOffset) {
        return now.originX !== undefined && now.originY !== undefined && now.originZ !== undefined;
      }
      const stored = seen.get(name) ?? offsets.work[name];
      return stored?.x !== undefined && stored.y !== undefined && stored.z !== undefined;
    },
    origin(name, now) {
      if (name === now.workOffset) {
        const active = { x: now.originX ?? 0, y: now.originY ?? 0, z: now.originZ ?? 0 };
        seen.set(name, active);
        return { ...active, z: active.z + zeroShift(shop, now) };
      }
      const stored = seen.get(name) ?? offsets.work[name];
      return {
        x: stored?.x ?? 0,
        y: stored?.y ?? 0,
        z: (stored?.z ?? 0) + zeroShift(shop, now),
      };
    },
  };
}

/**
 * From the stored Z of a work offset to the physical height of its zero. With lengths in a table,
 * offset = gauge length − reference, so zero lies `reference` under the stored value. Where zero is
 * set with the tool in the spindle, or the macro measures, and where the tool is not known, the
 * program's own idea of its tip is all there is: then tip and program agree by definition.
 */
function zeroShift(shop: Shop, now: WorkPlace): number {
  const { lengthScheme, lengthReference } = shop.setup.controller;
  const { tool } = now.held;
  if (!tool) return now.lengthOffset;
  if (lengthScheme === 'none' || lengthScheme === 'measured-in-macro') {
    return now.lengthOffset - tool.gaugeLength;
  }
  return -lengthReference;
}

/** How far the tip is under the gauge point; 0 while the tool is not known, see zeroShift. */
export function tipDrop(now: WorkPlace): number {
  return now.held.tool ? now.held.tool.gaugeLength : 0;
}
