import type { Expression } from '@/server/numerics/expression/expression';
import { parseFormula } from '@/server/formulas/parse-formula';
import { createFlow, type Flow } from '@/server/numerics/taylor/flow';

/** A flow from formulas: variables with their right-hand sides, and u. */
export function flowOf(equations: Record<string, string>, section: string): Flow {
  const names = Object.keys(equations);
  const known = new Set(names);
  const parse = (text: string): Expression => {
    const parsed = parseFormula(text, known);
    if (!parsed.ok) throw new Error(parsed.error.message);
    return parsed.expression;
  };
  return createFlow({
    variables: names.map((name) => ({ name, modulus: null })),
    parameters: [],
    definitions: [],
    equations: Object.values(equations).map(parse),
    section: parse(section),
    outputs: [],
  });
}

export const lorenzFlow = (section: string): Flow =>
  flowOf({ x: '10*(y - x)', y: '28*x - y - x*z', z: 'x*y - 8/3*z' }, section);

export const keplerFlow = (section: string): Flow =>
  flowOf({ x: 'u', y: 'v', u: '-x/(x^2 + y^2)^(3/2)', v: '-y/(x^2 + y^2)^(3/2)' }, section);

/** Start and period of the Lorenz orbit AB. */
export const AB = { start: Float64Array.of(-13.763610682134201, -19.578751942451796, 27), period: 1.5586522107161747 };
