import { expect, test } from 'vitest';
import { checkProgram, startCheck, type Setup } from '#engine';
import { testSetup } from '../../shared/engine/testing/test-shop';
import { COUNTS, SEED } from '../counts';
import { macroProgram, oWordProgram, type FlowProgram } from './flow-programs';
import { mutate, randomNumbers } from './mutate';
import { expectSameTrace, openMachine, traceOf } from './trace-of';

const MACRO = { controller: { language: 'custom-macro' } };
const KINDS: readonly [string, (seed: number) => FlowProgram, object][] = [
  ['o-words', oWordProgram, {}],
  ['WHILE, GOTO, M98 and G65', macroProgram, MACRO],
];

test.each(KINDS)(
  'a program that steers by %s goes where the same goes written out',
  (_name, make, change) => {
    const setup = openMachine(change);
    let steers = 0;
    for (let round = 0; round < COUNTS.properties; round++) {
      const { steered, unrolled } = make(SEED + round);
      if (steered.split('\n').length > 4) steers++;
      try {
        expectSameTrace(traceOf(unrolled, setup), traceOf(steered, setup), undefined, 'any lines');
        const stops = checkProgram(steered, setup).findings.filter(
          ({ severity, rule }) => severity === 'stop' && FLOW_RULES.includes(rule),
        );
        expect(stops).toEqual([]);
      } catch (error) {
        throw new Error(`Round ${round} failed on\n${steered}`, { cause: error });
      }
    }
    expect(steers).toBeGreaterThan(COUNTS.properties / 2);
  },
);

const FLOW_RULES: readonly string[] = [
  'not-modelled',
  'unreadable-block',
  'never-ends',
  'subprogram-loop',
  'subprogram-missing',
];

test.each(KINDS)(
  'how the bytes of a program that steers by %s are cut changes nothing',
  (_name, make, change) => {
    const setup = testSetup(change);
    for (let round = 0; round < COUNTS.flowChunks; round++) {
      const bytes = new TextEncoder().encode(make(SEED + round).steered);
      const whole = checkProgram(bytes, setup);
      const random = randomNumbers(SEED + round);
      const check = startCheck(setup);
      do {
        for (let from = 0; from < bytes.length;) {
          const to = Math.min(bytes.length, from + 1 + random(40));
          check.push(bytes.subarray(from, to));
          from = to;
        }
      } while (check.endOfText() === 'read-again');
      expect(check.report({ name: 'program.nc' })).toEqual(whole);
    }
  },
);

/**
 * Whatever steers, a walk ends: after two million repeated blocks at the latest, and all walks of a reading
 * together after some six million, at about a microsecond each.
 */
const MILLISECONDS_A_PROGRAM = 30_000;

// prettier-ignore
const PIECES = [
  'o101 call [1]', 'o101 sub', 'o101 endsub', 'o102 if [#500 EQ 1]', 'o102 if [1]', 'o102 elseif [#1]', 'o102 else',
  'o102 endif', 'o103 while [#1 LT 9]', 'o103 while [1]', 'o103 endwhile', 'o103 break', 'o103 continue', 'o104 do',
  'o104 while [0]', 'o105 repeat [400]', 'o105 repeat [#501]', 'o105 endrepeat', 'o101 return [#1/0]', 'o#1 call',
  'GOTO 110', 'GOTO #500', 'N110', 'N111 GOTO 111', 'IF [#500 GT 3] GOTO 110', 'IF [#1 EQ #0] THEN #1=3',
  'WHILE [1] DO1', 'WHILE [#500 LT 2] DO2', 'END1', 'END2', 'DO3', 'END3', 'M98 P101', 'M98 P101 L900', 'M97 P110',
  'M99', 'M99 P110', 'M99 P9', 'G65 P101 A1 B#500 I1 I2', 'G66 P101', 'O101', 'O102', '#1=[#1+1]', '#500=#501', 'G91',
  'G0 X[#1]', 'G1 X#500 F100', '/ GOTO 110', '/o103 break', 'M30', '%', 'M66', 'O<a> sub', '#[#1]=#1', 'T#1 M6',
] as const;

function randomFlow(seed: number): Uint8Array {
  const random = randomNumbers(seed);
  const lines = Array.from({ length: 2 + random(30) }, () => PIECES[random(PIECES.length)]!);
  return new TextEncoder().encode(lines.join('\n'));
}

const FUZZED: readonly Setup[] = [
  testSetup({ subprograms: [{ name: 'O101', text: 'o101 sub\nG0 X#1\nM98 P102\no101 endsub' }] }),
  testSetup(MACRO),
  testSetup({
    controller: {
      language: 'custom-macro',
      switches: { packedM98: true },
      codes: [
        {
          code: 'M66',
          does: 'wait-input',
          input: 'holder-clamped',
          when: 1,
          into: '#500',
          timeout: -1,
        },
      ],
    },
    subprograms: [{ name: '101.nc', text: '%\nO101\nIF [#500 EQ 1] GOTO 5\nM98 P101\nN5 M99' }],
  }),
];

test('whatever steers, a check comes to an end', { timeout: 3_600_000 }, () => {
  for (let round = 0; round < COUNTS.flowFuzz; round++) {
    const seed = SEED + round;
    const made = [() => randomFlow(seed), () => mutate(randomFlow(seed), seed)];
    const grown = [oWordProgram, macroProgram].map(
      (make) => () => mutate(new TextEncoder().encode(make(seed).steered), seed),
    );
    const bytes = [...made, ...grown][round % 4]!();
    const before = performance.now();
    try {
      checkProgram(bytes, FUZZED[round % FUZZED.length]!);
    } catch (error) {
      const text = new TextDecoder('latin1').decode(bytes);
      throw new Error(`Round ${round} failed on ${JSON.stringify(text)}`, { cause: error });
    }
    expect(performance.now() - before, `round ${round}`).toBeLessThan(MILLISECONDS_A_PROGRAM);
  }
});
