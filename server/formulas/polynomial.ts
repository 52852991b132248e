import { formatFormula } from '@/server/formulas/format-formula';
import type { Expression } from '@/server/numerics/expression/expression';

/** What a term multiplies: a name, or a part of a formula that is no polynomial, by its text. */
interface Factor {
  text: string;
  power: number;
  /** Names that it holds. */
  names: ReadonlySet<string>;
}

/** p/q times a product of factors; q > 0, without common divisor. */
export interface Term {
  p: bigint;
  q: bigint;
  factors: readonly Factor[];
}

/** A sum of terms, each product of factors once. */
export type Polynomial = readonly Term[];

/** Products of sums grow fast; beyond this many terms nobody reads them. */
const TERMS_LIMIT = 200;
/** Powers of sums are multiplied out up to here. */
const POWER_LIMIT = 16;

/** The expression has more terms than anybody reads. */
export class TooManyTerms extends Error {}

/**
 * Multiply an expression out, with exact coefficients.
 *
 * @param definitions by name; names that have one are replaced by it.
 * @returns the sum; functions, powers and quotients that are no polynomial stay as factors.
 * @throws {TooManyTerms} beyond 200 terms.
 */
export function toPolynomial(expression: Expression, definitions: ReadonlyMap<string, Expression>): Polynomial {
  switch (expression.kind) {
    case 'number':
      return collect([exactTerm(expression.text)]);
    case 'constant':
      return [asFactor(expression.name, [])];
    case 'name': {
      const definition = definitions.get(expression.name);
      return definition ? toPolynomial(definition, definitions) : [asFactor(expression.name, [expression.name])];
    }
    case 'negate':
      return negated(toPolynomial(expression.argument, definitions));
    case 'call':
      return opaque(expression, definitions);
    case 'binary':
      return ofBinary(expression, definitions);
  }
}

function ofBinary(
  expression: Extract<Expression, { kind: 'binary' }>,
  definitions: ReadonlyMap<string, Expression>,
): Polynomial {
  const left = toPolynomial(expression.left, definitions);
  const right = toPolynomial(expression.right, definitions);
  switch (expression.operator) {
    case '+':
      return collect([...left, ...right]);
    case '-':
      return collect([...left, ...negated(right)]);
    case '*':
      return product(left, right);
    case '/':
      return right.length === 1 ? product(left, [inverse(right[0]!)]) : opaque(expression, definitions);
    case '^':
      return power(left, right) ?? opaque(expression, definitions);
  }
}

const negated = (sum: Polynomial): Polynomial => sum.map((term) => ({ ...term, p: -term.p }));

function product(left: Polynomial, right: Polynomial): Polynomial {
  const terms = left.flatMap((a) =>
    right.map((b) => ({ p: a.p * b.p, q: a.q * b.q, factors: [...a.factors, ...b.factors] })),
  );
  return collect(terms);
}

/** Null where the exponent is no small whole number, or negative for a sum. */
function power(base: Polynomial, exponent: Polynomial): Polynomial | null {
  const [term, more] = exponent;
  if (more || (term && (term.factors.length > 0 || term.q !== 1n))) return null;
  const k = term ? Number(term.p) : 0;
  if (Math.abs(k) > POWER_LIMIT || (k < 0 && base.length !== 1)) return null;
  const repeated = k < 0 ? [inverse(base[0]!)] : base;
  let result: Polynomial = [{ p: 1n, q: 1n, factors: [] }];
  for (let i = 0; i < Math.abs(k); i++) result = product(result, repeated);
  return result;
}

function inverse({ p, q, factors }: Term): Term {
  const sign = p < 0n ? -1n : 1n;
  return { p: sign * q, q: sign * p, factors: factors.map((factor) => ({ ...factor, power: -factor.power })) };
}

const asFactor = (text: string, names: Iterable<string>): Term => ({
  p: 1n,
  q: 1n,
  factors: [{ text, power: 1, names: new Set(names) }],
});

function opaque(expression: Expression, definitions: ReadonlyMap<string, Expression>): Polynomial {
  const text = formatFormula(expression);
  const isCall = expression.kind === 'call';
  return [asFactor(isCall ? text : `(${text})`, namesIn(expression, definitions))];
}

function* namesIn(expression: Expression, definitions: ReadonlyMap<string, Expression>): Generator<string> {
  switch (expression.kind) {
    case 'number':
    case 'constant':
      return;
    case 'name': {
      const definition = definitions.get(expression.name);
      if (definition) yield* namesIn(definition, definitions);
      else yield expression.name;
      return;
    }
    case 'negate':
    case 'call':
      yield* namesIn(expression.argument, definitions);
      return;
    case 'binary':
      yield* namesIn(expression.left, definitions);
      yield* namesIn(expression.right, definitions);
  }
}

/** A number of a formula: digits, a point, an exponent. */
function exactTerm(text: string): Term {
  const [mantissa = '', exponent = '0'] = text.toLowerCase().split('e');
  const [whole = '', decimals = ''] = mantissa.split('.');
  const place = BigInt(exponent) - BigInt(decimals.length);
  const digits = BigInt(whole + decimals || '0');
  return place >= 0n ? { p: digits * 10n ** place, q: 1n, factors: [] } : { p: digits, q: 10n ** -place, factors: [] };
}

/** Add up terms with the same factors; order stays that of their first appearance. */
export function collect(terms: readonly Term[]): Polynomial {
  const sums = new Map<string, Term>();
  for (const { p, q, factors } of terms) {
    const merged = mergeFactors(factors);
    const key = merged.map(({ text, power: k }) => `${text}^${k}`).join('*');
    const before = sums.get(key);
    const sum = before ? reduced(before.p * q + p * before.q, before.q * q) : reduced(p, q);
    sums.set(key, { ...sum, factors: merged });
    if (sums.size > TERMS_LIMIT) throw new TooManyTerms(`more than ${TERMS_LIMIT} terms`);
  }
  return [...sums.values()].filter(({ p }) => p !== 0n);
}

function mergeFactors(factors: readonly Factor[]): Factor[] {
  const merged = new Map<string, Factor>();
  for (const factor of factors) {
    const before = merged.get(factor.text);
    merged.set(factor.text, before ? { ...factor, power: before.power + factor.power } : factor);
  }
  return [...merged.values()].filter(({ power: k }) => k !== 0).sort((a, b) => (a.text < b.text ? -1 : 1));
}

function reduced(p: bigint, q: bigint): { p: bigint; q: bigint } {
  let [a, b] = [p < 0n ? -p : p, q];
  while (b !== 0n) [a, b] = [b, a % b];
  return { p: p / a, q: q / a };
}
