import { describe, expect, test } from 'vitest';
import { eventsOf } from '../testing/events-of';

/** Machine zero is program zero, so that events show what is written. */
const AT_ZERO = { offsets: { work: { G54: { x: 0, y: 0, z: 0 } } } };
const NGC = AT_ZERO;
const MACRO = { ...AT_ZERO, controller: { language: 'custom-macro' } };

/** Where motion goes, in order, each as `line: X Y Z`, and whatever is wrong. */
function walked(program: string, change: object = NGC): string[] {
  return eventsOf(program, change).map((event) =>
    event.replace(/^(\d+) (?:rapid|feed) .* → (\S+ \S+ \S+).*$/, '$1: $2'),
  );
}
const at = (line: number, x: number, y = 0, z = 0) => `${line}: X${x} Y${y} Z${z}`;

describe('calls of programs (facts sheet 12.1.8, 12.1.9)', () => {
  test.each([
    [
      'M98 calls what stands behind the end',
      'M98 P5\nG0 Y1\nM30\nO5\nG0 X1\nM99',
      [at(5, 1), at(2, 1, 1)],
    ],
    ['or in front of it', 'O5\nG0 X1\nM99\n', [at(2, 1)]],
    ['L repeats it', 'G91\nM98 P5 L3\nM30\nO5\nG0 X1\nM99', [at(5, 1), at(5, 2), at(5, 3)]],
    ['L0 does not call it', 'M98 P5 L0\nM30\nO5\nG0 X1\nM99', ['3 text-after-end']],
    [
      'what else stands in the block is done first',
      'G0 X9 M98 P5\nM30\nO5\nG0 X1\nM99',
      [at(1, 9), at(4, 1)],
    ],
    ['leading noughts count for nothing', 'M98 P0005\nM30\nO00005 (SUB)\nG0 X1\nM99', [at(4, 1)]],
    [
      'calls within calls',
      'M98 P1\nM30\nO1\nM98 P2\nG0 X1\nM99\nO2\nG0 X2\nM99',
      [at(8, 2), at(5, 1)],
    ],
    [
      'M97 calls a line of the program',
      'M97 P250 L2\nM30\nN250 G0 X1\nG0 X2\nM99',
      [at(3, 1), at(4, 2), at(3, 1), at(4, 2)],
    ],
    ['M99 P goes on at another line', 'M98 P5\nG0 X9\nN7 G0 X2\nM30\nO5\nM99 P7', [at(3, 2)]],
    ['M30 in a subprogram ends all', 'M98 P5\nG0 X9\nM30\nO5\nG0 X1\nM30', [at(5, 1)]],
    [
      'M99 P in a main program leads ahead',
      'G0 X1\nM99 P20\nG0 X9\nN20 G0 X2\nM30',
      [at(1, 1), at(4, 2)],
    ],
    ['and back, where its next turn begins', 'N10 G0 X1\nM99 P10', [at(1, 1)]],
    [
      'a subprogram without its end falls out of its text',
      'M98 P5\nG0 X2\nM30\nO5\nG0 X1\nO6\nG0 X3\nM99',
      [at(5, 1), '6 missing-end subprogram', at(2, 2)],
    ],
    ['M98 without P', 'M98\nM30', ['1 1-4 missing-word P']],
    ['M98 with half a P', 'M98 P1.5\nM30', ['1 5-9 out-of-range-word P1.5']],
    [
      'M98 with a negative L',
      'M98 P1 L-1\nM30\nO1\nM99',
      ['1 8-11 out-of-range-word L-1', '3 text-after-end'],
    ],
  ])('%s', (_name, program, events) => {
    expect(walked(program)).toEqual(events);
  });

  test('packed, the digits in front of four say how often', () => {
    const packed = { ...NGC, controller: { switches: { packedM98: true } } };
    expect(walked('G91\nM98 P20005\nM30\nO5\nG0 X1\nM99', packed)).toEqual([at(5, 1), at(5, 2)]);
    expect(walked('G91\nM98 P5\nM30\nO5\nG0 X1\nM99', packed)).toEqual([at(5, 1)]);
  });

  test('a code that the setup gives a meaning calls nothing', () => {
    const declared = { ...NGC, controller: { codes: [{ code: 'M98', does: 'nothing' }] } };
    expect(walked('M98 P5\nM30\nO5\nG0 X1\nM99', declared)).toEqual(['3 text-after-end']);
  });
});

