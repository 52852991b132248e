import { differenceSize } from '@/server/numerics/periodic/difference-size';
import { stateDifference } from '@/server/numerics/periodic/state-difference';

/** Crossing points of an orbit and how their differences are measured. */
export interface CrossingPoints {
  points: readonly Float64Array[];
  sizes: Float64Array;
  moduli: readonly (number | null)[];
}

/**
 * Find the smallest number of returns after which the crossings of an orbit repeat.
 *
 * @param orbit  m crossing points in order of time.
 * @param limit  the largest difference, in sizes, between a crossing and its repetition.
 * @returns      the smallest divisor k of m with every crossing j + k within the limit of crossing j; m where there is none.
 *
 * Cost: divisors of m times m differences at most, usually one each.
 */
export function smallestRepetition({ points, sizes, moduli }: CrossingPoints, limit: number): number {
  const m = points.length;
  for (let k = 1; k < m; k += 1) {
    if (m % k !== 0) continue;
    const repeats = points.every(
      (point, j) => differenceSize(stateDifference(points[(j + k) % m]!, point, moduli).difference, sizes) <= limit,
    );
    if (repeats) return k;
  }
  return m;
}
