import type { CheckedSystem } from '@/server/formulas/checked-system';
import type { Expression } from '@/server/numerics/expression/expression';

/** Whether an expression holds a variable of the system, itself or by way of definitions. */
export function dependsOnState(
  { variables, definitions }: Pick<CheckedSystem, 'variables' | 'definitions'>,
  expression: Expression,
): boolean {
  const varying = new Set(variables.map(({ name }) => name));
  for (const { name, expression: definition } of definitions) if (holdsOne(definition, varying)) varying.add(name);
  return holdsOne(expression, varying);
}

function holdsOne(expression: Expression, names: ReadonlySet<string>): boolean {
  switch (expression.kind) {
    case 'number':
    case 'constant':
      return false;
    case 'name':
      return names.has(expression.name);
    case 'negate':
    case 'call':
      return holdsOne(expression.argument, names);
    case 'binary':
      return holdsOne(expression.left, names) || holdsOne(expression.right, names);
  }
}
