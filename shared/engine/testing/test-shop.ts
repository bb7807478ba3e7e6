import { setupSchema, type SetupDocument } from '#contracts';
import type { Setup } from '../shop/setup';
import { openShop, type Shop } from '../shop/shop';

/**
 * The plain test shop: eight pockets along the back edge, tools T1 to T8 each in the pocket of its
 * number, a sheet of stock on the spoilboard, a controller that changes tools by itself and stops the
 * spindle for it. A spec states only what differs from this.
 */
const PITCH = 150;
const POCKETS = [1, 2, 3, 4, 5, 6, 7, 8];

/** Number, kind, diameter, gauge length (mm). Stick-out is 40 mm for all, flutes 25 mm. */
const TOOLS: readonly (readonly [number, string, string, number, number])[] = [
  [1, '10 mm end mill', 'end-mill', 10, 95],
  [2, '6 mm end mill', 'end-mill', 6, 92],
  [3, '5 mm drill', 'drill', 5, 96],
  [4, '6 mm compression', 'compression', 6, 92.4],
  [5, '3 mm end mill', 'end-mill', 3, 90],
  [6, '12 mm compression', 'compression', 12, 98],
  [7, '8 mm drill', 'drill', 8, 97],
  [8, '6 mm ball', 'ball', 6, 94],
];

const plainTool = (
  number: number,
  name: string,
  kind: string,
  diameter: number,
  gaugeLength: number,
) => ({
  number,
  name,
  kind,
  diameter,
  shank: diameter,
  stickOut: 40,
  fluteLength: 25,
  gaugeLength,
  holder: { taper: 'ISO30', diameter: 50, above: 72 },
  flutes: 2,
  maxRpm: 24000,
  turns: 'cw' as const,
  measured: { at: '2026-11-30T18:00:00Z', method: 'setter' },
});

export function plainSetupDocument(): SetupDocument {
  return {
    format: 'nightlatch-setup',
    version: 1,
    asOf: '2026-12-01T18:00:00Z',
    machine: {
      name: 'test router',
      travel: { x: [0, 1300], y: [0, 2650], z: [-220, 0] },
      references: { g28: { x: 0, y: 0, z: 0 }, g30: { x: 650, y: 0, z: 0 } },
      rapid: { x: 20000, y: 20000, z: 8000 },
      maxFeed: { x: 15000, y: 15000, z: 6000 },
      acceleration: { x: 1500, y: 1500, z: 800 },
      spindle: {
        minRpm: 6000,
        maxRpm: 24000,
        spinUp: 4,
        spinDown: 5,
        turns: ['cw'],
        waits: true,
      },
      spoilboard: {
        top: -200,
        allowance: 1,
        area: { min: { x: 0, y: 0 }, max: { x: 1240, y: 2440 } },
      },
      bodies: [
        {
          name: 'spindle',
          rides: 'head',
          box: { min: { x: -60, y: -60, z: 0 }, max: { x: 60, y: 60, z: 220 } },
        },
      ],
    },
    controller: {
      language: 'rs274ngc',
      defaults: {
        units: 'mm',
        plane: 'xy',
        distance: 'absolute',
        arcCentre: 'incremental',
        feed: 'per-minute',
        workOffset: 'G54',
        return: 'G98',
        path: 'G64',
      },
      arcTolerance: 0.0127,
      dwell: 'seconds',
      numbers: 'decimal',
      longestBlock: 256,
      toolWord: 'tool',
      toolZero: 'put-away',
      toolChange: 'controller',
      changeStopsSpindle: true,
      rapids: 'coordinated',
      lengthOffset: 'program',
    },
    rack: {
      name: 'back edge',
      edge: 'back',
      slideOut: 60,
      gripTolerance: { xy: 0.2, z: 0.5 },
      fork: { width: 60, reach: 20, thickness: 8, below: 7 },
      bodies: [
        {
          name: 'rail',
          box: { min: { x: 40, y: 2590, z: -330 }, max: { x: 1260, y: 2640, z: -160 } },
        },
      ],
      pockets: POCKETS.map((number) => ({
        number,
        grip: { x: 100 + (number - 1) * PITCH, y: 2560, z: -125 },
        opens: '-y',
        largestDiameter: 50,
        longest: 190,
        taper: 'ISO30',
      })),
    },
    loading: {
      pockets: POCKETS.map((number) => ({ pocket: number, tool: number })),
      inSpindle: null,
    },
    tools: TOOLS.map((tool) => plainTool(...tool)),
    offsets: {
      length: Object.fromEntries(TOOLS.map(([number, , , , length]) => [`${number}`, length])),
      diameter: Object.fromEntries(TOOLS.map(([number, , , diameter]) => [`${number}`, diameter])),
      work: { G54: { x: 30, y: 40, z: -182 } },
    },
    job: {
      stock: {
        in: 'G54',
        min: { x: 0, y: 0, z: -18 },
        max: { x: 1200, y: 600, z: 0 },
        material: 'birch plywood',
      },
      zeroOn: 'top',
    },
  };
}

/**
 * The plain test shop with a change merged over it: objects key by key, arrays and values replaced,
 * `undefined` takes a key out. Validated as any setup; throws with every wrong path if it is none.
 */
export function testSetup(change: object = {}): Setup {
  return setupSchema.parse(mergeOver(plainSetupDocument(), change));
}

export function openTestShop(change: object = {}): Shop {
  return openShop(testSetup(change));
}

/** The plain tools with the named one changed: `changedTools({ 3: { diameter: 4.8 } })`. */
export function changedTools(changes: Readonly<Record<number, object>>): object[] {
  return plainSetupDocument().tools.map(
    (tool) => mergeOver(tool, changes[tool.number] ?? {}) as object,
  );
}

/** A new value: `change` merged over `base`, neither of them touched. */
export function mergeOver(base: unknown, change: unknown): unknown {
  if (!isPlainObject(base) || !isPlainObject(change)) return change;
  const merged = new Map<string, unknown>(Object.entries(base));
  for (const [key, value] of Object.entries(change)) {
    if (value === undefined) merged.delete(key);
    else merged.set(key, mergeOver(merged.get(key), value));
  }
  return Object.fromEntries(merged);
}

function isPlainObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
