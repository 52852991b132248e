/**
 * Fixed-point numbers: a bigint in units of 2^-bits. Products are floored, which is at most one unit off.
 */

/** The nearest fixed-point number to a finite double, exact when it has no smaller bits. */
export function fixedOfDouble(x: number, bits: number): bigint {
  if (x === 0) return 0n;
  const exponent = Math.floor(Math.log2(Math.abs(x)));
  // 2^(52 − exponent) may overflow a double: it is taken in two halves.
  const shift = 52 - exponent;
  const half = Math.trunc(shift / 2);
  const mantissa = BigInt(Math.round(x * 2 ** half * 2 ** (shift - half)));
  return shiftRounded(mantissa, bits - shift);
}

/** The nearest double, within the range of doubles. */
export function doubleOfFixed(x: bigint, bits: number): number {
  const size = x < 0n ? -x : x;
  const excess = Math.max(0, bitLength(size) - 64);
  return scaleDouble(Number(x >> BigInt(excess)), excess - bits);
}

/** The same number with another count of bits, rounded to the nearest. */
export const changeBits = (x: bigint, from: number, to: number): bigint => shiftRounded(x, to - from);

/** x·2^shift, rounded to the nearest integer. */
function shiftRounded(x: bigint, shift: number): bigint {
  if (shift >= 0) return x << BigInt(shift);
  return ((x >> BigInt(-shift - 1)) + 1n) >> 1n;
}

/** Bits of a positive integer. */
export function bitLength(x: bigint): number {
  if (x <= 0n) return 0;
  const hex = x.toString(16);
  return 4 * hex.length - Math.clz32(Number.parseInt(hex[0]!, 16)) + 28;
}

/** x·2^shift without an overflow on the way. */
function scaleDouble(x: number, shift: number): number {
  const half = Math.trunc(shift / 2);
  return x * 2 ** half * 2 ** (shift - half);
}

/** Largest integer whose square is at most x; x ≥ 0. */
export function integerSquareRoot(x: bigint): bigint {
  if (x < 0n) throw new RangeError('a negative number has no real square root');
  if (x === 0n) return 0n;
  const bits = bitLength(x);
  // A start above the root falls to it without ever passing it.
  let root = 1n << BigInt(Math.ceil(bits / 2));
  if (bits > 64) {
    const shift = 2 * Math.floor((bits - 52) / 2);
    root = (BigInt(Math.ceil(Math.sqrt(Number(x >> BigInt(shift)) + 1))) + 1n) << BigInt(shift / 2);
  }
  for (;;) {
    const next = (root + x / root) >> 1n;
    if (next >= root) return root;
    root = next;
  }
}
