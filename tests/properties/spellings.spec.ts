import fc from 'fast-check';
import { test } from 'vitest';
import { COUNTS, SEED } from '../counts';
import { programs, spell } from './programs';
import { expectSameTrace, openMachine, traceOf } from './trace-of';

const runs = { numRuns: COUNTS.properties, seed: SEED };
const plain = { units: 'mm', distance: 'absolute' } as const;
const setup = openMachine();

test('moving work zero moves every motion by as much', () => {
  const length = fc.integer({ min: -300_000, max: 300_000 }).map((value) => value / 1000);
  fc.assert(
    fc.property(programs, length, length, length, (steps, x, y, z) => {
      const shifted = openMachine({
        offsets: { work: { G54: { x: 30 + x, y: 40 + y, z: -182 + z } } },
      });
      const program = spell(steps, plain);
      expectSameTrace(traceOf(program, setup), traceOf(program, shifted), { x, y, z });
    }),
    runs,
  );
});

test('inches and millimetres spell the same motions', () => {
  fc.assert(
    fc.property(programs, (steps) => {
      const inch = spell(steps, { ...plain, units: 'inch' });
      expectSameTrace(traceOf(spell(steps, plain), setup), traceOf(inch, setup));
    }),
    runs,
  );
});

test('absolute and incremental spell the same motions', () => {
  fc.assert(
    fc.property(programs, fc.constantFrom('mm' as const, 'inch' as const), (steps, units) => {
      const absolute = traceOf(spell(steps, { units, distance: 'absolute' }), setup);
      const incremental = traceOf(spell(steps, { units, distance: 'incremental' }), setup);
      expectSameTrace(absolute, incremental, undefined, 'any lines');
    }),
    runs,
  );
});

/** One way to write a block anew without changing what it says. */
const dressing = fc.record({
  lower: fc.boolean(),
  blank: fc.constantFrom('', ' ', '\t', '   '),
  number: fc.option(fc.integer({ min: 0, max: 99_999 }), { nil: undefined }),
  comment: fc.constantFrom('', '(M6 T9 X1)', ' ; G0 Z-100', '(MSG, LOAD)', '(ä ø “x”)'),
  inner: fc.boolean(),
});

test('blanks, comments, N words and lower case change nothing', () => {
  fc.assert(
    fc.property(programs, fc.array(dressing, { minLength: 1, maxLength: 8 }), (steps, dresses) => {
      const program = spell(steps, plain);
      const dressed = program.map((block, index) => {
        const { lower, blank, number, comment, inner } = dresses[index % dresses.length]!;
        const words = block
          .split(' ')
          .map((word) => (inner ? `${word[0]} ${word.slice(1)}` : word));
        const text = words.join(blank === '' && inner ? '' : blank);
        const front = number === undefined ? '' : `N${number}${blank}`;
        return `${front}${lower ? text.toLowerCase() : text}${comment}`;
      });
      expectSameTrace(traceOf(program, setup), traceOf(dressed, setup));
    }),
    runs,
  );
});