describe('subprograms that the setup gives', () => {
  const GIVEN = {
    ...NGC,
    subprograms: [
      { name: 'O0100.nc', text: '%\n(HEAD)\n\nO100\n G0 X#500\nT99.5\nM99\n%' },
      { name: 'fetch.ngc', text: 'o<fetch> sub\nG0 X#1\no<fetch> endsub [#1 * 2]\nM2' },
    ],
    controller: { parameters: { '#500': 3 } },
  };

  test('are found by name, and told at the block that calls, with their own line within', () => {
    expect(walked('G21\nM98 P100\nM30', GIVEN)).toEqual([at(2, 3), '2 out-of-range-word T99.5']);
    expect(walked('o<Fetch> call [7]\nG0 Y#<_value>\nM30', GIVEN)).toEqual([
      at(1, 7),
      at(2, 7, 14),
    ]);
  });
});

describe('G65 (facts sheet 12.1.7)', () => {
  const given = (words: string, ...numbers: readonly number[]) =>
    walked(
      `G65 P1 ${words}\nM30\nO1\nG0 ${numbers.map((n, i) => `${'XYZ'[i]}#${n}`).join(' ')}\nM99`,
      MACRO,
    );
  test.each([
    ['A1. B2. C3.', [1, 2, 3], at(4, 1, 2, 3)],
    ['X1. Y2. Z3.', [24, 25, 26], at(4, 1, 2, 3)],
    ['I4. J5. K6.', [4, 5, 6], at(4, 4, 5, 6)],
    // List II: every set of I, J, K takes the next three.
    ['A1. I4. J5. K6. I7. J8. K9.', [7, 8, 9], at(4, 7, 8, 9)],
    // What a set leaves out stays null, and the word is left out with it (12.1.2).
    ['J5. I7. K9.', [5, 7, 9], at(4, 5, 7, 9)],
    ['I1. I2. I3.', [4, 7, 10], at(4, 1, 2, 3)],
    // Mixed lists: the later word of one variable holds.
    ['D1. I2. I3.', [7, 4], at(4, 3, 2)],
    ['I2. I3. D1.', [7, 4], at(4, 1, 2)],
    ['F300. M13. T20.', [9, 13, 20], at(4, 300, 13, 20)],
  ] as const)('%s', (words, numbers, event) => {
    expect(given(words, ...numbers)).toEqual([event]);
  });

  test('what is not given is null, and what the caller has comes back', () => {
    expect(walked('#1=5\nG65 P1\nG0 X#1\nM30\nO1\nG0 X#1 Y2\n#1=9\nM99', MACRO)).toEqual([
      at(6, 0, 2),
      at(3, 5, 2),
    ]);
  });

  test('each repeat begins with the values given', () => {
    expect(walked('G65 P1 L2 A1.\nM30\nO1\nG91 G0 X#1\n#1=9\nM99', MACRO)).toEqual([
      at(4, 1),
      at(4, 2),
    ]);
  });

  test('values are worked out before the call, and the words of the block move nothing', () => {
    expect(walked('#2=4\nG65 P1 X[#2+1] Y#2\nM30\nO1\nG0 X#24 Y#25\nM99', MACRO)).toEqual([
      at(5, 5, 4),
    ]);
  });
});

