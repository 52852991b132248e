/** Bits of the quotient that decide the rounding: 53 of the double and enough below. */
const QUOTIENT_BITS = 66;

const bitLength = (x: bigint): number => x.toString(2).length;

/**
 * The double nearest to p/q.
 *
 * @param p ≥ 0.
 * @param q > 0.
 * @returns the correctly rounded quotient (ties to even) within the range of normal doubles.
 */
export function nearestDouble(p: bigint, q: bigint): number {
  if (p === 0n) return 0;
  const shift = QUOTIENT_BITS - (bitLength(p) - bitLength(q));
  const [top, bottom] = shift >= 0 ? [p << BigInt(shift), q] : [p, q << BigInt(-shift)];
  const quotient = top / bottom;
  // A remainder makes the quotient odd below the rounding place, so that no false tie arises.
  const sticky = top % bottom === 0n ? quotient : quotient | 1n;
  return Number(sticky) * 2 ** -shift;
}
