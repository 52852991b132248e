import { toDouble } from './to-double';

/** A letter and the formula that is positive where it holds. */
export interface SectionLetter {
  letter: string;
  where: string;
}

const NAME = '[A-Za-z][A-Za-z0-9_]*';
const NUMBER = String.raw`\d+(?:\.\d+)?`;
const LINEAR = new RegExp(`^([+-]?)(${NAME})(?:([+-])(${NUMBER}))?$`);

type Side = (value: (variable: string) => number) => number;

/** `x`, `-x`, `x + 5.8`, `-(x + 5.8)` as functions of the point; null for every other formula. */
function sideOf(formula: string): Side | null {
  const compact = formula.replaceAll(/\s+/g, '');
  const negated = /^-\((.*)\)$/.exec(compact)?.[1];
  const [, sign, variable, plus, number = '0'] = LINEAR.exec(negated ?? compact) ?? [];
  if (variable === undefined) return null;
  const factor = sign === '-' ? -1 : 1;
  const constant = plus === '-' ? -toDouble(number) : toDouble(number);
  return (value) => (negated === undefined ? 1 : -1) * (factor * value(variable) + constant);
}

/**
 * The letter at each crossing, in their order; null where a formula is more than one coordinate against a number,
 * or where no letter or two hold. Meant for pictures: the itinerary itself comes from the server.
 */
export function crossingLetters(
  letters: readonly SectionLetter[],
  variables: readonly string[],
  points: readonly (readonly string[])[],
): string | null {
  const sides = letters.map(({ letter, where }) => ({ letter, side: sideOf(where) }));
  if (sides.length === 0 || sides.some(({ side }) => side === null)) return null;
  const found = points.map((point) => {
    const value = (variable: string) => toDouble(point[variables.indexOf(variable)] ?? 'NaN');
    const holding = sides.filter(({ side }) => side !== null && side(value) > 0);
    return holding.length === 1 ? holding[0]!.letter : null;
  });
  return found.includes(null) ? null : found.join('');
}
