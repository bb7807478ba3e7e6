import { describe, expect, test } from 'vitest';
import { eventsOf } from '../testing/events-of';

/** A machine at 0, 0, 0 with work zero there too, so that figures read as they are written. */
const setup = (controller: object = {}) => ({
  machine: {
    travel: { x: [-9000, 9000], y: [-9000, 9000], z: [-9000, 9000] },
    start: { x: 0, y: 0, z: 0 },
    references: { g28: { x: 1, y: 2, z: 3 } },
  },
  offsets: { work: { G54: { x: 0, y: 0, z: 0 }, G55: { x: 100, y: 0, z: 0 } } },
  controller: { ...controller, switches: { startMotion: 'rapid', ...switchesOf(controller) } },
});
const switchesOf = (controller: object) => (controller as { switches?: object }).switches ?? {};

/** Where each motion ends, and what was told, line by line. */
const run = (program: string, controller?: object): string[] =>
  eventsOf(program, setup(controller), ['motion', 'stop', 'deed'])
    .filter((text) => !text.endsWith('missing-end'))
    .map((text) => text.replace(/(rapid|feed)( by \w+)? X.* → /, ''));

const MACRO = { language: 'custom-macro' };

describe('settings and computed words', () => {
  test.each([
    // NISTIR 6556 3.2.3: all of a line is read before any of it is set (EXP-01).
    ['#3=15\n#3=6 X#3\nX#3', ['2 X15 Y0 Z0', '3 X6 Y0 Z0']],
    ['#1=2 #1=3\nX#1', ['2 X3 Y0 Z0']],
    ['#1=#<a>', ['1 1-8 out-of-range-word #1=#<a>']],
    // Set before the block is carried out, and by name.
    ['#<Depth>=3\nZ[0-#<depth>]', ['2 X0 Y0 Z-3']],
    // Codes may be computed; a typing slip in them is one all the same.
    ['#1=1\nG#1X5F100', ['2 X5 Y0 Z0 F100']],
    ['#1=1.05\nG#1 X5', ['2 1-4 out-of-range-word G#1']],
    // The unit belongs to the word, not to the parameter.
    ['G20 #1=1\nX#1', ['2 X25.4 Y0 Z0']],
    // 10.4: a whole number within 0.0001.
    ['#2.00005=7\nX#2', ['2 X7 Y0 Z0']],
    // Nothing of a block is set when part of it cannot be worked out.
    ['#1=5\n#1=6 X[1/0]\nX#1', ['2 6-12 out-of-range-word X[1/0]', '3 X5 Y0 Z0']],
  ])('%j', (program, events) => {
    expect(run(program)).toEqual(events);
  });
});

describe('what NISTIR 6556 refuses (facts sheet, section 11, by number)', () => {
  const strict = { switches: { strict: true } };
  test.each([
    ['75', '#0=1', '1 1-5 out-of-range-word #0=1'],
    ['76', '#5400=1', '1 1-8 out-of-range-word #5400=1'],
    ['77', '#1 5', '1 1-5 unreadable-block no-equals'],
    ['78', '#1.5=2', '1 1-7 out-of-range-word #1.5=2'],
    ['79', 'G0 X[1+2', '1 5-9 unreadable-block bracket-not-closed'],
    ['80', 'G0 X[1/0]', '1 4-10 out-of-range-word X[1/0]'],
    ['81', 'G0 X SQRT[-1]', '1 4-14 out-of-range-word X SQRT[-1]'],
    ['82', 'G0 X ATAN[1]', '1 6-13 unreadable-block atan'],
    ['83', 'G0 X ACOS[2]', '1 4-13 out-of-range-word X ACOS[2]'],
    ['84', 'G0 X LN[0]', '1 4-11 out-of-range-word X LN[0]'],
    ['85', 'G0 X[[0-8]**0.5]', '1 4-17 out-of-range-word X[[0-8]**0.5]'],
    ['86', 'G0 X[1 EQ 1]', '1 8-10 unreadable-block comparison'],
  ])('%s: %s', (_number, program, problem) => {
    const told = run(`${program}\nX9\nM2`, strict);
    expect(told).toContain(problem);
    // Nothing of the line moves.
    expect(told.some((text) => text.startsWith('1 X'))).toBe(false);
  });

  test('a value that is no number any more', () => {
    // Facts sheet 13.7: TAN[90] is 1.6e16 without an error, so every word is checked for its range.
    expect(run('X[TAN[90]]')).toEqual(['1 1-11 out-of-range-word X[TAN[90]]']);
    expect(run('X[7 MOD 0]')).toEqual(['1 1-11 out-of-range-word X[7 MOD 0]']);
  });
});

