import { describe, expect, test } from 'vitest';
import { startCheck, startTrace, type Finding, type TraceMotion } from './index';
import { runProgram } from './testing/check-rule';
import { testSetup } from './testing/test-shop';

const MACRO = { controller: { language: 'custom-macro' } };

/** Line, rule and assumptions of the findings of some rules; all that stop where none are named. */
function found(program: string, change: object, ...rules: readonly string[]): string[] {
  return runProgram(program, change)
    .findings.filter(({ rule, severity }) =>
      rules.length > 0 ? rules.includes(rule) : severity === 'stop',
    )
    .map(show);
}

function show({ line, rule, assumed, blockDelete }: Finding): string {
  const under = (assumed ?? []).map((each) => `${each.line} ${each.condition}`);
  return [`${line} ${rule}`, ...under, ...(blockDelete ? ['block delete'] : [])].join(', ');
}

describe('a condition that nothing decides before the run', () => {
  test('is walked both ways, and what only one of them finds says what it assumes', () => {
    const program = 'G21 G90 G54\nIF [#500 GT 3] GOTO 20\nG0 X5000\nN20 G0 Y9000\nM30';
    expect(found(program, MACRO, 'beyond-travel')).toEqual([
      '3 beyond-travel, 2 [#500 GT 3] does not hold',
      '4 beyond-travel',
    ]);
  });

  test('is one question wherever it stands again, as long as its value is the same', () => {
    const program =
      'G21 G90 G54\nN5 #100=1\no1 repeat [3]\no2 if [#500 EQ 1]\nG0 X5000\no2 endif\no1 endrepeat\nM30';
    expect(found(program, {}, 'beyond-travel', 'not-modelled')).toEqual([
      '5 beyond-travel, 4 [#500 EQ 1] holds',
    ]);
  });

  test('may set a parameter', () => {
    const program = 'G21 G90 G54\n#1=10\nIF [#500 GT 3] THEN #1=9000\nG0 X#1\nM30';
    expect(found(program, MACRO, 'beyond-travel')).toEqual([
      '4 beyond-travel, 3 [#500 GT 3] holds',
    ]);
  });

  test('takes nothing for granted that the setup states', () => {
    const stated = { controller: { language: 'custom-macro', parameters: { '#500': 9 } } };
    const program = 'G21 G90 G54\nIF [#500 GT 3] GOTO 20\nG0 X5000\nN20 M30';
    expect(found(program, stated)).toEqual([]);
  });

  test('in a loop is followed until nothing changes any more', () => {
    const program = 'G21 G90 G54\nG0 X0\no1 while [#500 LT 3]\nG0 X5\no1 endwhile\nG0 X5000\nM30';
    expect(found(program, {}, 'beyond-travel', 'not-modelled', 'never-ends')).toEqual([
      '6 beyond-travel',
    ]);
  });

  test('in a loop that goes on and on is named', () => {
    const program = 'G21 G91 G54\nG0 X0\no1 while [#500 LT 3]\nG0 X5\no1 endwhile\nM30';
    expect(found(program, {}, 'not-modelled')).toEqual(['3 not-modelled']);
  });

  test('beyond what is walked is named', () => {
    const ifs = Array.from(
      { length: 6 },
      (_, at) => `o${at} if [#${500 + at} EQ 1]\nG4 P1\no${at} endif\n`,
    ).join('');
    const lines = found(`G21 G90 G54\n${ifs}M30`, {}, 'not-modelled');
    expect(lines).not.toEqual([]);
    const few = ifs.split('\n').slice(0, 12).join('\n');
    expect(found(`G21 G90 G54\n${few}\nM30`, {}, 'not-modelled')).toEqual([]);
  });

  test('in a subprogram of the setup says where it stands', () => {
    const given = {
      subprograms: [{ name: 'O7', text: 'o1 if [#500 EQ 1]\nG0 X5000\no1 endif\nM99' }],
    };
    const [finding] = runProgram('G21 G90 G54\nM98 P7\nM30', given).findings.filter(
      ({ rule }) => rule === 'beyond-travel',
    );
    expect(finding).toMatchObject({
      line: 2,
      within: { text: 'O7', line: 2, columns: [4, 9] },
      assumed: [{ line: 2, within: { text: 'O7', line: 1 }, condition: '[#500 EQ 1] holds' }],
    });
  });
});

