import { describe, expect, test } from 'vitest';
import { checkProgram, startTrace, type Report, type TraceMotion } from '#engine';
import { testSetup } from '../../shared/engine/testing/test-shop';

/**
 * What posted programs do that a naive reader trips over: one test for each kind seen in a count of over a
 * hundred programs that people posted (common practice, no source). The programs here are written for the
 * test; each holds one oddity in an otherwise plain program.
 */
const HEAD = 'G21 G90 G17 G94 G40 G49 G80\nG54\n';
const FETCH = 'T1 M6\nS12000 M3\nG0 X50 Y50\nG43 H1 Z20\n';
const CUT = 'G1 Z-2 F900\nG1 X90\nG0 Z20\n';
const END = 'M5\nG53 G0 Z0\nM30\n';
const plain = (body: string) => `${HEAD}${FETCH}${body}${CUT}${END}`;

const rules = (report: Report) => report.findings.map(({ rule, line }) => `${rule} ${line}`);
const check = (program: string | Uint8Array, change: object = {}) =>
  checkProgram(program, testSetup(change));

/** Ends of the motions, in program coordinates of the test shop's G54 and without the length of T1. */
function ends(program: string, change: object = {}): string[] {
  const moved: TraceMotion[] = [];
  const trace = startTrace(testSetup(change), (motion) => moved.push(motion));
  const bytes = new TextEncoder().encode(program);
  do trace.push(bytes);
  while (trace.endOfText() === 'read-again');
  return moved.map(({ line, to }) => `${line} ${to?.x},${to?.y},${to?.z}`);
}

test('the plain program that all others are a change of is clear', () => {
  expect(rules(check(plain('')))).toEqual([]);
});

describe('tool words', () => {
  test('a lone T that the next change fetches is pre-selection, and the H is that of the held tool', () => {
    const program = `${HEAD}T1 M6\nT2\nS12000 M3\nG0 X50 Y50\nG43 H1 Z20\n${CUT}M5\nM6\nS12000 M3\nG0 X60 Y60\nG43 H2 Z20\n${CUT}${END}`;
    expect(rules(check(program))).toEqual([]);
  });
  test.each(['T1M6', 'M06T1', 'M6 T1', 'N30 M06 T01', 'T1\nM6', 'F300.0000 T1 M6'])(
    '%s changes to T1',
    (change) => {
      const report = check(plain('').replace('T1 M6', change));
      expect(report.tools.map(({ number }) => number)).toEqual([1]);
      expect(report.verdict).toBe('clear');
    },
  );
  test('a change inside a comment is none', () => {
    const report = check(`${HEAD}( M6 T10.0 )\n(N30 T2 M6)\n${FETCH}${CUT}${END}`);
    expect(report.tools.map(({ number }) => number)).toEqual([1]);
  });
  test('T with no M6 anywhere is told, because nothing changes the tool', () => {
    expect(rules(check(`${HEAD}T1\nS12000 M3\nG0 X50 Y50 Z20\n${CUT}${END}`))).toContain(
      'selected-not-changed 3',
    );
  });
  test('the same tool called twice is one tool with two changes', () => {
    const again = `M5\nT2 M6\nS12000 M3\nG43 H2 Z20\nM5\n${FETCH}${CUT}`;
    expect(check(`${HEAD}${FETCH}${CUT}${again}${END}`).tools).toMatchObject([
      { number: 1, changes: 2 },
      { number: 2, changes: 1 },
    ]);
  });
  test('a lathe’s T0505 is tool 505, which the list does not have', () => {
    expect(rules(check(plain('').replace('T1 M6', 'T0505 M6')))).toContain('tool-unknown 3');
  });
});