describe('in a macro dialect', () => {
  test.each([
    // Facts sheet 12.1.2 (MAC-09): a word whose variable was never set is left out.
    ['X#5 Y7', ['1 X0 Y7 Z0']],
    ['X[#5+0] Y7', ['1 X0 Y7 Z0']],
    ['#1=#0\nX#1 Y2', ['2 X0 Y2 Z0']],
    // 12.1.3: no brackets needed.
    ['#1=2\n#2=#1*3+1\nX#2', ['3 X7 Y0 Z0']],
    // 12.1.10.
    ['#3006=1 (TURN THE PART)\nX1', ['1 stop #3006', '2 X1 Y0 Z0']],
    ['#3000=1 (NO TOOL)\nX1', ['1 #3000 alarm']],
    ['#3000=0\nX1', ['2 X1 Y0 Z0']],
    // The controller's own variables.
    ['#1100=1 X1', ['1 1-8 not-modelled system-parameter', '1 X1 Y0 Z0']],
  ])('%j', (program, events) => {
    expect(run(program, MACRO)).toEqual(events);
  });

  test('least increments count in plain words only', () => {
    const controller = { ...MACRO, numbers: 'least-increment' };
    expect(run('#1=10\nX#1 Y10', controller)).toEqual([
      '2 5-8 no-decimal-point Y10',
      '2 X10 Y0.01 Z0',
    ]);
  });
});

describe('what posted programs write (real programs, items 19 and 20)', () => {
  test('variables in a plain program, with a rounded corner', () => {
    const program = [
      '#139=1(0=inner, 1=outer)',
      '#140=26.00(Width Y-axis)',
      '#143=40(a G number)',
      '#144=0.125(Corner-radius)',
      'G1G#143Y0D1F900',
      'X#140,R#144',
      'Y[#140/2]',
    ].join('\n');
    expect(run(program, MACRO)).toEqual([
      '5 X0 Y0 Z0 F900',
      '6 6-12 not-modelled corner',
      '6 X26 Y0 Z0 F900',
      '7 X26 Y13 Z0 F900',
    ]);
  });

  test('a sign before a name, and a name that is misspelt', () => {
    expect(run('#<gap>=0.1\nY[-#<gap>-2.1] X-#<gap>\nX#_<gap>\n')).toEqual([
      '2 X-0.1 Y-2.2 Z0',
      '3 2-9 unreadable-block misspelt-name',
    ]);
  });

  test('a byte-order mark, CRLF, a comment outside ASCII and no last line end', () => {
    expect(run('\uFEFF#1=5 (größe)\r\n(ø)X#1\r\n(😀) X[1/0]')).toEqual([
      '2 X5 Y0 Z0',
      '3 6-12 out-of-range-word X[1/0]',
    ]);
  });
});

describe('what is not known before the run', () => {
  test.each([
    // Only an axis can be taken to its bounds; anything else is named.
    ['G0 X#100', ['1 4-9 not-modelled depends']],
    ['S#100 X1', ['1 1-6 not-modelled depends']],
    ['T[#100 MOD 8]', ['1 1-14 not-modelled depends']],
    // Setting the parameter first makes it known.
    ['#100=4\nX#100', ['2 X4 Y0 Z0']],
  ])('%j', (program, events) => {
    expect(run(program)).toEqual(events);
  });

  test('a starting value that the setup states is known', () => {
    const parameters = { '#100': 4, '#<_clear>': 5 };
    expect(run('X#100 Y#<_clear>', { parameters })).toEqual(['1 X4 Y5 Z0']);
  });

  test('a machine input may read either way', () => {
    const codes = [{ code: 'M66', does: 'read-input', input: 'tool-present', into: '#5399' }];
    expect(run('M66 P1 L0\nX[#5399*10]\nX9', { codes })).toEqual([
      '1 M66 read-input',
      '2 X0 Y0 Z0',
      '2 X10 Y0 Z0',
      '3 X9 Y0 Z0',
      '3 X9 Y0 Z0',
    ]);
  });

  test('waiting for an input gives what it waits for, or the figure for time up', () => {
    const codes = [
      {
        code: 'M66',
        does: 'wait-input',
        input: 'tool-present',
        when: 1,
        into: '#5399',
        timeout: -1,
      },
    ];
    expect(run('M66 P1 L3 Q5\nX[#5399 GE 0]', { codes })).toEqual([
      '1 M66 wait-input',
      '2 X0 Y0 Z0',
      '2 X1 Y0 Z0',
    ]);
    expect(run('M66 P1 L3 Q5\nX[#5399 GE -1]', { codes })).toEqual([
      '1 M66 wait-input',
      '2 X1 Y0 Z0',
    ]);
  });
});
