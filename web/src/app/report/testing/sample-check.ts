import type { CheckDetails, FindingPage, StoredFinding } from '#contracts';
import { checkDetailsSchema, findingPageSchema } from '#contracts';

export const CHECK_ID = '6c1c7a52-6f0e-4c53-9f3a-0d3c5a1e0001';
export const REVISION_ID = '6c1c7a52-6f0e-4c53-9f3a-0d3c5a1e0002';
export const MACHINE_ID = '6c1c7a52-6f0e-4c53-9f3a-0d3c5a1e0003';
const PROGRAM_ID = '6c1c7a52-6f0e-4c53-9f3a-0d3c5a1e0004';
const HASH = `9f2c${'0'.repeat(56)}b41e`;

/** Two pockets on the back edge, one tool; what the contract asks for and no more. */
const SETUP = {
  format: 'nightlatch-setup',
  version: 1,
  machine: {
    name: 'North router',
    travel: { x: [0, 1300], y: [0, 2650], z: [-220, 0] },
    rapid: { x: 20000, y: 20000, z: 8000 },
    maxFeed: { x: 15000, y: 15000, z: 6000 },
    acceleration: { x: 1500, y: 1500, z: 800 },
    spindle: { minRpm: 6000, maxRpm: 24000, spinUp: 4, spinDown: 5, turns: ['cw'] },
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
  rack: {
    name: 'back edge',
    edge: 'back',
    slideOut: 60,
    gripTolerance: { xy: 0.2, z: 0.5 },
    fork: { width: 60, reach: 20, thickness: 8, below: 7 },
    pockets: [1, 2].map((number) => ({
      number,
      grip: { x: 150 * number, y: 2560, z: -125 },
      opens: '-y',
      largestDiameter: 50,
      longest: 190,
      taper: 'ISO30',
    })),
  },
  loading: { pockets: [{ pocket: 1, tool: 4 }], inSpindle: null },
  tools: [
    {
      number: 4,
      name: '6 mm compression',
      kind: 'compression',
      diameter: 6,
      shank: 6,
      stickOut: 40,
      fluteLength: 22,
      gaugeLength: 92.4,
      holder: { taper: 'ISO30', diameter: 50, above: 72 },
      maxRpm: 24000,
      turns: 'cw',
    },
  ],
  offsets: { length: { '4': 92.4 }, work: { G54: { x: 30, y: 40, z: -182 } } },
};

export function sampleFinding(id: string, more: Partial<StoredFinding> = {}): StoredFinding {
  return {
    id,
    rule: 'no-rule-of-this-version',
    severity: 'stop',
    line: 412,
    endLine: 412,
    worstLine: 412,
    count: 1,
    message: `Sentence of finding ${id}.`,
    advice: `Advice of finding ${id}.`,
    data: {},
    ...more,
  };
}

/** A finished check of a program of 500 lines, as the server sends it. */
export function sampleDetails(
  check: Partial<CheckDetails['check']> = {},
  more: Partial<CheckDetails> = {},
): CheckDetails {
  const counts = { stop: 1, hold: 1, note: 1 };
  return checkDetailsSchema.parse({
    check: {
      id: CHECK_ID,
      programId: PROGRAM_ID,
      programName: 'door-left.nc',
      programRevision: 3,
      programRevisionId: REVISION_ID,
      machineId: MACHINE_ID,
      machineName: 'North router',
      state: 'done',
      linesRead: 500,
      lines: 500,
      verdict: 'stopped',
      unattendedVerdict: 'stopped',
      counts,
      askedBy: 'Programmer',
      askedAt: '2026-12-01T18:42:00Z',
      startedAt: '2026-12-01T18:42:00.000Z',
      finishedAt: '2026-12-01T18:42:00.310Z',
      failure: null,
      against: {
        machineRevision: 2,
        rackRevision: 1,
        loadingRevision: 41,
        offsetRevision: 12,
        macroRevision: 7,
        setupSha256: 'a'.repeat(64),
      },
      outOfDate: false,
      ...check,
    },
    summary: {
      format: 'nightlatch-report',
      version: 1,
      engine: '1.0.0',
      program: { name: 'door-left.nc', sha256: HASH, bytes: 9000, lines: 500 },
      setup: { sha256: 'a'.repeat(64) },
      verdict: 'stopped',
      counts,
      unattended: { verdict: 'stopped', counts: { stop: 2, hold: 1, note: 0 } },
      tools: [
        {
          number: 4,
          pocket: 1,
          firstLine: 12,
          changes: 1,
          cutSeconds: 812.4,
          cutLength: 20311.2,
          lowest: -18.4,
        },
      ],
      extents: { gauge: null, work: {} },
      workZeroWindow: { G54: { x: [-60, -14.2], y: null, z: null } },
      seconds: { total: 4320, cutting: 3600, rapid: 400, changes: 300, dwell: 20 },
      material: { used: false, cell: 1, bytes: 0 },
      coverage: { blocks: 480, modelled: 480 },
      dependsOn: { tools: [4], pockets: [1], offsets: ['G54'], pairs: [] },
      blind: ['A loose collet.'],
    },
    setup: SETUP,
    newestRevision: 3,
    sha256: HASH,
    ...more,
  });
}

export const FINDINGS: readonly StoredFinding[] = [
  sampleFinding('11', { line: 4, endLine: 4, worstLine: 4, severity: 'hold', columns: [2, 8] }),
  sampleFinding('12', { endLine: 430, worstLine: 415, count: 9, columns: [4, 11], tool: 4 }),
  sampleFinding('13', {
    line: 500,
    endLine: 500,
    worstLine: 500,
    severity: 'note',
    unattended: 'stop',
  }),
];
export function samplePage(findings: readonly StoredFinding[] = FINDINGS): FindingPage {
  return findingPageSchema.parse({ findings, total: findings.length });
}
