import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { testSetup } from '../testing/test-shop';
import { writeProgram, type Kind } from './generate';
import { MODES, type Mode } from './modes';

/** Programs that are measured. */
const PROGRAMS: readonly (readonly [Kind, number])[] = [
  ['carve', 200_000],
  ['mixed', 200_000],
  ['carve', 1_000_000],
  ['mixed', 1_000_000],
];
const ROUNDS = 5;

interface Figures {
  /** Milliseconds of the whole process, start-up included. */
  readonly cpu: number;
  /** Milliseconds of the work alone. */
  readonly wall: number;
  /** Peak resident memory, MB. */
  readonly peak: number;
}

/** Options: `--rounds 3`, `--lines 200000` (only programs of that length), `--modes check,parser`. */
export function takeTurns(words: readonly string[]): Promise<void> {
  const rounds = Number(option(words, '--rounds') ?? ROUNDS);
  const lines = option(words, '--lines');
  const modes = (option(words, '--modes')?.split(',') ?? MODES) as readonly Mode[];
  const folder = mkdtempSync(join(tmpdir(), 'nightlatch-bench-'));
  try {
    const setup = join(folder, 'setup.json');
    writeFileSync(setup, JSON.stringify(benchSetup()));
    for (const [kind, count] of PROGRAMS)
      if (lines === undefined || count === Number(lines))
        measure({ kind, count, folder, setup, rounds, modes });
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
  return Promise.resolve();
}

function option(words: readonly string[], name: string): string | undefined {
  const at = words.indexOf(name);
  return at < 0 ? undefined : words[at + 1];
}

/** The plain test shop, with the offsets the mixed program uses, and room for its first work zero. */
function benchSetup() {
  return testSetup({
    offsets: {
      work: {
        G54: { x: 30, y: 40, z: -182 },
        G55: { x: 40, y: 700, z: -182 },
        G56: { x: 50, y: 1300, z: -182 },
      },
    },
  });
}

interface Measured {
  readonly kind: Kind;
  readonly count: number;
  readonly folder: string;
  readonly setup: string;
  readonly rounds: number;
  readonly modes: readonly Mode[];
}

function measure({ kind, count, folder, setup, rounds, modes }: Measured): void {
  const file = join(folder, `${kind}.nc`);
  writeProgram(file, kind, count);
  const { size } = statSync(file);
  const rows = new Map<Mode, Figures[]>(modes.map((mode) => [mode, []]));
  for (let round = 0; round < rounds; round++)
    for (const mode of modes) rows.get(mode)!.push(runProcess(mode, file, setup));
  print(
    `\n${kind}, ${count.toLocaleString('en')} lines, ${(size / 1e6).toFixed(1)} MB, ${rounds} rounds`,
  );
  print('mode      cpu ms   blocks/s      MB/s  peak MB   × parser   × count');
  for (const mode of modes) print(row(mode, rows, count, size));
}

function row(
  mode: Mode,
  rows: ReadonlyMap<Mode, readonly Figures[]>,
  count: number,
  size: number,
): string {
  const figures = rows.get(mode)!;
  const seconds = median(figures.map(({ cpu }) => cpu)) / 1000;
  // Each round's own ratio first: the machine's speed drifts between rounds.
  const ratio = (other: Mode, faster: boolean) => {
    const others = rows.get(other);
    if (!others) return '-';
    const ratios = figures.map(({ cpu }, round) =>
      faster ? others[round]!.cpu / cpu : cpu / others[round]!.cpu,
    );
    return median(ratios).toFixed(1);
  };
  return [
    mode.padEnd(8),
    (seconds * 1000).toFixed(0).padStart(8),
    Math.round(count / seconds)
      .toLocaleString('en')
      .padStart(11),
    (size / 1e6 / seconds).toFixed(0).padStart(9),
    median(figures.map(({ peak }) => peak))
      .toFixed(0)
      .padStart(8),
    ratio('parser', true).padStart(10),
    ratio('count', false).padStart(9),
  ].join(' ');
}

/** This very program again, as a process of its own. */
function runProcess(mode: Mode, file: string, setup: string): Figures {
  const own = [...process.execArgv, process.argv[1]!];
  const output = execFileSync(process.execPath, [...own, '--only', mode, file, setup], {
    encoding: 'utf8',
  });
  return JSON.parse(output) as Figures;
}

function median(values: readonly number[]): number {
  const sorted = [...values].sort((one, other) => one - other);
  const middle = Math.floor(sorted.length / 2);
  return sorted.length % 2 === 1 ? sorted[middle]! : (sorted[middle - 1]! + sorted[middle]!) / 2;
}

function print(line: string): void {
  process.stdout.write(`${line}\n`);
}
