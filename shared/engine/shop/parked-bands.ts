import type { Tool } from './setup';

/** A stretch of a parked tool with its holder: a cylinder between two heights over the gauge line (mm). */
export interface Band {
  readonly low: number;
  readonly high: number;
  readonly radius: number;
}

/** A tool with its holder as it hangs in a fork: holder steps, shank, flutes, and the taper above. */
export function parkedBands(tool: Tool): readonly Band[] {
  const { holder, gaugeLength, stickOut } = tool;
  const face = stickOut - gaugeLength;
  const tip = -gaugeLength;
  const fluteTop = Math.min(face, tip + tool.fluteLength);
  const bands: Band[] = [{ low: 0, high: holder.above, radius: holder.diameter / 2 }];
  bands.push(...holderBands(tool, face));
  bands.push({ low: fluteTop, high: face, radius: tool.shank / 2 });
  bands.push({ low: tip, high: fluteTop, radius: tool.diameter / 2 });
  return bands.filter((band) => band.low < band.high);
}

/** Steps run from the gauge line down; without any, the holder is one cylinder. */
function holderBands(tool: Tool, face: number): readonly Band[] {
  const { holder } = tool;
  if (holder.steps.length === 0) return [{ low: face, high: 0, radius: holder.diameter / 2 }];
  const bands: Band[] = [];
  let high = 0;
  for (const step of holder.steps) {
    bands.push({ low: high - step.length, high, radius: step.diameter / 2 });
    high -= step.length;
  }
  return bands;
}

/** The widest part of a tool with its holder, mm across. */
export function widestDiameter(tool: Tool): number {
  return 2 * Math.max(...parkedBands(tool).map((band) => band.radius));
}

/**
 * How far two parked tools overlap sideways (mm), the second standing `higher` above the first and
 * their axes `apart`; zero or less where they clear each other at every height.
 */
export function parkedOverlap(one: Tool, other: Tool, higher: number, apart: number): number {
  let worst = -Infinity;
  for (const mine of parkedBands(one)) {
    for (const theirs of parkedBands(other)) {
      if (mine.high <= theirs.low + higher || theirs.high + higher <= mine.low) continue;
      worst = Math.max(worst, mine.radius + theirs.radius - apart);
    }
  }
  return worst;
}