describe('jumps and loops of macro dialects (facts sheet 12.1.5, 12.1.6)', () => {
  test.each([
    ['a jump ahead', 'GOTO 20\nG0 X9\nN20 G0 X1\nM30', [at(3, 1)]],
    ['a jump by a variable', '#1=20\nGOTO #1\nG0 X9\nN20 G0 X1\nM30', [at(4, 1)]],
    [
      'ahead before back',
      'N5 G0 X1\n#1=#1+1\nIF [#1 GT 2] GOTO 9\nGOTO 5\nN5 G0 X2\nN9 M30',
      [at(1, 1), at(5, 2)],
    ],
    ['a condition that does not hold', 'IF [1 GT 2] GOTO 20\nG0 X1\nN20 M30', [at(2, 1)]],
    [
      'only in the same program',
      'GOTO 20\nG0 X1\nM30\nO2\nN20 G0 X9\nM99',
      ['1 1-8 subprogram-missing jump', at(2, 1), '4 text-after-end'],
    ],
    [
      'nested loops',
      '#1=0\nWHILE [#1 LT 2] DO1\n#2=0\nWHILE [#2 LT 2] DO2\nG0 X#1 Y#2\n#2=#2+1\nEND2\n#1=#1+1\nEND1\nM30',
      [at(5, 0), at(5, 0, 1), at(5, 1), at(5, 1, 1)],
    ],
    ['out of a loop', 'WHILE [1 EQ 1] DO1\nGOTO 5\nEND1\nN5 G0 X1\nM30', [at(4, 1)]],
    [
      'and into it again',
      '#1=0\nN1 WHILE [#1 LT 3] DO1\n#1=#1+1\nGOTO 1\nEND1\nG0 X#1\nM30',
      [at(6, 3)],
    ],
    ['a condition with null', 'IF [#5 EQ #0] THEN #6=1\nG0 X#6\nM30', [at(2, 1)]],
    [
      'into a loop',
      'GOTO 5\nWHILE [1 EQ 2] DO1\nN5 G0 X1\nEND1\nM30',
      ['1 1-7 unreadable-block into-loop'],
    ],
    [
      'loops that cross',
      'WHILE [1 EQ 2] DO1\nWHILE [1 EQ 2] DO2\nEND1\nEND2\nM30',
      [
        '2 1-19 unreadable-block flow-open',
        '3 1-5 unreadable-block flow-crossing',
        '4 1-5 unreadable-block flow-unpaired',
      ],
    ],
    [
      'a loop without an end',
      'WHILE [1 EQ 2] DO1\nG0 X1\nM30',
      ['1 1-19 unreadable-block flow-open', at(2, 1)],
    ],
    [
      'an end without a loop',
      'END1\nG0 X1\nM30',
      ['1 1-5 unreadable-block flow-unpaired', at(2, 1)],
    ],
    [
      'a fourth loop',
      'WHILE [1 EQ 2] DO4\nEND4\nM30',
      ['1 1-19 unreadable-block flow-depth', '2 1-5 unreadable-block flow-unpaired'],
    ],
  ])('%s', (_name, program, events) => {
    expect(walked(program, MACRO)).toEqual(events);
  });
});