describe('lines and frames', () => {
  test('a colon marks a main block and is read past', () => {
    expect(rules(check(plain('').replace('T1 M6', ':T1 M6')))).toEqual([]);
  });
  test('line numbers wrap, repeat and run backwards, and steer nothing', () => {
    const numbered = plain('')
      .split('\n')
      .map((line, at) => (line === '' ? '' : `N${[99995, 10, 10, 5][at % 4]} ${line}`))
      .join('\n');
    expect(rules(check(numbered))).toEqual([]);
  });
  test('a frame may follow comments, and text may stand behind its sign', () => {
    expect(rules(check(`(MADE FOR A TEST)\n% one\n${plain('')}%\n`))).toEqual([]);
  });
  test('two joined frames: what stands behind the first end is told', () => {
    expect(rules(check(`%\n${plain('')}%\n%\n${plain('')}%\n`))).toEqual(['text-after-end 16']);
  });
  test.each(['O0001', 'O01001', 'O1001 (SIDE)', '(1001)', ':1001'])(
    '%s in front names the program',
    (name) => {
      expect(rules(check(`%\n${name}\n${plain('')}%\n`))).toEqual([]);
    },
  );
  test('an alphabetic program name with brackets is named, and the rest is read', () => {
    const report = check(`ORECTANGLE(..)\n${plain('')}`);
    expect(report.coverage.modelled).toBeGreaterThanOrEqual(report.coverage.blocks - 1);
    expect(report.tools.map(({ number }) => number)).toEqual([1]);
  });
  test('a local subprogram behind M30 is no text after the end when it is called', () => {
    const program = `${HEAD}${FETCH}M97 P250\n${END}N250 G1 Z-2 F900\nG1 X90\nG0 Z20\nM99\n`;
    expect(rules(check(program))).toEqual([]);
    expect(ends(program).filter((end) => end.startsWith('11 '))).toHaveLength(1);
  });
  test('conflict markers are no blocks, and both versions are read', () => {
    const report = check(`${HEAD}${FETCH}<<<<<<< HEAD\n${CUT}=======\n${CUT}>>>>>>> other\n${END}`);
    expect(rules(report).filter((each) => each.startsWith('unreadable-block'))).not.toEqual([]);
    expect(report.verdict).toBe('stopped');
  });
  test('a line of dots is no block', () => {
    expect(rules(check(plain('...\n')))).toEqual(['unreadable-block 7']);
  });
  test('no last line end, a byte-order mark, CRLF, blanks behind, umlauts in comments: all read', () => {
    const bytes = new TextEncoder().encode(
      `\ufeff${plain('(Tür rechts, Дверь)\n').replaceAll('\n', '  \r\n')}`.trimEnd(),
    );
    expect(rules(check(bytes))).toEqual([]);
  });
  test('Latin-1 in a comment is read', () => {
    const bytes = Uint8Array.from([...plain('(T\u00fcr)\n')].map((each) => each.charCodeAt(0)));
    expect(rules(check(bytes))).toEqual([]);
  });
});

describe('modes', () => {
  test('units that nobody states are held, not guessed', () => {
    expect(rules(check(plain('').replace('G21 ', '')))).toEqual(['units-not-stated 5']);
  });
  test('after a lone plane word a Z word goes on in the last motion mode', () => {
    const program = plain('').replace('G1 X90\n', 'G1 X90\nG17\nZ-1.5\n');
    expect(ends(program)).toContain('10 120,90,-88.5');
  });
  test('a lone F and a lone G1 set a mode and move nothing', () => {
    const program = plain('F900\nG1\n').replace('G1 X90', 'X90');
    expect(rules(check(program))).toEqual([]);
  });
  test('G18 G3 changes the plane and moves; G17 comes back later', () => {
    const program = plain('').replace('G1 X90\n', 'G18 G3 X54 Z-2 I2 K2\nG17\nG1 X90\n');
    const report = check(program);
    expect(rules(report)).toEqual([]);
  });
  test('a program in G91 throughout goes where its G90 twin goes', () => {
    const absolute = `${HEAD}G0 X50 Y50\nG0 Z-5\nG1 X60 F900\nG1 Y70\nG0 Z0\nM30\n`;
    const incremental = `${HEAD}G0 X50 Y50\nG91\nG0 Z-5\nG1 X10 F900\nG1 Y20\nG0 Z5\nG90\nM30\n`;
    const strip = (moves: string[]) => moves.map((each) => each.split(' ')[1]);
    const start = { machine: { start: { x: 30, y: 40, z: -182 } } };
    expect(strip(ends(incremental, start))).toEqual(strip(ends(absolute, start)));
  });
  test('G92 S is a speed limit, not an offset', () => {
    const report = check(plain('G92 S15000\n'));
    expect(rules(report)).not.toContain('position-assumed 7');
    expect(report.extents.work).toEqual(check(plain('')).extents.work);
  });
  test('G28 under G91, back to G90 on the next line', () => {
    expect(rules(check(plain('').replace('G53 G0 Z0', 'G28 G91 Z0.\nG90')))).toEqual([]);
  });
  test('the motion word may stand behind the coordinates of G53', () => {
    expect(rules(check(plain('').replace('G53 G0 Z0', 'G53 Z0 G0')))).toEqual([]);
  });
  test('G28 U0 and W0 name an axis that the machine does not have', () => {
    expect(rules(check(plain('G28 U0.\n')))).toContain('not-modelled 7');
  });
});

