import { expect, test } from 'vitest';
import { startCheck, type Report, type Setup } from '#engine';
import { reportSchema } from '#contracts';
import { testSetup } from '../../shared/engine/testing/test-shop';
import { CLEAN_PROGRAM } from '../seeded-faults/clean-program';
import { COUNTS, SEED } from '../counts';
import { mutate, randomNumbers } from './mutate';

/**
 * Whatever is pushed, the check comes to an end with a report: no exception, no hang. The limit a block is
 * far above what any takes, so that a slow machine does not fail it and an endless loop does.
 */
const MILLISECONDS_A_BLOCK = 50;
/** Two million repeated blocks, at most, are some two seconds; a busy machine takes several times that. */
const MILLISECONDS_A_PROGRAM = 15_000;

const PROGRAMS = [
  CLEAN_PROGRAM,
  '%\nO1\n/T1 M6\nG20 G91\nG2 X1 Y1 I.5 J.5 F9\nG18 G3 X2 Z1 R4\nG83 X1 Z-1 R.1 Q.2\nG80\nG53 G0 Z0\nG28 Z0\nM99',
  '#1=5\no100 sub\nG0 X#1\no100 endsub\no100 call [3]\nIF [#1 EQ 5] GOTO 10\nN10 G65 P100 A1\nM98 P1 L3\nM30\n',
  'G21 G90\n#<a>=[SIN[30]*2] #2=[#<a>**2-1/3]\nM66 P1 L3 Q5\nG38.3 Z-5 F100\nG91 G0 X[#5399*#2] Y#5063\nG90 G53 G0 Z#501\n#5221=[#5221+#500] G54\nG2 X#1005 I[ATAN[1]/[#2]]\n#3006=1 #3000=#0\nM30\n',
  'G21 G17 G54\nT2 M6\nG41 D2\nG1 X9 Y1 F900\nX0\nG3 X-9 Y9 R9 P2\nY30 Z-1\nX0.000000000001\nG2 I4 J-4\nG0 X50\nD5\nG91 X-5\nX5\nG93 Y9 F2\nG40 X1\nG42.1 D-7\nX60\nG40\nG28 A5\nM30\n',
].map((text) => new TextEncoder().encode(text));

const SETUPS: readonly Setup[] = [
  testSetup(),
  testSetup({ controller: { switches: { strict: true } } }),
  testSetup({
    controller: {
      language: 'custom-macro',
      numbers: 'least-increment',
      toolWord: 'pocket',
      changeOn: 'T',
      lengthOffset: 'automatic',
      currentTool: '#500',
      selectedTool: '#501',
      inputs: [{ parameter: '#1005', means: 'air-ok', when: 1 }],
      codes: [
        { code: 'M64', where: { P: 2 }, does: 'air-blast' },
        { code: 'G68', does: 'nothing' },
        { code: 'M98', does: 'save-state' },
        { code: 'M99', does: 'restore-state' },
        { code: 'M61', does: 'set-current-tool', from: 'Q' },
        { code: 'M66', does: 'wait-input', input: 'tool-present', into: '#5399', timeout: -1 },
      ],
    },
    machine: { travel: { a: [-360, 360] }, changePoint: { x: 0, y: 0, z: 0 }, references: {} },
    offsets: { work: {} },
  }),
];

function check(bytes: Uint8Array, setup: Setup): Report {
  const run = startCheck(setup);
  do run.push(bytes);
  while (run.endOfText() === 'read-again');
  return run.report({ name: 'fuzz.nc' });
}

function checkInTime(bytes: Uint8Array, setup: Setup): Report {
  const before = performance.now();
  const report = check(bytes, setup);
  const taken = performance.now() - before;
  const most = Math.max(MILLISECONDS_A_PROGRAM, report.program.lines * MILLISECONDS_A_BLOCK);
  expect(taken).toBeLessThan(most);
  return report;
}

test(
  'a mutated program always gives a report that fits its contract',
  { timeout: 3_600_000 },
  () => {
    for (let round = 0; round < COUNTS.fuzz; round++) {
      const bytes = mutate(PROGRAMS[round % PROGRAMS.length]!, SEED + round);
      const setup = SETUPS[round % SETUPS.length]!;
      try {
        const report = checkInTime(bytes, setup);
        if (round % 10 === 0) reportSchema.parse(report);
      } catch (error) {
        const text = new TextDecoder('latin1').decode(bytes);
        throw new Error(`Round ${round} failed on ${JSON.stringify(text)}`, { cause: error });
      }
    }
  },
);

test('random bytes give a report too', { timeout: 3_600_000 }, () => {
  for (let round = 0; round < COUNTS.garbage; round++) {
    const random = randomNumbers(SEED + round);
    const bytes = Uint8Array.from({ length: random(400) }, () => random(256));
    expect(() => checkInTime(bytes, SETUPS[round % SETUPS.length]!)).not.toThrow();
  }
});

test.each([
  ['digits', '1'],
  ['a letter', 'X'],
  ['words', 'X1'],
  ['open brackets', '('],
  ['closed brackets', ')'],
  ['square brackets', 'X['],
  ['semicolons', ';'],
  ['blanks', ' '],
  ['digits and blanks', '1 '],
  ['points', '.'],
  ['signs', '-'],
  ['numbers of parameters', '#'],
  ['odd characters', '\u0001'],
  ['letters O', 'O'],
  ['function names', 'ABS'],
  ['slashes', '/'],
  ['percent signs', '%'],
])(
  'a line of four million bytes of %s is read in time that grows with its length',
  (_what, piece) => {
    const bytes = new TextEncoder().encode(
      `X${piece.repeat(Math.floor(4_000_000 / piece.length))}`,
    );
    const before = performance.now();
    const report = check(bytes, SETUPS[0]!);
    expect(performance.now() - before).toBeLessThan(5_000);
    expect(report.verdict).toBe('stopped');
    expect(report.program.lines).toBe(1);
  },
);

test.each([
  ['carriage returns', '\r'],
  ['blank lines', '\n'],
  ['comments', '()\n'],
  ['unreadable lines', 'X\n'],
  ['lone G53', 'G53\n'],
])('two hundred thousand lines of %s are counted', (_what, line) => {
  const lines = 200_000;
  const report = check(new TextEncoder().encode(line.repeat(lines)), SETUPS[0]!);
  expect(report.program.lines).toBe(lines);
});
