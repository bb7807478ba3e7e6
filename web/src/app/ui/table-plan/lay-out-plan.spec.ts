import type { Machine, Rack } from '#engine';
import type { PlanToDraw } from './lay-out-plan';
import { keepApart, layOutPlan } from './lay-out-plan';

const MACHINE = {
  travel: { x: [0, 1300], y: [0, 2650], z: [-220, 0] },
  spoilboard: { top: -200, allowance: 1, area: { min: { x: 0, y: 0 }, max: { x: 1240, y: 2440 } } },
  zones: [{ name: 'setter', box: { min: { x: 1240 }, max: { y: 60 } }, forbids: 'everything' }],
} as unknown as Machine;
const RACK = {
  edge: 'back',
  fork: { width: 60, reach: 20, thickness: 8, below: 7 },
  bodies: [{ name: 'rail', box: { min: { x: 40, y: 2590 }, max: { x: 1260, y: 2640 } } }],
  pockets: [{ number: 1, grip: { x: 100, y: 2560, z: -125 }, opens: '-y' }],
} as unknown as Rack;
function lay(change: Partial<PlanToDraw> = {}) {
  return layOutPlan({
    machine: MACHINE,
    rack: RACK,
    work: { G54: { x: 30, y: 40, z: -182 } },
    job: undefined,
    path: null,
    ...change,
  });
}

test('shows the whole travel, and what stands beyond it', () => {
  const { bounds } = lay({
    rack: {
      ...RACK,
      bodies: [{ name: 'rail', box: { min: { x: 40, y: 2640 }, max: { x: 1260, y: 2700 } } }],
    },
  });
  expect(bounds).toEqual({ x: 0, y: 0, width: 1300, height: 2700 });
});

test('stock stands at its work zero, in machine coordinates', () => {
  const stock = { in: 'G54', min: { x: 0, y: 0, z: -18 }, max: { x: 1200, y: 600, z: 0 } };
  const { stock: drawn } = lay({ job: { stock, zeroOn: 'top', obstacles: [] } });
  expect(drawn).toEqual({ x: 30, y: 40, width: 1200, height: 600 });
});

test('stock is not drawn while its work zero has no value', () => {
  const stock = { in: 'G55', min: { x: 0, y: 0, z: -18 }, max: { x: 1200, y: 600, z: 0 } };
  expect(lay({ job: { stock, zeroOn: 'top', obstacles: [] } }).stock).toBeNull();
});

test('a work zero without both X and Y has no place', () => {
  expect(lay({ work: { G54: { x: 30, y: 40 }, G55: { z: -3 } } }).zeros).toEqual([
    { name: 'G54', x: 30, y: 40 },
  ]);
});

test('a zone with open sides reaches past the travel there', () => {
  const [zone] = lay().zones;
  expect(zone!.x).toBe(1240);
  expect(zone!.x + zone!.width).toBeGreaterThan(1300);
  expect(zone!.y).toBeLessThan(0);
  expect(zone!.y + zone!.height).toBe(60);
});

const mouths: ['+x' | '-x' | '+y' | '-y', (x: number, y: number) => boolean][] = [
  ['+x', (x) => x > 100],
  ['-x', (x) => x < 100],
  ['+y', (_x, y) => y > 2560],
  ['-y', (_x, y) => y < 2560],
];
test.each(mouths)('a fork that opens %s ends its tines on that side', (opens, isOnSide) => {
  const pockets = [{ ...RACK.pockets[0]!, opens }];
  const { fork } = lay({ rack: { ...RACK, pockets } }).pockets[0]!;
  const points = [...fork.matchAll(/[ML]([-\d.]+) ([-\d.]+)/g)].map(([, x, y]) => [+x!, +y!]);
  // The outline is open: it begins and ends at the tine ends.
  for (const [x, y] of [points[0]!, points.at(-1)!]) expect(isOnSide(x!, y!)).toBe(true);
});

test('follows a path a little past the travel, not one that is 25 times too large', () => {
  const near = lay({ path: { x: -100, y: 0, width: 1000, height: 100 } });
  expect(near.bounds.x).toBe(-100);
  expect(near.pathLeaves).toBe(false);
  const far = lay({ path: { x: 0, y: 0, width: 30_480, height: 15_240 } });
  expect(far.bounds.width).toBeLessThan(2000);
  expect(far.pathLeaves).toBe(true);
});

test('of labels over each other the first is kept', () => {
  const label = (name: string, x: number, y: number) => ({ name, x, y, width: 30 });
  const kept = keepApart([
    label('a', 0, 0),
    label('b', 20, 5),
    label('c', 20, 30),
    label('d', 40, 0),
  ]);
  expect(kept.map(({ name }) => name)).toEqual(['a', 'c', 'd']);
});
