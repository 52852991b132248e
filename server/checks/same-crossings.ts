import { SAME_ORBIT, SAME_ORBIT_TOLERANCES } from '@/server/checks/limits';
import { closestRotation } from '@/server/numerics/periodic/closest-rotation';
import { orbitSizes } from '@/server/numerics/periodic/orbit-sizes';

/** An orbit by its crossings of a section. */
export interface CrossingCycle {
  /** Points in order of time, as decimals. */
  points: readonly (readonly string[])[];
  /** Range of every coordinate. */
  extent: readonly (readonly number[])[];
  tolerance: number;
}

/**
 * Whether two orbits, by their crossings of one and the same section, are the same: at some rotation every pair of
 * crossings is within max(10 tolerances, 1e-8), in sizes of the first.
 *
 * @param moduli modulus of each coordinate, null where it is no angle.
 */
export function sameCrossings(
  orbit: CrossingCycle,
  other: Pick<CrossingCycle, 'points'>,
  moduli: readonly (number | null)[],
): boolean {
  const limit = Math.max(SAME_ORBIT, SAME_ORBIT_TOLERANCES * orbit.tolerance);
  return (
    closestRotation({ points: stateOf(orbit), sizes: sizesOf(orbit, moduli), moduli }, stateOf(other), limit) !== null
  );
}

/** Sizes in which differences along the orbit are measured. */
export function sizesOf({ extent }: Pick<CrossingCycle, 'extent'>, moduli: readonly (number | null)[]): Float64Array {
  const [lowest, highest] = [0, 1].map((side) => Float64Array.from(extent, (range) => range[side]!));
  return orbitSizes({ lowest: lowest!, highest: highest! }, moduli);
}

const stateOf = ({ points }: Pick<CrossingCycle, 'points'>): Float64Array[] =>
  points.map((point) => Float64Array.from(point, Number));
