import { differenceSize } from '@/server/numerics/periodic/difference-size';
import { type CrossingPoints } from '@/server/numerics/periodic/smallest-repetition';
import { stateDifference } from '@/server/numerics/periodic/state-difference';

/** How two cycles of crossings lie on each other. */
export interface Rotation {
  /** Crossing j of the first goes with crossing j + rotation of the second. */
  rotation: number;
  /** Largest difference of a pair, in sizes. */
  distance: number;
}

/**
 * Lay one cycle of crossings on another: the rotation at which every pair is within the limit.
 *
 * Neither the period nor one near pair identifies an orbit: long orbits follow each other for a while.
 *
 * @param first   m crossing points in order of time, with sizes and moduli.
 * @param second  as many points of another orbit.
 * @param limit   largest difference of a pair, in sizes.
 * @returns       the best such rotation, null where there is none or the numbers of points differ.
 *
 * Cost: m² differences at worst; a rotation is left at its first pair beyond the limit.
 */
export function closestRotation(
  first: CrossingPoints,
  second: readonly Float64Array[],
  limit: number,
): Rotation | null {
  const { points, sizes, moduli } = first;
  const m = points.length;
  if (second.length !== m) return null;
  let best: Rotation | null = null;
  for (let rotation = 0; rotation < m; rotation += 1) {
    const bound = best === null ? limit : best.distance;
    let distance = 0;
    for (let j = 0; j < m && distance <= bound; j += 1) {
      const { difference } = stateDifference(second[(j + rotation) % m]!, points[j]!, moduli);
      distance = Math.max(distance, differenceSize(difference, sizes));
    }
    if (distance <= limit && (best === null || distance < best.distance)) best = { rotation, distance };
  }
  return best;
}