describe('o-words (facts sheet 12.2)', () => {
  test.each([
    [
      'a sub runs only when called',
      'o1 sub\nG0 X1\no1 endsub\nG0 X2\no1 call\nM2',
      [at(4, 2), at(2, 1)],
    ],
    [
      'a sub has to stand in front of its call',
      'o1 call\nM2\no1 sub\nG0 X1\no1 endsub',
      ['1 1-8 subprogram-missing behind', at(4, 1)],
    ],
    [
      'though not in front of another sub that calls it',
      'o1 sub\no2 call\no1 endsub\no2 sub\nG0 X1\no2 endsub\no1 call\nM2',
      [at(5, 1)],
    ],
    [
      'what is not given keeps the value of the caller',
      '#2=7\no1 sub\nG0 X#1 Y#2\n#2=9\no1 endsub\no1 call [5]\nG0 Z#2\nM2',
      [at(3, 5, 7), at(7, 5, 7, 7)],
    ],
    [
      'names are local, with an underscore global',
      '#<a>=1\no1 sub\n#<a>=5\n#<_b>=6\no1 endsub\no1 call\nG0 X#<a> Y#<_b>\nM2',
      [at(7, 1, 6)],
    ],
    [
      'a value comes back',
      'o1 sub\no1 return [#1*2]\no1 endsub\no1 call [4]\nG0 X#<_value> Y#<_value_returned>\no1 endsub\nM2',
      ['6 1-10 unreadable-block flow-unpaired', at(5, 8, 1)],
    ],
    ['or none', 'o1 sub\no1 endsub\no1 call\nG0 X1 Y#<_value_returned>\nM2', [at(4, 1)]],
    [
      'the first branch that holds',
      '#1=2\no1 if [#1 EQ 1]\nG0 X1\no1 elseif [#1 EQ 2]\nG0 X2\no1 elseif [#1 LT 5]\nG0 X3\no1 else\nG0 X4\no1 endif\nM2',
      [at(5, 2)],
    ],
    ['else', 'o1 if [0]\nG0 X1\no1 else\nG0 X4\no1 endif\nM2', [at(4, 4)]],
    ['nothing', 'o1 if [0]\nG0 X1\no1 endif\nG0 X4\nM2', [at(4, 4)]],
    [
      'ifs in ifs',
      'o1 if [1]\no2 if [0]\nG0 X1\no2 else\nG0 X2\no2 endif\no1 else\nG0 X3\no1 endif\nM2',
      [at(5, 2)],
    ],
    [
      'a loop that never begins',
      'o1 while [0]\nG0 X1\no1 endwhile\no2 repeat [0]\nG0 X2\no2 endrepeat\nM2',
      [],
    ],
    ['do turns once at least', 'o1 do\nG0 X1\no1 while [0]\nM2', [at(2, 1)]],
    [
      'continue in a while',
      '#1=0\no1 while [#1 LT 3]\n#1=[#1+1]\no2 if [#1 EQ 2]\no1 continue\no2 endif\nG0 X#1\no1 endwhile\nM2',
      [at(7, 1), at(7, 3)],
    ],
    [
      'break out of two',
      'o1 repeat [5]\no2 repeat [5]\nG91 G0 X1\no1 break\no2 endrepeat\no1 endrepeat\nG0 Y1\nM2',
      [at(3, 1), at(7, 1, 1)],
    ],
    [
      'continue of a repeat counts',
      'o1 repeat [3]\nG91 G0 X1\no1 continue\nG0 Y1\no1 endrepeat\nM2',
      [at(2, 1), at(2, 2), at(2, 3)],
    ],
    [
      'a repeat in a repeat begins anew',
      'G91\no1 repeat [2]\no2 repeat [2]\nG0 X1\no2 endrepeat\no1 endrepeat\nM2',
      [at(4, 1), at(4, 2), at(4, 3), at(4, 4)],
    ],
    [
      'a sub that returns out of loops',
      'o1 sub\no2 repeat [9]\nG91 G0 X1\no1 return\no2 endrepeat\no1 endsub\no1 call\no1 call\nM2',
      [at(3, 1), at(3, 2)],
    ],
    [
      'a sub before a program of the same number',
      'O7\no7 sub\nG0 X1\no7 endsub\no7 call\nM2',
      [at(3, 1)],
    ],
    ['a label that is worked out', '#1=7\no7 sub\nG0 X1\no7 endsub\no#1 call\nM2', [at(3, 1)]],
    // Errors of 12.2.5.
    ['endif without its if', 'o1 endif\nM2', ['1 1-9 unreadable-block flow-unpaired']],
    [
      'else without its if',
      'o1 if [1]\no2 else\no1 endif\nM2',
      ['2 1-8 unreadable-block flow-unpaired'],
    ],
    ['break without its loop', 'o1 break\nM2', ['1 1-9 unreadable-block flow-unpaired']],
    [
      'return outside a sub',
      'o1 return\nG0 X1\nM2',
      ['1 1-10 unreadable-block flow-unpaired', at(2, 1)],
    ],
    ['an if left open', 'o1 if [0]\nG0 X1\nM2', ['1 1-10 unreadable-block flow-open', at(2, 1)]],
    [
      'a label used twice',
      'o1 if [0]\no1 endif\no1 repeat [1]\nG0 X1\no1 endrepeat\nM2',
      ['3 1-14 unreadable-block flow-label', at(4, 1)],
    ],
  ])('%s', (_name, program, events) => {
    expect(walked(program)).toEqual(events);
  });
});

test('what cannot be worked out steers nothing, and the walk goes on', () => {
  expect(walked('o1 if [1/0]\nG0 X1\no1 endif\nG0 X2\nM2')).toEqual([
    '1 1-12 out-of-range-word o1 if [1/0]',
    at(4, 2),
  ]);
});

test('an end, and text behind it, are told as in a program that calls nothing', () => {
  expect(walked('#1=0\no1 if [0]\no1 endif\nM30\nG0 X1')).toEqual(['5 1-6 text-after-end']);
  expect(walked('o1 if [0]\no1 endif\nG0 X1')).toEqual([at(3, 1), '3 missing-end']);
  expect(walked('o1 repeat [2]\nM98 P1\no1 endrepeat\nM30\nO1\nM99')).toEqual([]);
});
