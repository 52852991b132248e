import { type CheckRequest, type TypedNumber } from '@/schemas/generated/contract';
import { type CheckedSection, type CheckedSystem } from '@/server/formulas/checked-system';
import { parseFormula } from '@/server/formulas/parse-formula';
import { type Expression } from '@/server/numerics/expression/expression';
import { PreciseFlow } from '@/server/numerics/precision/precise-flow';
import { parseRational } from '@/server/numerics/precision/rational';

/**
 * The flow of a system for many digits: parameters as typed, never by way of a double.
 *
 * @param hold name of the variable or invariant that is held in a family; null for none.
 */
export function preciseSystem(
  system: CheckedSystem,
  {
    parameters = {},
    section,
    hold,
  }: Pick<CheckRequest, 'parameters'> & { section: CheckedSection; hold: string | null },
): PreciseFlow {
  return new PreciseFlow({
    variables: system.document.variables.map(({ name, modulus }) => ({
      name,
      modulus: modulus === undefined ? null : constantOf(modulus),
    })),
    parameters: system.parameters.map(({ name, read }) => ({
      name,
      exact: parseRational(textOf(parameters[name]) ?? read.text),
    })),
    definitions: system.definitions,
    equations: system.equations,
    section: section.expression,
    hold: hold === null ? null : heldExpression(system, hold),
  });
}

const textOf = (typed: TypedNumber | undefined): string | null => (typed === undefined ? null : String(typed));

function constantOf(formula: string): Expression {
  const parsed = parseFormula(formula, new Set());
  if (!parsed.ok) throw new RangeError(`the modulus ${formula} cannot be read`);
  return parsed.expression;
}

/** A variable before an invariant of the same name. */
function heldExpression(system: CheckedSystem, hold: string): Expression {
  if (system.variables.some(({ name }) => name === hold)) return { kind: 'name', name: hold };
  const invariant = system.invariants.find(({ name }) => name === hold);
  if (!invariant) throw new RangeError(`${hold} is neither a variable nor an invariant`);
  return invariant.expression;
}
