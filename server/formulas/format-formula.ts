import type { Expression } from '@/server/numerics/expression/expression';

/** How tightly each kind of expression binds: sums 1, products 2, signs 3, powers 4, the rest 5. */
export function bindingOf(expression: Expression): number {
  switch (expression.kind) {
    case 'binary':
      return expression.operator === '^' ? 4 : expression.operator === '*' || expression.operator === '/' ? 2 : 1;
    case 'negate':
      return 3;
    default:
      return 5;
  }
}

/** An expression as canonical text: as few parentheses as its meaning needs. Parsing it gives the same tree again. */
export function formatFormula(expression: Expression): string {
  switch (expression.kind) {
    case 'number':
      return expression.text;
    case 'constant':
    case 'name':
      return expression.name;
    case 'negate':
      return `-${enclosed(expression.argument, 4)}`;
    case 'call':
      return `${expression.function}(${formatFormula(expression.argument)})`;
    case 'binary': {
      const { operator, left, right } = expression;
      switch (operator) {
        case '^':
          return `${enclosed(left, 5)}^${enclosed(right, 4)}`;
        case '*':
        case '/':
          return `${enclosed(left, 2)}${operator}${enclosed(right, 3)}`;
        case '+':
        case '-':
          return `${enclosed(left, 1)} ${operator} ${enclosed(right, 2)}`;
      }
    }
  }
}

const enclosed = (expression: Expression, least: number): string =>
  bindingOf(expression) >= least ? formatFormula(expression) : `(${formatFormula(expression)})`;
