import type { CheckedSystem } from '@/server/formulas/checked-system';
import { evaluate } from '@/server/formulas/evaluate';
import type { Expression } from '@/server/numerics/expression/expression';

/** Random states at which invariance under an angle's modulus is tested. */
const TRIALS = 8;
/** Largest relative change that rounding explains. */
const ROUNDING = 1e-9;
/** Seed of the random states: the same document always gets the same answer. */
const SEED = 20_170_329;

/**
 * Formulas that change when an angle grows by its modulus.
 *
 * @returns one sentence a formula, with its path in the document.
 *
 * Accuracy: a test at random states; a formula that differs only elsewhere passes.
 */
export function checkAngles(system: CheckedSystem): { path: string; message: string }[] {
  const angles = system.variables.filter(({ modulus }) => modulus !== null);
  if (angles.length === 0) return [];
  return formulasOf(system).flatMap(({ path, expression }) => {
    const angle = angles.find((one) => changesWith(system, expression, one));
    if (!angle) return [];
    const words = `This changes when the angle ${angle.name} grows by its modulus; write it with sin(${angle.name} - c) or cos(${angle.name} - c).`;
    return [{ path, message: words }];
  });
}

function formulasOf(system: CheckedSystem): { path: string; expression: Expression }[] {
  const { variables, equations, sections, invariants } = system;
  return [
    ...equations.map((expression, index) => ({ path: `/equations/${variables[index]?.name ?? ''}`, expression })),
    ...sections.flatMap(({ expression, letters }, index) => [
      { path: `/sections/${index}/formula`, expression },
      ...letters.map((letter, place) => ({
        path: `/sections/${index}/letters/${place}/where`,
        expression: letter.expression,
      })),
    ]),
    ...invariants.map(({ expression }, index) => ({ path: `/invariants/${index}/formula`, expression })),
  ];
}

/** Whether an expression of a system changes when one angle grows by its modulus. */
export function changesWith(
  system: CheckedSystem,
  expression: Expression,
  angle: { name: string; modulus: number | null },
): boolean {
  const random = randomNumbers(SEED);
  for (let trial = 0; trial < TRIALS; trial++) {
    const state = new Map(system.variables.map(({ name }) => [name, 2 * random() - 1]));
    const before = valueAt(system, expression, state);
    state.set(angle.name, (state.get(angle.name) ?? 0) + (angle.modulus ?? 0));
    const after = valueAt(system, expression, state);
    if (Math.abs(after - before) > ROUNDING * (1 + Math.abs(before))) return true;
  }
  return false;
}

function valueAt(system: CheckedSystem, expression: Expression, state: ReadonlyMap<string, number>): number {
  const values = new Map(state);
  for (const { name, read } of system.parameters) values.set(name, read.value);
  for (const { name, expression: definition } of system.definitions) values.set(name, evaluate(definition, values));
  return evaluate(expression, values);
}

/** Numbers in [0, 1) from a linear congruence; constants of Numerical Recipes' quick generator (from memory). */
function randomNumbers(seed: number): () => number {
  let state = seed;
  return () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 2 ** 32;
  };
}
