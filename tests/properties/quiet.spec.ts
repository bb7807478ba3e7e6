import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { startCheck, type Report, type Setup } from '#engine';
import { RULES } from '../../shared/engine/rules/catalogue';
import { openShop } from '../../shared/engine/shop/shop';
import { openReport } from '../../shared/engine/report/open-report';
import { testSetup } from '../../shared/engine/testing/test-shop';
import { CLEAN_PROGRAM } from '../seeded-faults/clean-program';
import { COUNTS, SEED } from '../counts';
import { mutate, randomNumbers } from './mutate';

/**
 * Motion that no rule is curious about is carried out without calling any. Whatever a rule leaves quiet, its
 * report has to be the one that it gives when it is told every motion: byte for byte.
 */
const SETUPS: readonly Setup[] = [
  testSetup(),
  // Everything that narrows what is quiet, close to where the programs run.
  testSetup({
    machine: {
      travel: { x: [0, 700], y: [0, 2650], z: [-220, 0], a: [-90, 90] },
      spindle: { waits: false },
      bodies: [
        {
          name: 'spindle',
          rides: 'head',
          box: { min: { x: -60, y: -60, z: 0 }, max: { x: 60, y: 60, z: 220 } },
        },
        {
          name: 'boot',
          rides: 'head',
          box: { min: { x: -70, y: -110, z: -99 }, max: { x: 70, y: 45, z: 40 } },
          boot: 'stays',
        },
        { name: 'beam', rides: 'gantry', box: { min: { y: 80, z: -40 }, max: { y: 240, z: 160 } } },
      ],
      zones: [
        {
          name: 'setter',
          box: { min: { x: 300, y: 200, z: -330 }, max: { x: 360, y: 260, z: -180 } },
          forbids: 'everything',
        },
        {
          name: 'post',
          box: { min: { x: 100, y: 100, z: -330 }, max: { x: 110, y: 110, z: -190 } },
          forbids: 'rapid',
        },
      ],
    },
    controller: {
      rapids: 'independent',
      codes: [
        { code: 'M71', does: 'vacuum-on' },
        { code: 'M72', does: 'vacuum-off' },
      ],
    },
    job: {
      obstacles: [
        {
          name: 'clamp',
          in: 'G54',
          box: { min: { x: 200, y: 20, z: -5 }, max: { x: 230, y: 60, z: 20 } },
        },
      ],
    },
    tools: testSetup().tools.map((tool) => ({ ...tool, life: 60, used: 20 })),
  }),
  testSetup({ job: undefined, machine: { spoilboard: undefined } }),
  testSetup({ controller: { lengthScheme: 'none' } }),
];

const HEAD = 'G21 G90 G17 G94\nT4 M6\nG54 G0 X100 Y100\nG43 H4 Z30\nM3 S18000\n';

