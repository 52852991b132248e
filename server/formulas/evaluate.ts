import type { Expression } from '@/server/numerics/expression/expression';

/**
 * The value of an expression in double precision; slow, for single values.
 *
 * @param values of the names that the expression holds.
 * @returns NaN where it is not defined.
 */
export function evaluate(expression: Expression, values: ReadonlyMap<string, number>): number {
  switch (expression.kind) {
    case 'number':
      return expression.value;
    case 'constant':
      return Math.PI;
    case 'name':
      return values.get(expression.name) ?? NaN;
    case 'negate':
      return -evaluate(expression.argument, values);
    case 'call':
      return Math[expression.function](evaluate(expression.argument, values));
    case 'binary': {
      const left = evaluate(expression.left, values);
      const right = evaluate(expression.right, values);
      switch (expression.operator) {
        case '+':
          return left + right;
        case '-':
          return left - right;
        case '*':
          return left * right;
        case '/':
          return left / right;
        case '^':
          return left ** right;
      }
    }
  }
}
