import { countWord } from './count-word';
import type { IncipitMusic } from './incipit-props';
import { minusSign } from './minus-sign';
import { stateLook } from './orbit-state';
import { toDouble } from './to-double';

/** Heights read out; of a longer orbit the count of the rest is said. */
const MOST_READ = 12;
/** Significant digits of a height that is read out. */
const DIGITS = 3;

const readable = (value: number): string =>
  minusSign(Math.abs(value) >= 100 ? String(Math.round(value)) : String(parseFloat(value.toPrecision(DIGITS))));

/** The text alternative of an incipit: "three crossings, x = 13.5, −12.6, 13.9; closes". */
export function incipitWords({ crossings, coordinate, state }: IncipitMusic): string {
  const count = crossings.length;
  const read = crossings.slice(0, MOST_READ).map((value) => readable(toDouble(value)));
  const rest = count > MOST_READ ? ` and ${count - MOST_READ} more` : '';
  const heights = count === 0 ? '' : `, ${coordinate} = ${read.join(', ')}${rest}`;
  return `${countWord(count)} ${count === 1 ? 'crossing' : 'crossings'}${heights}; ${stateLook[state].word}`;
}
