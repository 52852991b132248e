import fc from 'fast-check';

interface Term {
  coefficient: number;
  exponents: number[];
}

/** A polynomial in the state, evaluated term by term: it shares nothing with the product's parser and compiler. */
export class Polynomial {
  private derivatives: Polynomial[] | null = null;

  constructor(private readonly terms: readonly Term[]) {}

  /** The formula that a user would type. */
  text(names: readonly string[]): string {
    return this.terms
      .map(({ coefficient, exponents }) => {
        const powers = exponents.flatMap((power, i) => (power === 0 ? [] : [`${names[i]!}^${power}`]));
        return [`(${coefficient})`, ...powers].join('*');
      })
      .join(' + ');
  }

  at(x: readonly number[]): number {
    let sum = 0;
    for (const { coefficient, exponents } of this.terms) sum += coefficient * monomial(x, exponents);
    return sum;
  }

  /** ∂/∂x_j at x, for every j. */
  gradient(x: readonly number[]): number[] {
    return this.slopes(x.length).map((slope) => slope.at(x));
  }

  private slopes(n: number): Polynomial[] {
    this.derivatives ??= Array.from(
      { length: n },
      (_, j) =>
        new Polynomial(
          this.terms.flatMap(({ coefficient, exponents }) => {
            const power = exponents[j]!;
            return power === 0 ? [] : [{ coefficient: coefficient * power, exponents: exponents.with(j, power - 1) }];
          }),
        ),
    );
    return this.derivatives;
  }

  plus(...terms: readonly Term[]): Polynomial {
    return new Polynomial([...this.terms, ...terms]);
  }
}

function monomial(x: readonly number[], exponents: readonly number[]): number {
  let product = 1;
  for (let i = 0; i < exponents.length; i++) for (let j = 0; j < exponents[i]!; j++) product *= x[i]!;
  return product;
}

/** Thousandths: their text is their double's shortest. */
const thousandths = (limit: number) => fc.integer({ min: -limit * 1000, max: limit * 1000 }).map((n) => n / 1000);

/** Random polynomials of degree 3 at most in n variables. */
export const polynomials = (n: number): fc.Arbitrary<Polynomial> =>
  fc
    .array(
      fc.record({
        coefficient: thousandths(1),
        factors: fc.array(fc.nat(n - 1), { maxLength: 3 }),
      }),
      { minLength: 2, maxLength: 5 },
    )
    .map(
      (terms) =>
        new Polynomial(
          terms.map(({ coefficient, factors }) => ({
            coefficient,
            exponents: Array.from({ length: n }, (_, i) => factors.filter((factor) => factor === i).length),
          })),
        ),
    );
