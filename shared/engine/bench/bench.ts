import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { testSetup } from '../testing/test-shop';
import { writeProgram, type Kind } from './generate';
import type { Mode } from './modes';

/**
 * `npm run bench`: how fast the engine is, in whole processes that take turns, so that a machine whose speed
 * drifts slows all of them alike. Options: `--pairs 7`, `--only carve,mixed,flow,length,hostile`.
 */
const PAIRS = 7;
const LINES = 1_000_000;
const LONG_LINES = 4_000_000;
const FLOW_LINES = 50_000;
const HOSTILE_BYTES = 4_000_000;
/** What the full check is held against, and how it reads: how many times its processor time they take. */
const OTHERS: readonly (readonly [Mode, string])[] = [
  ['parser', 'gcode-parser parseFileSync'],
  ['stream', 'gcode-parser GCodeLineStream'],
  ['readline', 'bare readline'],
  ['count', 'newline count'],
];
/** Stages on the way to a report, each with all before it. */
const STAGES: readonly Mode[] = ['count', 'lex', 'blocks', 'walk', 'check'];

interface Figures {
  /** Milliseconds of processor time of the whole process, start-up included. */
  readonly cpu: number;
  /** Milliseconds of the work alone. */
  readonly wall: number;
  /** Peak resident memory, MB. */
  readonly peak: number;
}

const words = process.argv.slice(2);
const pairs = Number(option('--pairs') ?? PAIRS);
const only = option('--only')?.split(',');
const folder = mkdtempSync(join(tmpdir(), 'nightlatch-bench-'));
const setup = join(folder, 'setup.json');
try {
  writeFileSync(setup, JSON.stringify(benchSetup()));
  for (const kind of ['carve', 'mixed', 'flow'] as const) if (isWanted(kind)) compare(kind);
  if (isWanted('length')) compareLengths();
  if (isWanted('hostile')) tryHostile();
} finally {
  rmSync(folder, { recursive: true, force: true });
}

function option(name: string): string | undefined {
  const at = words.indexOf(name);
  return at < 0 ? undefined : words[at + 1];
}

function isWanted(part: string): boolean {
  return only === undefined || only.includes(part);
}

/** One rack with eight holders, three bodies, and the offsets that the mixed program uses. */
function benchSetup() {
  const { bodies } = testSetup().machine;
  return testSetup({
    machine: {
      bodies: [
        ...bodies,
        {
          name: 'boot',
          rides: 'head',
          box: { min: { x: -70, y: -110, z: 4 }, max: { x: 70, y: 45, z: 40 } },
          boot: 'stays',
        },
        { name: 'beam', rides: 'gantry', box: { min: { y: 80, z: -40 }, max: { y: 240, z: 160 } } },
      ],
    },
    offsets: {
      work: {
        G54: { x: 30, y: 40, z: -182 },
        G55: { x: 40, y: 700, z: -182 },
        G56: { x: 50, y: 1300, z: -182 },
      },
    },
  });
}

function compare(kind: Kind): void {
  const lines = kind === 'flow' ? FLOW_LINES : LINES;
  const file = write(kind, lines);
  const { size } = statSync(file);
  const figures = takeTurns(file, [...new Set([...OTHERS.map(([mode]) => mode), ...STAGES])]);
  const cpu = (mode: Mode) => figures.get(mode)!.map((each) => each.cpu);
  const seconds = median(cpu('check')) / 1000;
  print(`\n${kind}: ${count(lines)} lines, ${(size / 1e6).toFixed(1)} MB, ${pairs} pairs`);
  print(
    `  full check ${(seconds * 1000).toFixed(0)} ms of processor time, whole process: ` +
      `${count(Math.round(lines / seconds))} lines/s, ${(size / 1e6 / seconds).toFixed(0)} MB/s, ` +
      `peak ${median(figures.get('check')!.map((each) => each.peak)).toFixed(0)} MB`,
  );
  for (const [mode, name] of OTHERS) print(`  ${ratio(cpu(mode), cpu('check'))} × ${name}`);
  const stages = STAGES.map((mode) => {
    const own = median(figures.get(mode)!.map((each) => each.wall));
    return `${mode} ${own.toFixed(0)}`;
  });
  print(`  work alone, ms, each stage with all before it: ${stages.join(', ')}`);
}

/** Others over ours, each round for itself first: a median with its range. */
function ratio(others: readonly number[], ours: readonly number[]): string {
  const ratios = others.map((other, round) => other / ours[round]!);
  const range = `[${Math.min(...ratios).toFixed(1)}–${Math.max(...ratios).toFixed(1)}]`;
  return `${median(ratios).toFixed(1)} ${range}`.padStart(18);
}

/** Memory must not grow with the program. */
function compareLengths(): void {
  for (const kind of ['carve', 'mixed'] as const) {
    const peaks = [LINES, LONG_LINES].map((lines) => {
      const figures = takeTurns(write(kind, lines), ['check'], 3).get('check')!;
      return `${count(lines)} lines ${median(figures.map((each) => each.peak)).toFixed(0)} MB`;
    });
    print(`\n${kind}, peak memory: ${peaks.join(', ')}`);
  }
}

/** Lines that no post writes, as long as a small program. */
function tryHostile(): void {
  const pieces = ['X1', '1', '(', '[', '#', ' ', ';', 'G1', 'X#[', '\r', '%', '/', 'é', '\0'];
  const slowest = pieces.map((piece) => {
    const file = join(folder, 'hostile.nc');
    writeFileSync(file, piece.repeat(HOSTILE_BYTES / piece.length));
    const wall = median(
      takeTurns(file, ['check'], 3)
        .get('check')!
        .map((each) => each.wall),
    );
    return { piece, wall };
  });
  slowest.sort((one, other) => other.wall - one.wall);
  const [worst] = slowest;
  print(
    `\nhostile: ${HOSTILE_BYTES / 1e6} MB of one piece, ${pieces.length} pieces, the slowest ` +
      `${JSON.stringify(worst!.piece)} in ${worst!.wall.toFixed(0)} ms`,
  );
}

function write(kind: Kind, lines: number): string {
  const file = join(folder, `${kind}-${lines}.nc`);
  writeProgram(file, kind, lines);
  return file;
}

function takeTurns(file: string, modes: readonly Mode[], rounds = pairs): Map<Mode, Figures[]> {
  const figures = new Map<Mode, Figures[]>(modes.map((mode) => [mode, []]));
  for (let round = 0; round < rounds; round++)
    for (const mode of modes) figures.get(mode)!.push(runProcess(mode, file));
  return figures;
}

/** One mode in a process of its own, by the bundle beside this one. */
function runProcess(mode: Mode, file: string): Figures {
  const program = join(dirname(process.argv[1]!), 'bench-run.cjs');
  const output = execFileSync(process.execPath, [program, mode, file, setup], { encoding: 'utf8' });
  return JSON.parse(output) as Figures;
}

function median(values: readonly number[]): number {
  const sorted = [...values].sort((one, other) => one - other);
  const middle = Math.floor(sorted.length / 2);
  return sorted.length % 2 === 1 ? sorted[middle]! : (sorted[middle - 1]! + sorted[middle]!) / 2;
}

function count(lines: number): string {
  return lines.toLocaleString('en');
}

function print(line: string): void {
  process.stdout.write(`${line}\n`);
}
