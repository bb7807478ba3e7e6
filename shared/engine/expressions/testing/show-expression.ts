import type { Expression } from '../expression';

/** An expression with every pair of operands in brackets, so that a test sees how it was read. */
export function showExpression(expression: Expression): string {
  switch (expression.kind) {
    case 'number':
      return String(expression.value);
    case 'parameter':
      return expression.number ? `#${showExpression(expression.number)}` : `#<${expression.name}>`;
    case 'minus':
      return `-${showExpression(expression.of)}`;
    case 'binary':
      return `(${showExpression(expression.left)} ${expression.operator} ${showExpression(expression.right)})`;
    case 'function':
      return `${expression.name}(${expression.of.map(showExpression).join(', ')})`;
    case 'exists':
      return `EXISTS(<${expression.name}>)`;
  }
}
