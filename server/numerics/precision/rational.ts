/** An exact number p/q: q > 0, no common divisor. */
export interface Rational {
  p: bigint;
  q: bigint;
}

const DECIMAL = /^([+-]?)([0-9]*)(?:\.([0-9]*))?(?:[eE]([+-]?[0-9]+))?$/;
const FRACTION = /^([+-]?[0-9]+)\/([0-9]+)$/;

/** p/q in lowest terms; q ≠ 0. */
export function rational(p: bigint, q = 1n): Rational {
  const divisor = (q < 0n ? -1n : 1n) * gcd(p < 0n ? -p : p, q < 0n ? -q : q);
  return { p: p / divisor, q: q / divisor };
}

/** The four operations, exactly; null for a division by zero. */
export function combineRationals(
  operation: 'add' | 'subtract' | 'multiply' | 'divide',
  a: Rational,
  b: Rational,
): Rational | null {
  switch (operation) {
    case 'add':
      return rational(a.p * b.q + b.p * a.q, a.q * b.q);
    case 'subtract':
      return rational(a.p * b.q - b.p * a.q, a.q * b.q);
    case 'multiply':
      return rational(a.p * b.p, a.q * b.q);
    case 'divide':
      return b.p === 0n ? null : rational(a.p * b.q, a.q * b.p);
  }
}

/**
 * Read a decimal, with or without exponent, or a fraction of integers, exactly.
 *
 * @throws {RangeError} when the text is neither, or divides by zero.
 */
export function parseRational(text: string): Rational {
  const fraction = FRACTION.exec(text);
  if (fraction && BigInt(fraction[2]!) !== 0n) return rational(BigInt(fraction[1]!), BigInt(fraction[2]!));
  const [, sign, whole = '', decimals = '', exponent = '0'] = DECIMAL.exec(text) ?? [];
  if (sign === undefined || whole + decimals === '') throw new RangeError(`${text} is no exact number`);
  const size = BigInt(whole + decimals);
  const place = BigInt(exponent) - BigInt(decimals.length);
  const p = sign === '-' ? -size : size;
  return place >= 0n ? rational(p * 10n ** place) : rational(p, 10n ** -place);
}

/** The exact value of a finite double. */
export function rationalOfDouble(x: number): Rational {
  if (!Number.isFinite(x)) throw new RangeError(`${x} is no number`);
  let scaled = x;
  let exponent = 0n;
  while (!Number.isInteger(scaled)) {
    scaled *= 2;
    exponent += 1n;
  }
  return rational(BigInt(scaled), 1n << exponent);
}

/** The nearest fixed-point number with so many bits after the point, as an integer in units of 2^-bits. */
export function fixedOfRational({ p, q }: Rational, bits: number): bigint {
  const doubled = (p << BigInt(bits + 1)) / q;
  return (doubled + (doubled < 0n ? -1n : 1n)) / 2n;
}

function gcd(a: bigint, b: bigint): bigint {
  let [x, y] = [a, b];
  while (y !== 0n) [x, y] = [y, x % y];
  return x === 0n ? 1n : x;
}