/** A program that stays near the edges of things: travel, stock, zone, board, feed limits and its own cuts. */
function wander(seed: number): string {
  const random = randomNumbers(seed);
  const pick = <T>(...items: readonly T[]): T => items[random(items.length)]!;
  const x = () => pick(0, 80, 169.9, 170, 200, 299, 330, 640, 669, 669.999, 670.5, random(700));
  const y = () => pick(-40, -39.5, 0, 19, 61, 130, 199, 300, 600, 605, 2350, random(900));
  const z = () =>
    pick(-19.1, -19, -18.5, -10, -0.001, 0, 0.001, 1, 5, 30, 89, 90.5, random(40) - 20);
  const line = (): string => {
    switch (random(16)) {
      case 0:
      case 1:
      case 2:
        return `G1 X${x()} Y${y()}`;
      case 3:
        return `X${x()} Y${y()} Z${z()}`;
      case 4:
        return `G0 X${x()} Y${y()}`;
      case 5:
        return `G0 Z${z()}`;
      case 6:
        return `G1 Z${z()} F${pick(100, 600, 5999, 6000, 6001, 15000, 15001)}`;
      case 7:
        return `G2 X${x()} Y${y()} I${random(40)} J${random(40)}`;
      case 8: {
        const side = 1 + random(60);
        return `G91\nG${pick(2, 3)} X${side} Y0 I${side / 2} J0 Z${pick(0, -1, 1)}\nG90`;
      }
      case 9:
        return `G91\nX${pick(1, -1, 0.5)} Y${pick(1, -1)}\nG1 Z${pick(0.1, -0.1)}\nG90`;
      case 10:
        return pick(
          'G54',
          'G55',
          'G53 G0 Z0',
          'G28 G91 Z0\nG90',
          'G92 X10',
          'G92.1',
          'G52 Y5',
          'G61',
          'G64',
        );
      case 11:
        return pick('M5', 'M3 S18000', 'S9000', 'M71', 'M72', 'M0', 'M1', 'G4 P1', 'M8', 'M9');
      case 12:
        return pick(
          'T5 M6\nG43 H5',
          'T6',
          'M6',
          'G49',
          'G43 H4',
          'G80',
          'G40',
          'G41 D4',
          'G42 D5',
          'G20',
          'G21',
          'G93',
          'G94',
        );
      case 13:
        return pick(
          '(T4 D=0.25 end mill)',
          'G1 X10 (drill 5 mm)',
          '; T5',
          '',
          '  ',
          'N10',
          'F900',
          'G1',
          'G0 X1 ;end',
          '(pocket 12)',
          'G1 X5 (flip the part)\nM0',
          '(MSG, take it off)\nM1',
          'N20 ;',
          'X5 (one) (two)',
          'X5 (one (two)',
          'X5 (one',
          ';ø',
        );
      case 14:
        return `G81 X${x()} Y${y()} Z-3 R2 F300\nG80`;
      default:
        return pick(
          '/G1 X5 Y5',
          'G18',
          'G17',
          'G19',
          '%',
          'G38.2 Z-5 F50',
          'X1.123456789012',
          'X 5',
          'g1x5y5f400',
        );
    }
  };
  const lines = Array.from({ length: 30 + random(60) }, line);
  return `${random(3) === 0 ? '' : HEAD}${lines.join('\n')}\nM30\n`;
}

function report(
  text: string | Uint8Array,
  setup: Setup,
  isAlwaysLoud: boolean,
  chunk = 1e9,
): Report {
  const bytes = typeof text === 'string' ? new TextEncoder().encode(text) : text;
  const check = startCheck(setup, { isAlwaysLoud });
  do {
    for (let at = 0; at < bytes.length; at += chunk) check.push(bytes.subarray(at, at + chunk));
  } while (check.endOfText() === 'read-again');
  return check.report({ name: 'quiet.nc' });
}

test('a wandering program gives the same report whether quiet motion is told or not', () => {
  for (let round = 0; round < COUNTS.quiet; round++) {
    const text = wander(SEED + round);
    const setup = SETUPS[round % SETUPS.length]!;
    const told = report(text, setup, true);
    expect(report(text, setup, false), `round ${round}`).toEqual(told);
    expect(report(text, setup, false, 61), `round ${round}, in pieces`).toEqual(told);
  }
});

test('so does a mutated program', () => {
  const clean = new TextEncoder().encode(CLEAN_PROGRAM);
  for (let round = 0; round < COUNTS.quiet; round++) {
    const bytes = mutate(clean, SEED + round);
    const setup = SETUPS[round % SETUPS.length]!;
    expect(report(bytes, setup, false), `round ${round}`).toEqual(report(bytes, setup, true));
  }
});

/** Programs that people posted, kept beside the project and never in it; none where the folder is absent. */
const FOLDER = new URL('../../../shared/corpus/programs/', import.meta.url);

test('so does every posted program', () => {
  for (const name of existsSync(FOLDER) ? readdirSync(FOLDER).sort() : []) {
    const bytes = new Uint8Array(readFileSync(new URL(name, FOLDER)));
    expect(report(bytes, SETUPS[0]!, false), name).toEqual(report(bytes, SETUPS[0]!, true));
  }
});

test('every observer of motions says what it need not see', () => {
  const cuts = { isKept: false, want: () => undefined };
  const { observers } = openReport(openShop(SETUPS[1]!), RULES, cuts);
  const curious = observers.filter(({ motion, quiet }) => motion && !quiet);
  expect(curious.map(({ motion }) => String(motion))).toEqual([]);
});