describe('arcs and cycles', () => {
  test.each([
    ['centre words in front', 'G2 I10 J0 X70 Y50'],
    ['no blanks', 'G2X70Y50I10J0'],
    ['a radius', 'G2 X70 Y50 R10'],
    ['absolute centres', 'G90.1\nG2 X70 Y50 I60 J50\nG91.1'],
  ])('%s', (_what, arc) => {
    expect(rules(check(plain('').replace('G1 X90\n', `${arc}\n`)))).toEqual([]);
  });
  test('a full circle needs no end point', () => {
    const program = plain('').replace('G1 X90\n', 'G2 F900 I10 J0\n');
    expect(rules(check(program))).toEqual([]);
    expect(ends(program).filter((end) => end.startsWith('8 '))).toHaveLength(1);
  });
  test('a K word in the XY plane is told', () => {
    expect(rules(check(plain('').replace('G1 X90\n', 'G2 X70 Y50 I10 K1\n')))).toContain(
      'arc-impossible 8',
    );
  });
  test('X and Y alone go on with a cycle, and G0 ends it', () => {
    const program = `${HEAD}T3 M6\nS8000 M3\nG0 X50 Y50\nG43 H3 Z20\nG98 G81 Z-5 R2 F300\nX60\nY60\nG0 Z20\nX70\n${END}`;
    expect(rules(check(program))).toEqual([]);
    expect(ends(program).at(-2)).toBe('11 100,100,-66');
  });
});

describe('comments', () => {
  test.each([
    ['a semicolon inside brackets', '(a ; b)\n'],
    ['brackets behind a semicolon', '; a (b\n'],
    ['tabs, quotes and inch marks', '(\t1/2" "end mill")\n'],
    ['words that look like code', '(M6 T9 G55 X900)\n'],
    ['a comment between words', 'G0 (to the side) X50\n'],
  ])('%s', (_what, line) => {
    expect(rules(check(plain(line)))).toEqual([]);
  });
  test('nested brackets are told once', () => {
    expect(rules(check(plain('(a (b) c)\n')))).toEqual(['nested-comment 7']);
  });
  test('an open bracket hides the rest of its line, which is told', () => {
    expect(rules(check(plain('G0 X55 (to the side\n')))).toContain('unreadable-block 7');
  });
});

describe('slips of the hand', () => {
  test.each([
    ['MO6', 'T1 MO6', 'letter-for-digit 3'],
    ['HO1', 'T1 M6\nG43 HO1 Z20', 'letter-for-digit 4'],
  ])('%s', (_what, slip, finding) => {
    expect(rules(check(plain('').replace('T1 M6', slip)))).toContain(finding);
  });
  test('a block number with a blank in it is told', () => {
    const found = rules(check(plain('N10 21 G40\n')));
    expect(found).toContain('odd-characters 7');
  });
  test.each(['M97 300', 'G1 X Y2', 'G1 X1,5', 'X1.2.3', 'X--5'])('%s is no block', (slip) => {
    const found = rules(check(plain(`${slip}\n`)));
    expect(found.some((each) => each.endsWith(' 7'))).toBe(true);
    expect(check(plain(`${slip}\n`)).verdict).toBe('stopped');
  });
  test('an exponent is told, and read as the number it is', () => {
    expect(rules(check(plain('G1 Z-2 F900\nX5.0e+01\n')))).toContain('unreadable-block 8');
  });
  test('a cutter with no feed, and G0 with a feed', () => {
    expect(rules(check(plain('G0 X55 F3000\n')))).toEqual([]);
  });
});

describe('block delete, and what is computed', () => {
  test('a slash in front of a whole tool change is read both ways', () => {
    const program = `${HEAD}${FETCH}${CUT}M5\n/ T2 M6\n/ S12000 M3\n/ G43 H2 Z20\n${END}`;
    expect(rules(check(program))).toContain('block-delete-matters 11');
  });
  test('a G number, a coordinate and a jump from variables', () => {
    const program = `#140=26.00(Width..)\n#143=1\n${HEAD}${FETCH}IF[#143EQ1]GOTO20\nG0 X999\nN20 G#143 Z-2 F900\nX[#140+30]\nG0 Z20\n${END}`;
    const change = { controller: { language: 'custom-macro' } };
    expect(rules(check(program, change))).toEqual([]);
    expect(ends(program, change)).toContain('12 86,90,-89');
  });
  test('a corner written with a comma is named', () => {
    const found = rules(check(plain('G1 X60,R5 F900\n'), {}));
    expect(found.some((each) => each.endsWith(' 7'))).toBe(true);
  });
  test('words of other machines under the same ending are named', () => {
    expect(rules(check(plain('M117 hello\n')))).not.toEqual([]);
    expect(rules(check(plain('M300\n')))).toContain('not-modelled 7');
  });
});
