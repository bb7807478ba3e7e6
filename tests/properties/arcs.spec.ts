import fc from 'fast-check';
import { expect, test } from 'vitest';
import type { Motion } from '#engine';
import { startTrace } from '#engine';
import { COUNTS, SEED } from '../counts';
import { openMachine } from './trace-of';

const setup = openMachine({ offsets: { work: { G54: { x: 0, y: 0, z: 0 } } } });
const POINTS = 2_000;

/** The one arc of a program that starts at a point of the circle; radius and angles in mm and radians. */
function arcOf(radius: number, start: number, turn: number): Motion {
  const at = (angle: number) => [radius * Math.cos(angle), radius * Math.sin(angle)] as const;
  const [startX, startY] = at(start);
  const [endX, endY] = at(start + turn);
  const isFull = Math.abs(turn) === 2 * Math.PI;
  const end = isFull ? '' : `X${endX.toFixed(9)} Y${endY.toFixed(9)} `;
  const program = [
    'G21 G90 G17 G54',
    `G0 X${startX.toFixed(9)} Y${startY.toFixed(9)}`,
    `G${turn > 0 ? 3 : 2} ${end}I${(-startX).toFixed(9)} J${(-startY).toFixed(9)} F1000`,
  ];
  let arc: Motion | undefined;
  const observer = { motion: (motion: Motion) => void (arc = { ...motion }) };
  const trace = startTrace(setup, undefined, { observers: [observer] });
  do trace.push(new TextEncoder().encode(program.join('\n')));
  while (trace.endOfText() === 'read-again');
  return arc!;
}

/** Greatest distance between a circle and the polygon through so many points of it. */
const sagitta = (radius: number, turn: number) =>
  radius * (1 - Math.cos(Math.abs(turn) / POINTS / 2)) + 1e-6;

test('an arc’s extremes are those of a slow sampling along it', () => {
  const radius = fc.double({ min: 0.1, max: 400, noNaN: true });
  const angle = fc.double({ min: -Math.PI, max: Math.PI, noNaN: true });
  const turn = fc.oneof(
    fc.double({ min: 0.01, max: 2 * Math.PI - 0.01, noNaN: true }),
    fc.constant(2 * Math.PI),
  );
  fc.assert(
    fc.property(radius, angle, turn, fc.boolean(), (size, start, by, isClockwise) => {
      const signed = isClockwise ? -by : by;
      const arc = arcOf(size, start, signed);
      expect(Math.abs(arc.turn - signed)).toBeLessThan(1e-6);
      const slack = sagitta(size, by);
      let [minX, maxX, minY, maxY] = [Infinity, -Infinity, Infinity, -Infinity];
      for (let point = 0; point <= POINTS; point++) {
        const x = size * Math.cos(start + (signed * point) / POINTS);
        const y = size * Math.sin(start + (signed * point) / POINTS);
        [minX, maxX] = [Math.min(minX, x), Math.max(maxX, x)];
        [minY, maxY] = [Math.min(minY, y), Math.max(maxY, y)];
      }
      for (const [mine, sampled] of [
        [arc.minX, minX],
        [arc.maxX, maxX],
        [arc.minY, minY],
        [arc.maxY, maxY],
      ] as const)
        expect(Math.abs(mine - sampled)).toBeLessThanOrEqual(slack);
    }),
    { numRuns: COUNTS.arcs, seed: SEED },
  );
});
