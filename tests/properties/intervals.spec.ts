import { expect, test } from 'vitest';
import { evaluate, isFailure } from '../../shared/engine/expressions/evaluate';
import type {
  BinaryOperator,
  Expression,
  FunctionName,
} from '../../shared/engine/expressions/expression';
import { functionsOf, OPERATORS, type Grammar } from '../../shared/engine/expressions/grammar';
import { isBounds, type Value } from '../../shared/engine/expressions/value';
import { COUNTS, SEED } from '../counts';
import { randomNumbers } from './mutate';

type Random = (below: number) => number;

const GRAMMARS: readonly Grammar[] = [
  { isMacro: false, isStrict: false },
  { isMacro: true, isStrict: false },
];
/** Values at which functions turn or end, and ordinary ones. */
const FIGURES = [-360, -90, -2.8, -1, -0.5, 0, 0.5, 1, 2, 3, 45, 90, 180, 270, 1000];
const PARAMETERS = 3;

function randomExpression(random: Random, depth: number, grammar: Grammar): Expression {
  const kind = depth === 0 ? random(2) : random(6);
  const inner = () => randomExpression(random, depth - 1, grammar);
  if (kind === 0) return { kind: 'number', value: FIGURES[random(FIGURES.length)]! };
  if (kind === 1)
    return {
      kind: 'parameter',
      number: { kind: 'number', value: random(PARAMETERS) },
      from: 0,
      to: 0,
    };
  if (kind === 2) return { kind: 'minus', of: inner() };
  if (kind < 5) {
    const operator: BinaryOperator = OPERATORS[random(OPERATORS.length)]!;
    return { kind: 'binary', operator, left: inner(), right: inner() };
  }
  const names = functionsOf(grammar);
  const name: FunctionName = names[random(names.length)]!;
  const of = name === 'ATAN' && random(2) === 0 ? [inner(), inner()] : [inner()];
  return { kind: 'function', name, of, from: 0, to: 0 };
}

const reading = (values: readonly Value[]) => ({
  read: (number: number) => values[number]!,
  readNamed: () => null,
  exists: () => false,
});

/** The rule that makes bounds worth anything: what can come out lies inside them. */
test('every result of values within bounds lies within the bounds of the result', () => {
  const random = randomNumbers(SEED);
  const share = () => random(1_001) / 1_000;
  let compared = 0;
  for (let round = 0; round < COUNTS.intervals; round++) {
    const grammar = GRAMMARS[round % GRAMMARS.length]!;
    const expression = randomExpression(random, 1 + random(3), grammar);
    const bounds = Array.from({ length: PARAMETERS }, () => {
      const least = FIGURES[random(FIGURES.length)]!;
      return { least, greatest: least + share() * 10 ** random(4), of: '#5' };
    });
    const over = evaluate(expression, reading(bounds), grammar);
    for (let point = 0; point < 8; point++) {
      const values = bounds.map(({ least, greatest }) => {
        const at = point === 0 ? 0 : point === 1 ? 1 : share();
        return Math.min(greatest, least + at * (greatest - least));
      });
      const worth = evaluate(expression, reading(values), grammar);
      // An error at one of the values is no result; where all of them fail there is nothing to hold.
      if (isFailure(worth) || worth === null) continue;
      const text = JSON.stringify({ expression, bounds, values, worth, over });
      expect(isFailure(over), text).toBe(false);
      if (isFailure(over)) continue;
      const isHeld = isBounds(over)
        ? over.least <= (worth as number) && (worth as number) <= over.greatest
        : over === worth;
      expect(isHeld, text).toBe(true);
      compared++;
    }
  }
  expect(compared).toBeGreaterThan(COUNTS.intervals);
});
