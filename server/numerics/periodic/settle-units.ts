import { type Multiplier } from '@/server/numerics/periodic/floquet-multipliers';

/**
 * Replace the multipliers that are known to equal 1 by exactly 1.
 *
 * The units of a family are defective: computed, they scatter about 1 by the square root of the roundoff or worse. Their
 * number comes from ranks (unitMultiplicity), so the nearest ones are taken.
 *
 * @param multipliers  all n, in any order.
 * @param units        how many equal 1, 0 ≤ units ≤ n.
 * @returns            all n, largest modulus first, conjugates adjacent.
 */
export function settleUnits(multipliers: readonly Multiplier[], units: number): Multiplier[] {
  const near = multipliers
    .map((multiplier, index) => ({ index, distance: distanceFromOne(multiplier) }))
    .sort((a, b) => a.distance - b.distance)
    .slice(0, units);
  const chosen = new Set(near.map(({ index }) => index));
  return multipliers
    .map((multiplier, index) => (chosen.has(index) ? { re: 1, im: 0, logModulus: 0 } : multiplier))
    .sort((a, b) => b.logModulus - a.logModulus);
}

function distanceFromOne({ re, im, logModulus }: Multiplier): number {
  const modulus = Math.exp(Math.min(logModulus, 700));
  return Math.hypot(modulus * re - 1, modulus * im);
}
