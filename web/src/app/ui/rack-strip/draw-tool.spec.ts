import type { Tool } from '#engine';
import { drawTool } from './draw-tool';

const TOOL: Tool = {
  number: 4,
  name: '6 mm compression',
  kind: 'compression',
  diameter: 6,
  shank: 6,
  stickOut: 40,
  fluteLength: 22,
  gaugeLength: 92.4,
  holder: {
    taper: 'ISO30',
    diameter: 50,
    above: 72,
    steps: [
      { diameter: 50, length: 12 },
      { diameter: 42, length: 40.4 },
    ],
  },
  maxRpm: 24000,
  turns: 'cw',
  used: 0,
  measured: null,
  touched: null,
  sisterOf: null,
};
/** Every coordinate of a path made of M, L, H, V, A and Z only. */
function reach(path: string): { x: number[]; y: number[] } {
  const x: number[] = [];
  const y: number[] = [];
  for (const [, letter, rest] of path.matchAll(/([MLHVAZ])([^MLHVAZ]*)/g)) {
    const numbers = (rest ?? '').trim().split(/[ ,]+/).filter(Boolean).map(Number);
    if (letter === 'H') x.push(...numbers);
    else if (letter === 'V') y.push(...numbers);
    else if (letter === 'A') [x, y].forEach((axis, at) => axis.push(numbers[5 + at]!));
    else numbers.forEach((value, index) => (index % 2 === 0 ? x : y).push(value));
  }
  return { x, y };
}

test('the tip hangs at the gauge length and the holder ends at its face', () => {
  const drawing = drawTool(TOOL, 2);
  expect(Math.max(...reach(drawing.cutter).y)).toBeCloseTo(184.8, 2);
  expect(Math.max(...reach(drawing.holder).y)).toBeCloseTo(2 * (92.4 - 40), 2);
  expect(drawing.bottom).toBeCloseTo(184.8, 6);
});

test('diameters are to scale: flange, body, cutter', () => {
  const drawing = drawTool(TOOL, 1);
  expect(Math.max(...reach(drawing.holder).x)).toBe(25);
  expect(Math.max(...reach(drawing.cutter).x)).toBe(3);
});

test('the taper stands over the gauge line by what the tool list says', () => {
  const { y } = reach(drawTool(TOOL, 1).taper);
  expect(Math.min(...y)).toBe(-72);
  expect(Math.max(...y)).toBe(0);
});

test('without steps the holder is one cylinder down to its face', () => {
  const plain = drawTool({ ...TOOL, holder: { ...TOOL.holder, steps: [] } }, 1);
  const { x, y } = reach(plain.holder);
  expect(Math.max(...x)).toBe(25);
  expect(Math.max(...y)).toBeCloseTo(52.4, 6);
});

test('flutes stay between the fluted top and the tip', () => {
  for (const kind of [
    'compression',
    'end-mill',
    'upcut',
    'downcut',
    'drill',
    'ball',
    'surfacing',
  ]) {
    const { y } = reach(drawTool({ ...TOOL, kind, diameter: 10 }, 2).flutes);
    expect(y.length).toBeGreaterThan(0);
    expect(Math.min(...y)).toBeGreaterThanOrEqual(2 * (92.4 - 22) - 0.01);
    expect(Math.max(...y)).toBeLessThanOrEqual(2 * 92.4);
  }
});

test('every kind, known or not, ends at the tip and nowhere below', () => {
  for (const kind of ['v-bit', 'knife', 'saw', 'other', 'something else', 'drill', 'ball']) {
    const { y } = reach(drawTool({ ...TOOL, kind }, 1).cutter);
    expect(Math.max(...y)).toBeLessThanOrEqual(92.4 + 1e-9);
    if (kind !== 'ball') expect(Math.max(...y)).toBeCloseTo(92.4, 6);
  }
});

test('a 0.5 mm drill can still be seen', () => {
  const { x } = reach(drawTool({ ...TOOL, kind: 'drill', diameter: 0.5 }, 0.8).cutter);
  expect(Math.max(...x) - Math.min(...x)).toBeGreaterThanOrEqual(1.5);
});

test('flutes longer than the stick-out do not run up into the holder', () => {
  const { y } = reach(drawTool({ ...TOOL, fluteLength: 60 }, 1).cutter);
  expect(Math.min(...y)).toBeCloseTo(52.4, 6);
});
