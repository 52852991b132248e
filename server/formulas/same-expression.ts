import type { Expression } from '@/server/numerics/expression/expression';

/** Whether two trees are the same, their numbers compared by value: 27 and 27.0 are one. */
export function sameExpression(a: Expression, b: Expression): boolean {
  switch (a.kind) {
    case 'number':
      return b.kind === 'number' && a.value === b.value;
    case 'constant':
      return b.kind === 'constant';
    case 'name':
      return b.kind === 'name' && a.name === b.name;
    case 'negate':
      return b.kind === 'negate' && sameExpression(a.argument, b.argument);
    case 'call':
      return b.kind === 'call' && a.function === b.function && sameExpression(a.argument, b.argument);
    case 'binary':
      return (
        b.kind === 'binary' &&
        a.operator === b.operator &&
        sameExpression(a.left, b.left) &&
        sameExpression(a.right, b.right)
      );
  }
}
