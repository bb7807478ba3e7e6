import { expect } from 'vitest';
import { startTrace, type Setup, type TraceMotion } from '#engine';
import { testSetup } from '../../shared/engine/testing/test-shop';

const FAR = 1_000_000;

/** A machine without bounds, so that only what the program means counts. */
export function openMachine(change: object = {}): Setup {
  return testSetup({
    machine: {
      travel: { x: [-FAR, FAR], y: [-FAR, FAR], z: [-FAR, FAR] },
      start: { x: 0, y: 0, z: 0 },
    },
    ...change,
  });
}

export function traceOf(program: string | readonly string[], setup: Setup): TraceMotion[] {
  const motions: TraceMotion[] = [];
  const trace = startTrace(setup, (motion) => motions.push(motion));
  const text = typeof program === 'string' ? program : program.join('\n');
  do trace.push(new TextEncoder().encode(text));
  while (trace.endOfText() === 'read-again');
  return motions;
}

export const origin = { x: 0, y: 0, z: 0 };

/** The same motions at the same lines, points within a millionth of a millimetre or two. */
export function expectSameTrace(
  one: readonly TraceMotion[],
  other: readonly TraceMotion[],
  shift: { x: number; y: number; z: number } = origin,
  lines: 'same lines' | 'any lines' = 'same lines',
): void {
  expect(one.length).toBe(other.length);
  one.forEach((motion, index) => {
    const mine = other[index]!;
    expect(mine.kind).toBe(motion.kind);
    if (lines === 'same lines') expect(mine.line).toBe(motion.line);
    for (const axis of ['x', 'y', 'z'] as const) {
      near(mine.to?.[axis], motion.to?.[axis], shift[axis]);
      near(mine.centre?.[axis], motion.centre?.[axis], shift[axis]);
    }
    near(mine.turn, motion.turn, 0);
    near(mine.feed, motion.feed, 0);
  });
}

/** Twice the trace's own rounding. */
const SLACK = 2e-6;

function near(mine: number | undefined, theirs: number | undefined, shift: number): void {
  if (theirs === undefined) expect(mine).toBeUndefined();
  else expect(Math.abs(mine! - theirs - shift)).toBeLessThanOrEqual(SLACK);
}
