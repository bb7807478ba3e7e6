import type { MachineDetails, ToolRecord } from '#contracts';
import { machineDetailsSchema, toolRecordSchema } from '#contracts';

/** A small shop for the specs of these pages: one router, three forks on the back edge, three tools. */
const MACHINE_ID = '11111111-1111-4111-8111-111111111111';
const revision = (number: number) => ({
  number,
  madeBy: 'Ana',
  madeAt: '2026-11-30T18:00:00Z',
  reason: '',
});

export function testMachine(
  change: Partial<Record<keyof MachineDetails, unknown>> = {},
): MachineDetails {
  return machineDetailsSchema.parse({
    id: MACHINE_ID,
    name: 'North router',
    machine: {
      name: 'North router',
      travel: { x: [0, 1300], y: [0, 2650], z: [-220, 0] },
      rapid: { x: 20000, y: 20000, z: 8000 },
      maxFeed: { x: 15000, y: 15000, z: 6000 },
      acceleration: { x: 1500, y: 1500, z: 800 },
      spindle: { minRpm: 6000, maxRpm: 24000, spinUp: 4, spinDown: 5, turns: ['cw'] },
      spoilboard: { top: -200, allowance: 1 },
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
      rapids: 'coordinated',
      lengthOffset: 'program',
    },
    revision: revision(3),
    rack: {
      name: 'back edge',
      edge: 'back',
      slideOut: 60,
      gripTolerance: { xy: 0.2, z: 0.5 },
      fork: { width: 60, reach: 20, thickness: 8, below: 7 },
      pockets: [1, 2, 5].map((number) => ({
        number,
        grip: { x: 125 * number, y: 2560, z: -125 },
        opens: '-y',
        largestDiameter: 60,
        longest: 150,
        taper: 'ISO30',
      })),
    },
    rackRevision: revision(2),
    loading: { pockets: [{ pocket: 1, tool: 7 }], inSpindle: null, byHand: [] },
    loadingRevision: revision(41),
    work: { G54: { x: 30, y: 40 } },
    offsetRevision: revision(5),
    macro: { name: 'change.ngc', text: 'M5\nG53 G0 Z0\nM30' },
    macroRevision: revision(7),
    ...change,
  });
}

export function testTool(number: number, change: Record<string, unknown> = {}): ToolRecord {
  return toolRecordSchema.parse({
    id: `22222222-2222-4222-8222-${String(number).padStart(12, '0')}`,
    tool: {
      number,
      name: `${number} mm compression`,
      kind: 'compression',
      diameter: number,
      shank: number,
      stickOut: 40,
      fluteLength: 22,
      gaugeLength: 92.4,
      holder: { taper: 'ISO30', diameter: 50, above: 72 },
      maxRpm: 24000,
      turns: 'cw',
      measured: { at: '2026-11-30T18:00:00Z', method: 'setter' },
      ...change,
    },
    lengthOffset: 92.4,
    diameterOffset: null,
    revision: revision(1),
    places: [],
  });
}
