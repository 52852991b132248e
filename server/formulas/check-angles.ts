import type { CheckedSystem } from '@/server/formulas/checked-system';
import { segment } from '@/server/formulas/error-list';
import { evaluate } from '@/server/formulas/evaluate';
import type { Expression } from '@/server/numerics/expression/expression';

/** Random states of each size at which invariance under an angle's modulus is tested. */
const TRIALS = 8;
/** Largest coordinates of the states: a formula may be defined among large ones only. */
const SIZES = [1, 10, 100];
/** Largest change that rounding explains, as part of the formula's values and by itself. */
const ROUNDING = { relative: 1e-9, absolute: 1e-13 };
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
  return formulasOf(system).flatMap(({ path, expression, image }) => {
    const angle = angles.find((one) => changesWith(system, expression, one, image));
    if (!angle) return [];
    const words = `This changes when the angle ${angle.name} grows by its modulus; write it with sin(${angle.name} - c) or cos(${angle.name} - c).`;
    return [{ path, message: words }];
  });
}

/** A formula with its place; the image of an angle may itself turn by whole multiples of that angle's modulus. */
interface PlacedFormula {
  path: string;
  expression: Expression;
  image?: number | null;
}

function formulasOf(system: CheckedSystem): PlacedFormula[] {
  const { variables, equations, sections, invariants, symmetries } = system;
  const nameOf = (index: number): string => segment(variables[index]?.name ?? '');
  return [
    ...equations.map((expression, index) => ({ path: `/equations/${nameOf(index)}`, expression })),
    ...sections.flatMap(({ expression, letters }, index) => [
      { path: `/sections/${index}/formula`, expression },
      ...letters.map((letter, place) => ({
        path: `/sections/${index}/letters/${place}/where`,
        expression: letter.expression,
      })),
    ]),
    ...invariants.map(({ expression }, index) => ({ path: `/invariants/${index}/formula`, expression })),
    ...symmetries.flatMap(({ map }, index) =>
      map.map((expression, place) => ({
        path: `/symmetries/${index}/map/${nameOf(place)}`,
        expression,
        image: variables[place]?.modulus ?? null,
      })),
    ),
  ];
}

/**
 * Whether an expression of a system changes when one angle grows by its modulus.
 *
 * @param image modulus of the expression's own value, where it is an angle: whole multiples of it are no change.
 */
export function changesWith(
  system: CheckedSystem,
  expression: Expression,
  angle: { name: string; modulus: number | null },
  image: number | null = null,
): boolean {
  const random = randomNumbers(SEED);
  return SIZES.some((size) => {
    const values = Array.from({ length: TRIALS }, () => {
      const state = new Map(system.variables.map(({ name }) => [name, size * (2 * random() - 1)]));
      const before = valueAt(system, expression, state);
      state.set(angle.name, (state.get(angle.name) ?? 0) + (angle.modulus ?? 0));
      const change = valueAt(system, expression, state) - before;
      return { before, change: image === null ? change : change - image * Math.round(change / image) };
    }).filter(({ before, change }) => Number.isFinite(before) && Number.isFinite(change));
    const scale = Math.max(0, ...values.map(({ before }) => Math.abs(before)));
    return values.some(({ change }) => Math.abs(change) > ROUNDING.relative * scale + ROUNDING.absolute);
  });
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
