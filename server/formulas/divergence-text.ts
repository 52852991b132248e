import type { CheckedSystem } from '@/server/formulas/checked-system';
import { collect, type Polynomial, type Term, toPolynomial, TooManyTerms } from '@/server/formulas/polynomial';

/** A longer formula says nothing at a glance. */
const LONGEST_TEXT = 200;

/**
 * The divergence of a system's field, Σ ∂f_i/∂x_i, multiplied out with exact coefficients.
 *
 * @returns canonical text of a formula, `0` where the flow preserves volume; null where it takes the derivative of a
 *   function, or more than 200 characters.
 */
export function divergenceText(system: Pick<CheckedSystem, 'variables' | 'definitions' | 'equations'>): string | null {
  const definitions = new Map(system.definitions.map(({ name, expression }) => [name, expression]));
  try {
    const parts = system.variables.map(({ name }, i) =>
      derivative(toPolynomial(system.equations[i]!, definitions), name),
    );
    if (parts.some((part) => part === null)) return null;
    const text = sumText(collect(parts.flatMap((part) => part ?? [])));
    return text.length > LONGEST_TEXT ? null : text;
  } catch (error) {
    if (error instanceof TooManyTerms) return null;
    throw error;
  }
}

/** ∂/∂name of each term by the power rule; null where the name stands inside a factor that is no power of it. */
function derivative(sum: Polynomial, name: string): Polynomial | null {
  const terms: Term[] = [];
  for (const { p, q, factors } of sum) {
    const inside = factors.filter(({ names }) => names.has(name));
    if (inside.length === 0) continue;
    const [factor, more] = inside;
    if (more || factor!.text !== name) return null;
    const lowered = factors.map((one) => (one === factor ? { ...one, power: one.power - 1 } : one));
    terms.push({ p: p * BigInt(factor!.power), q, factors: lowered });
  }
  return collect(terms);
}

function sumText(sum: Polynomial): string {
  const [first, ...rest] = sum;
  if (!first) return '0';
  const signed = (term: Term) => ` ${term.p < 0n ? '-' : '+'} ${sizeText(term)}`;
  return `${first.p < 0n ? '-' : ''}${sizeText(first)}${rest.map(signed).join('')}`;
}

/** A term without its sign: coefficient, factors with positive powers, and what they are divided by. */
function sizeText({ p, q, factors }: Term): string {
  const size = p < 0n ? -p : p;
  const above = factors.filter(({ power }) => power > 0).map(factorText);
  const below = factors.filter(({ power }) => power < 0).map(({ text, power }) => factorText({ text, power: -power }));
  const numerator = size === 1n && above.length > 0 ? above : [String(size), ...above];
  const denominator = q === 1n ? below : [String(q), ...below];
  return numerator.join('*') + denominator.map((factor) => `/${factor}`).join('');
}

const factorText = ({ text, power }: { text: string; power: number }): string =>
  power === 1 ? text : `${text}^${power}`;
