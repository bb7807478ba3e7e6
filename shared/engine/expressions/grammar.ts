import type { Expression, BinaryOperator, FunctionName } from './expression';

/** How one controller writes and counts expressions. */
export interface Grammar {
  /**
   * A custom-macro dialect: settings need no brackets, AND, OR and XOR work on bits, FIX and FUP round
   * toward and away from zero. Else the language of NISTIR 6556, with named parameters and comparisons.
   */
  readonly isMacro: boolean;
  /** Refuse what NISTIR 6556 refuses. */
  readonly isStrict: boolean;
}

const PUBLISHED: readonly FunctionName[] = [
  'ABS',
  'ACOS',
  'ASIN',
  'ATAN',
  'COS',
  'EXP',
  'FIX',
  'FUP',
  'LN',
  'ROUND',
  'SIN',
  'SQRT',
  'TAN',
];
/** Macro dialects convert between binary and decimally coded figures as well. */
const MACRO: readonly FunctionName[] = [...PUBLISHED, 'BCD', 'BIN'];

export const functionsOf = ({ isMacro }: Grammar): readonly FunctionName[] =>
  isMacro ? MACRO : PUBLISHED;

export const COMPARISONS: readonly BinaryOperator[] = ['EQ', 'NE', 'GT', 'GE', 'LT', 'LE'];

/** In the order in which they are tried: `**` before `*`. */
export const OPERATORS: readonly BinaryOperator[] = [
  '**',
  '*',
  '/',
  '+',
  '-',
  'MOD',
  'AND',
  'OR',
  'XOR',
  ...COMPARISONS,
];

const TIGHTEST = 4;

/**
 * How tightly an operator binds. NISTIR 6556 3.2.2.3 has three levels: `**`; `*` `/` MOD; `+` `-` AND OR XOR.
 * Comparisons, which it does not know, bind less than any of them, and logical operators that join
 * comparisons without brackets less still. In macro dialects AND binds like `*` (common practice, no source).
 */
function tightness(operator: BinaryOperator, grammar: Grammar, hasComparison: boolean): number {
  switch (operator) {
    case '**':
      return TIGHTEST;
    case '*':
    case '/':
    case 'MOD':
      return 3;
    case '+':
    case '-':
      return 2;
    case 'AND':
      return hasComparison ? 0 : grammar.isMacro ? 3 : 2;
    case 'OR':
    case 'XOR':
      return hasComparison ? 0 : 2;
    default:
      return 1;
  }
}

/** Joins what stands between two brackets: tighter operators first, equal ones from left to right. */
export function joinOperands(
  operands: readonly Expression[],
  operators: readonly BinaryOperator[],
  grammar: Grammar,
): Expression {
  if (operators.length === 1)
    return { kind: 'binary', operator: operators[0]!, left: operands[0]!, right: operands[1]! };
  const hasComparison = operators.some((operator) => COMPARISONS.includes(operator));
  let values = operands;
  let signs = operators;
  for (let level = TIGHTEST; level >= 0 && signs.length > 0; level--) {
    const joined: Expression[] = [values[0]!];
    const left: BinaryOperator[] = [];
    signs.forEach((operator, index) => {
      const right = values[index + 1]!;
      if (tightness(operator, grammar, hasComparison) === level)
        joined.push({ kind: 'binary', operator, left: joined.pop()!, right });
      else {
        joined.push(right);
        left.push(operator);
      }
    });
    values = joined;
    signs = left;
  }
  return values[0]!;
}
