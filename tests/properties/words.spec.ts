import fc from 'fast-check';
import { parseLine } from 'gcode-parser';
import { describe, expect, test } from 'vitest';
import { LineWords } from '../../shared/engine/lexer/line-words';
import { readLine } from '../../shared/engine/lexer/read-line';
import { COUNTS, SEED } from '../counts';
import { programs, spell } from './programs';

/**
 * The engine's words against those of an independent tokeniser. On plain programs they are the same; where
 * the other is lax the differences are named one by one below, so that neither side changes unseen.
 */
type Words = readonly (readonly [string, number | string])[];

function ours(text: string): { words: Words; faults: readonly string[] } {
  const line = new LineWords();
  line.bytes = new TextEncoder().encode(`${text}\n`);
  readLine(line.bytes, 0, line);
  const words = Array.from({ length: line.count }, (_, index) => {
    return [String.fromCharCode(65 + line.letters[index]!), line.values[index]!] as const;
  });
  return { words, faults: line.faults.map((fault) => fault.problem) };
}

/** The other keeps the line number apart from the words. */
function theirs(text: string): Words {
  const { words, ln } = parseLine(text);
  return ln === undefined ? words : [['N', ln], ...words];
}

/** Zeros of either sign are one number to a machine; the other loses the sign of −0. */
const unsigned = (words: Words) =>
  words.map(([letter, value]) => [letter, value === 0 ? 0 : value]);

const dressing = fc.constantFrom(
  (block: string) => block,
  (block: string) => block.replaceAll(' ', ''),
  (block: string) => block.toLowerCase(),
  (block: string) => `N120 ${block}`,
  (block: string) => `${block} (A REMARK)`,
  (block: string) => `${block} ; a remark`,
  (block: string) => `${block}  \t`,
);

test('cuts plain blocks into the same words as gcode-parser', () => {
  let compared = 0;
  fc.assert(
    fc.property(programs, fc.array(dressing, { minLength: 1, maxLength: 5 }), (steps, dresses) => {
      spell(steps, { units: 'mm', distance: 'absolute' }).forEach((block, index) => {
        const text = dresses[index % dresses.length]!(block);
        const { words, faults } = ours(text);
        expect(faults).toEqual([]);
        expect(unsigned(words)).toEqual(unsigned(theirs(text)));
        compared += words.length;
      });
    }),
    { numRuns: COUNTS.tokenPrograms, seed: SEED },
  );
  expect(compared).toBeGreaterThan(COUNTS.tokenPrograms * 10);
});

describe('says what gcode-parser passes over in silence', () => {
  test.each([
    ['a letter without a number', 'G1 X Y2', 'unreadable-block'],
    ['a decimal comma', 'G1 X1,5', 'unreadable-block'],
    ['a minus sign that is none', 'G1 X−5', 'unreadable-block'],
    ['two points in a number', 'X1.2.3', 'unreadable-block'],
    ['two signs', 'X--5', 'unreadable-block'],
    ['a point alone', 'X.', 'unreadable-block'],
    ['a comment that never closes', 'G1 X1 (rest Y2 Z3', 'unreadable-block'],
    ['a bracket that never opened', 'X1) Y2', 'unreadable-block'],
    ['signs that are no words', 'G1 X1 @ &', 'odd-characters'],
    ['quoted text', 'G1 X1 "text X9"', 'odd-characters'],
    ['an exponent', 'G1 X1E3', 'unreadable-block'],
    ['a check sum', 'N3 T0*0', 'odd-characters'],
  ])('%s: %s', (_what, text, problem) => {
    expect(ours(text).faults).toContain(problem);
  });

  test.each(['G1 X[1+2*3] Y[SQRT[4]]', 'G1 X#5', 'O100 IF [#1 GT 3]'])(
    'what has to be worked out is a statement: %s',
    (text) => {
      const line = new LineWords();
      line.bytes = new TextEncoder().encode(`${text}\n`);
      readLine(line.bytes, 0, line);
      expect(line.isStatement).toBe(true);
    },
  );
});