test('what a report rests on includes what only another outcome uses', () => {
  const program =
    'G21 G90 G54\nG53 G0 Z0\nT1 M6\no1 if [#500 EQ 1]\nG4 P1\no1 else\nT3 M6\no1 endif\nM30';
  const { dependsOn, tools } = runProgram(program);
  expect(dependsOn.tools).toEqual([1, 3]);
  expect(dependsOn.pairs).toContainEqual([1, 3]);
  // Times and uses are those of the walk in which conditions hold.
  expect(tools.map(({ number }) => number)).toEqual([1]);
});

describe('block delete in a program whose text is kept', () => {
  test('is read both ways', () => {
    const program = 'G21 G90 G54\n/ GOTO 20\nG0 X5000\nN20 G0 Y10\nM30';
    expect(found(program, MACRO, 'beyond-travel')).toEqual(['3 beyond-travel, block delete']);
  });

  test('a walk that skips may be the first to need the text', () => {
    const program = 'G21 G90 G54\n/M30\nM98 P5\nM30\nO5\nG0 X5000\nM99';
    expect(found(program, {}, 'beyond-travel')).toEqual(['6 beyond-travel, block delete']);
  });
});

describe('coverage', () => {
  test('counts a line once, however often it is run', () => {
    const program = 'G21 G90 G54\no1 repeat [5]\nM250\nG4 P1\no1 endrepeat\nM30\n(NOTE)\n%';
    expect(runProgram(program).coverage).toEqual({ blocks: 6, modelled: 5 });
  });
  test('an episode counts the blocks carried out', () => {
    const program = 'G21 G90 G54\no1 repeat [5]\nG0 X5000\nX5001\no1 endrepeat\nM30';
    const [finding] = runProgram(program).findings.filter(({ rule }) => rule === 'beyond-travel');
    expect(finding).toMatchObject({ line: 3, endLine: 4, worstLine: 4, count: 10 });
  });
});

/** Pushes until nothing more is asked for; gives how often that was. */
function pushes(program: string | readonly Uint8Array[], change: object = {}): number {
  const check = startCheck(testSetup(change), { digests: false });
  const chunks = typeof program === 'string' ? [new TextEncoder().encode(program)] : program;
  let count = 0;
  do {
    for (const chunk of chunks) check.push(chunk);
    count++;
  } while (check.endOfText() === 'read-again');
  check.report({ name: 'x', sha256: '' });
  return count;
}

test('a plain program is pushed once, one that steers twice, whatever it skips', () => {
  expect(pushes('G21\nO1000\n#1=5\nG0 X#1\nM30')).toBe(1);
  expect(pushes('G21\nIF [1 EQ 2] THEN #1=5\nM30', MACRO)).toBe(1);
  expect(pushes('G21\nM98 P5\n/G0 X1\nM30\nO5\nM99')).toBe(2);
});

test('the published language alone has nothing to follow', () => {
  const strict = { controller: { switches: { strict: true } } };
  expect(pushes('G21\nM98 P5\nM30\nO5\nM99', strict)).toBe(1);
  expect(found('o1 sub\no1 endsub\nM30', strict)).toContain('1 not-modelled');
});

describe('a program too long to be kept', () => {
  const encode = (text: string) => new TextEncoder().encode(text);
  const LINE = encode(`(${'x'.repeat(60_000)})\n`);
  const filler = Array.from({ length: 1_150 }, () => LINE);

  test('is read on without following anything, and says so', () => {
    const chunks = [
      encode('G21 G90 G54\nG0 X5000\nM98 P5\nG0 Y9000\n'),
      ...filler,
      encode('o1 call\nM30\nO5\nM99\n'),
    ];
    const check = startCheck(testSetup(), { digests: false });
    do for (const chunk of chunks) check.push(chunk);
    while (check.endOfText() === 'read-again');
    const report = check.report({ name: 'x', sha256: '' });
    const stops = report.findings.filter(({ severity }) => severity === 'stop').map(show);
    expect(stops).toEqual([
      '2 beyond-travel',
      '3 not-modelled',
      '4 beyond-travel',
      '1155 not-modelled',
    ]);
    expect(report.findings.find(({ line }) => line === 3)?.message).toContain('at most 64 MB');
    expect(report.program.lines).toBe(1158);
    expect(report.coverage.blocks).toBe(8);
  });
});

test('a trace tells each motion once, though it is pushed twice', () => {
  const motions: TraceMotion[] = [];
  const trace = startTrace(testSetup(), (motion) => motions.push(motion));
  const bytes = new TextEncoder().encode('G0 X1\nM98 P5 L2\nM30\nO5\nG91 G0 X1\nM99');
  trace.push(bytes);
  expect(trace.endOfText()).toBe('read-again');
  trace.push(bytes);
  expect(trace.endOfText()).toBe('done');
  expect(motions.map(({ line }) => line)).toEqual([1, 5, 5]);
});
