import { expect, test } from 'vitest';
import { startTrace, type Motion } from '#engine';
import { testSetup } from '../../shared/engine/testing/test-shop';
import { COUNTS, SEED } from '../counts';
import { randomNumbers } from './mutate';

type Random = (below: number) => number;
type Box = Record<'x' | 'y' | 'z', [number, number]>;

const SWITCHES = { startMotion: 'rapid' };
const MACHINE = {
  travel: { x: [-9000, 9000], y: [-9000, 9000], z: [-9000, 9000] },
  start: { x: 0, y: 0, z: 0 },
};
const OFFSETS = { work: { G54: { x: 10, y: 20, z: -30 }, G55: { x: 5, y: 0, z: 0 } } };

/** What is not known: an input that reads anything from nought to one. */
const unknownSetup = testSetup({
  machine: MACHINE,
  offsets: OFFSETS,
  controller: {
    inputs: [
      { parameter: '#100', means: 'tool-present', when: 1 },
      { parameter: '#101', means: 'air-ok', when: 1 },
    ],
    switches: SWITCHES,
  },
});
const knownSetup = (values: readonly number[]) =>
  testSetup({
    machine: MACHINE,
    offsets: OFFSETS,
    controller: {
      parameters: { '#100': values[0]!, '#101': values[1]! },
      switches: SWITCHES,
    },
  });

const VALUES = [
  '5',
  '-2.5',
  '#100',
  '[#100*10-3]',
  '[#101**2*7]',
  '[#100+#101]',
  '[SIN[#100*360]*4]',
  '[10/[#101+1]]',
  '[#100 GT 0.5]',
  '#1',
];
const OTHERS = [
  'G90',
  'G91',
  'G55',
  'G54',
  'G53',
  'G52 X1 Y[2]',
  '#1=[#100*3]',
  '#1=[#1+#101]',
  'M3',
];

function randomBlock(random: Random): string {
  if (random(4) === 0) return OTHERS[random(OTHERS.length)]!;
  const words = ['X', 'Y', 'Z'].filter(() => random(2) === 0);
  const value = () => VALUES[random(VALUES.length)]!;
  const code = ['G0', 'G1 F500', 'G53 G0', ''][random(4)]!;
  return [code, ...words.map((letter) => letter + value())].join(' ').trim();
}

/** The ends of every line's motions, least and greatest. */
function endsByLine(program: string, setup: ReturnType<typeof testSetup>): Map<number, Box> {
  const ends = new Map<number, Box>();
  const observer = {
    motion: ({ toX, toY, toZ }: Motion, { line }: { line: number }) => {
      const box = ends.get(line) ?? {
        x: [Infinity, -Infinity],
        y: [Infinity, -Infinity],
        z: [Infinity, -Infinity],
      };
      for (const [axis, to] of [
        ['x', toX],
        ['y', toY],
        ['z', toZ],
      ] as const)
        box[axis] = [Math.min(box[axis][0], to), Math.max(box[axis][1], to)];
      ends.set(line, box);
    },
  };
  const trace = startTrace(setup, () => undefined, { observers: [observer] });
  do trace.push(new TextEncoder().encode(program));
  while (trace.endOfText() === 'read-again');
  return ends;
}

/** Rounding of sums made in another order. */
const SLACK = 1e-9;

test('whatever the unknown turns out to be, every motion ends within what was judged', () => {
  const random = randomNumbers(SEED);
  let compared = 0;
  let spread = 0;
  for (let round = 0; round < COUNTS.unknownPlaces; round++) {
    const blocks = Array.from({ length: 8 }, () => randomBlock(random));
    const program = `G21 G90 G54 F500\n#1=0\n${blocks.join('\n')}\nM30\n`;
    const judged = endsByLine(program, unknownSetup);
    for (let point = 0; point < 4; point++) {
      const values = [random(1_001) / 1_000, point === 0 ? 0 : random(1_001) / 1_000];
      for (const [line, ends] of endsByLine(program, knownSetup(values))) {
        const text = JSON.stringify({ program, values, line });
        const box = judged.get(line);
        expect(box, text).toBeDefined();
        for (const axis of ['x', 'y', 'z'] as const) {
          const [to] = ends[axis];
          const [least, greatest] = box![axis];
          expect(least - SLACK <= to && to <= greatest + SLACK, `${axis} ${text}`).toBe(true);
          if (greatest > least) spread++;
          compared++;
        }
      }
    }
  }
  expect(compared).toBeGreaterThan(COUNTS.unknownPlaces * 10);
  // Bounds that never open would hold of themselves.
  expect(spread).toBeGreaterThan(compared / 5);
});
