import { type Extent } from '@/server/numerics/section/create-extent-watch';

/** A coordinate that moves less than this share of the largest extent is measured by the largest. */
const NEGLIGIBLE = 1e-6;

/**
 * Compute the sizes sᵢ in which differences of states are measured.
 *
 * sᵢ = max − min of coordinate i over the orbit, the modulus for an angle; where that is below 1e-6 of the largest, the
 * largest; 1 for all where nothing moves.
 *
 * @param extent  range of each coordinate over the orbit.
 * @param moduli  modulus of each coordinate, null where it is no angle.
 * @returns       n positive sizes in the units of the coordinates.
 */
export function orbitSizes(extent: Extent, moduli: readonly (number | null)[]): Float64Array {
  const sizes = Float64Array.from(moduli, (modulus, i) => modulus ?? extent.highest[i]! - extent.lowest[i]!);
  const largest = sizes.reduce((size, entry) => Math.max(size, entry), 0);
  if (!(largest > 0) || !Number.isFinite(largest)) return sizes.fill(1);
  return sizes.map((size) => (size < NEGLIGIBLE * largest ? largest : size));
}
