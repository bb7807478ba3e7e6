import fc from 'fast-check';
import { expect, test } from 'vitest';
import { LineWords } from '../../shared/engine/lexer/line-words';
import { PlainLines } from '../../shared/engine/lexer/plain-lines';
import { readLine } from '../../shared/engine/lexer/read-line';
import { COUNTS, SEED } from '../counts';

const words = new LineWords();

/** The value of the one word on a line. */
function read(number: string): number {
  const bytes = new TextEncoder().encode(`X${number}\n`);
  words.bytes = bytes;
  readLine(bytes, 0, words);
  expect(words.count).toBe(1);
  return words.values[0]!;
}

const plain = new PlainLines();

/** As the reader of plain lines has it; undefined where it leaves the line to the one above. */
function readPlain(number: string): number | undefined {
  const bytes = new TextEncoder().encode(`X${number}\n`);
  plain.read(bytes, 0, bytes.length);
  return plain.count === 1 ? plain.values[0] : undefined;
}

const digits = (most: number) =>
  fc.array(fc.integer({ min: 0, max: 9 }), { maxLength: most }).map((each) => each.join(''));
const decimals = fc
  .tuple(fc.constantFrom('', '-', '+'), digits(18), fc.constantFrom('', '.'), digits(18))
  .filter(([, whole, point, part]) => whole !== '' || (point !== '' && part !== ''))
  .map(([sign, whole, point, part]) => sign + whole + (point === '' ? '' : point + part));

test('reads every decimal as parseFloat does, to the last bit', () => {
  let compared = 0;
  fc.assert(
    fc.property(decimals, (number) => {
      compared++;
      if (!Object.is(read(number), parseFloat(number)))
        throw new Error(`${number} is read as ${read(number)}`);
    }),
    { numRuns: COUNTS.numbers, seed: SEED },
  );
  expect(compared).toBeGreaterThanOrEqual(COUNTS.numbers);
}, 120_000);

test('so does the reader of plain lines, as far as it reads numbers at all', () => {
  const short = fc
    .tuple(fc.constantFrom('', '-', '+'), digits(6), fc.constantFrom('', '.'), digits(5))
    .filter(([, whole, point, part]) => whole !== '' || (point !== '' && part !== ''))
    .map(([sign, whole, point, part]) => sign + whole + (point === '' ? '' : point + part));
  let compared = 0;
  fc.assert(
    fc.property(short, (number) => {
      const value = readPlain(number);
      if (value === undefined) return;
      compared++;
      if (!Object.is(value, parseFloat(number))) throw new Error(`${number} is read as ${value}`);
    }),
    { numRuns: COUNTS.numbers, seed: SEED },
  );
  expect(compared).toBeGreaterThanOrEqual(COUNTS.numbers / 2);
}, 120_000);

test.each([
  '0',
  '-0',
  '-0.0',
  '.5',
  '-.5',
  '5.',
  '+5',
  '007.50',
  '000000000000000000001',
  '0.1',
  '1e0'.slice(0, 1),
  '999999999',
  '9999999999',
  '0.000000001',
  '123456789012345',
  '1234567890123456',
  '9007199254740993',
  '0.30000000000000004',
  '4503599627370497.5',
])('reads %s as parseFloat does', (number) => {
  expect(Object.is(read(number), parseFloat(number))).toBe(true);
});

test('takes blanks inside a number, as NISTIR 6556 3.2 allows, and as parseFloat without them', () => {
  fc.assert(
    fc.property(
      decimals,
      fc.array(fc.integer({ min: 0, max: 3 }), { minLength: 1, maxLength: 6 }),
      (number, blanks) => {
        const spread = [...number]
          .map((each, index) => each + ' '.repeat(blanks[index % blanks.length]!))
          .join('');
        if (!Object.is(read(spread), parseFloat(number)))
          throw new Error(`${spread} is read as ${read(spread)}`);
      },
    ),
    { numRuns: Math.ceil(COUNTS.numbers / 10), seed: SEED },
  );
});
