import type { Setup } from '#engine';
import { testSetup } from '../../shared/engine/testing/test-shop';
import type { Row } from './row';

/** Pockets of the report's stand-alone model, which its T, H and D limits rest on. */
const POCKETS = 68;
const FAR = 100_000;

/** The machine a row was computed for: everything at zero, travel without bounds, the row's tables. */
export function rowSetup(row: Row): Setup {
  const { setup } = row;
  const unit = setup.units === 'inch' ? 25.4 : 1;
  const flags = setup.dialectFlags ?? {};
  const namesPockets = row.dialect === 'ngc';
  const tools = setup.toolTable.map(({ pocket, id, diameter }) =>
    tool(namesPockets ? id : pocket, diameter),
  );
  const table = (value: 'length' | 'diameter') =>
    Object.fromEntries(setup.toolTable.map((entry) => [`${entry.pocket}`, entry[value]]));
  const offsets = ['G54', 'G55', 'G56', 'G57', 'G58', 'G59', 'G59.1', 'G59.2', 'G59.3'];
  const scaled = (point: { x: number; y: number; z: number }) => ({
    x: point.x * unit,
    y: point.y * unit,
    z: point.z * unit,
  });
  return testSetup({
    asOf: undefined,
    job: undefined,
    machine: {
      travel: {
        x: [-FAR, FAR],
        y: [-FAR, FAR],
        z: [-FAR, FAR],
        ...(setup.rotary ? { a: [-FAR, FAR] } : {}),
      },
      start: { x: 0, y: 0, z: 0 },
      references: { g28: reference(row, 5161), g30: reference(row, 5181) },
      spoilboard: undefined,
      bodies: [],
      spindle: { minRpm: 0, turns: ['cw', 'ccw'] },
    },
    controller: {
      language: row.dialect === 'macro-b' ? 'custom-macro' : 'rs274ngc',
      // The reference starts with G99 (sheet, section 2).
      defaults: { units: setup.units, return: 'G99' },
      // The sheet's rows 13 and 14 state the inch limit; it is 0.0002 inch in the report.
      arcTolerance: setup.units === 'inch' ? 0.0002 * 25.4 : 0.002,
      dwell: flags['dwellUnit'] === 'ms' ? 'milliseconds' : 'seconds',
      numbers: flags['decimalless'] === 'increments' ? 'least-increment' : 'decimal',
      toolWord: namesPockets ? 'pocket' : 'tool',
      toolChange: flags['m6'] === 'ignore' ? 'ignored' : 'controller',
      parameters: parameters(row),
      switches: {
        homeAxes: flags['g28'] === 'namedAxesOnly' ? 'named' : 'all',
        cycleReturn: flags['g98Level'] === 'seriesStart' ? 'series' : 'line',
        startMotion: flags['initialMotion'] === 'G0' ? 'rapid' : 'none',
        lengthWithoutH: flags['g43WithoutH'] === 'toolInSpindle' ? 'held-tool' : 'refused',
        packedM98: flags['m98'] === 'packed',
        incrementalMachineMove: 'refused',
        strict: row.expected.error !== undefined && row.dialect === 'ngc',
      },
    },
    rack: { pockets: Array.from({ length: POCKETS }, (_, index) => pocket(index + 1)) },
    loading: {
      pockets: setup.toolTable.map((entry) => ({
        pocket: entry.pocket,
        tool: namesPockets ? entry.id : entry.pocket,
      })),
      inSpindle: setup.toolInSpindle === 0 ? null : setup.toolInSpindle,
    },
    tools,
    offsets: {
      length: table('length'),
      diameter: table('diameter'),
      work: Object.fromEntries(
        offsets.map((name) => [name, scaled(setup.wcs[name] ?? { x: 0, y: 0, z: 0 })]),
      ),
    },
  });
}

function reference({ setup }: Row, first: number) {
  const unit = setup.paramUnits === 'inch' ? 25.4 : 1;
  const axis = (index: number) => (setup.params[`${first + index}`] ?? 0) * unit;
  return { x: axis(0), y: axis(1), z: axis(2) };
}

/** Parameters of the row beside the stored points, which the setup has a place of its own for. */
function parameters({ setup }: Row) {
  const own = Object.entries(setup.params).filter(([number]) => !/^51[68]\d$/.test(number));
  return Object.fromEntries(own.map(([number, value]) => [`#${number}`, value]));
}

const pocket = (number: number) => ({
  number,
  grip: { x: number * 100, y: 50_000, z: 0 },
  opens: '-y',
  largestDiameter: 80,
  longest: 300,
  taper: 'ISO30',
});

const tool = (number: number, diameter: number) => ({
  number,
  name: `tool ${number}`,
  kind: 'other',
  diameter: Math.abs(diameter) || 1,
  shank: 6,
  stickOut: 40,
  fluteLength: 25,
  gaugeLength: 90,
  holder: { taper: 'ISO30', diameter: 50, above: 72 },
  maxRpm: 30_000,
  turns: 'cw',
});
