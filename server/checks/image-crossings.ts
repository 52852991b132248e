import type { CheckedSystem } from '@/server/formulas/checked-system';
import { evaluate } from '@/server/formulas/evaluate';

interface Symmetry {
  reversesTime: boolean;
  map: CheckedSystem['symmetries'][number]['map'];
}

/**
 * The images of an orbit's crossings under a symmetry, in the order in which the image runs through them.
 *
 * @param points crossings in order of time, as decimals.
 * @param parameters value of every parameter.
 * @returns points as decimals. They are the image's own crossings where the symmetry maps the section onto itself.
 */
export function imageCrossings(
  points: readonly (readonly string[])[],
  system: Pick<CheckedSystem, 'variables' | 'definitions'>,
  { map, reversesTime }: Symmetry,
  parameters: ReadonlyMap<string, number>,
): string[][] {
  const images = points.map((point) => {
    const values = new Map(parameters);
    system.variables.forEach(({ name }, i) => values.set(name, Number(point[i])));
    for (const { name, expression } of system.definitions) values.set(name, evaluate(expression, values));
    return map.map((expression) => String(evaluate(expression, values)));
  });
  return reversesTime ? images.reverse() : images;
}
