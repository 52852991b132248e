import { transversality, transversalScale } from '@/server/numerics/periodic/transversality';
import { type NearMiss, type SectionZero } from '@/server/numerics/section/section-zero';
import { type Flow } from '@/server/numerics/taylor/flow';

/** The least transverse place of an orbit. */
export interface SmallestTransversality {
  /** |cosine|, 0 … 1. */
  cosine: number;
  time: number;
  /** Whether u only comes near zero there. */
  missed: boolean;
}

/**
 * Find the least transverse meeting of an orbit with the section: over all zeros of u, of either sign, and near misses.
 *
 * A near miss counts with the cosine of the pair of crossings that would appear if u were shifted by as much again:
 * √(2 |u| |ü|) over the head-on speed. A pair at gap g has a cosine like √g, so the count of returns means something only
 * while this stays above the root of the rounding of u.
 *
 * @param flow   gives f and grad u.
 * @param found  zeros and near misses along the orbit.
 * @param sizes  n positive sizes, see orbitSizes.
 * @returns      cosine 1 at time 0 where nothing was found.
 */
export function smallestTransversality(
  flow: Flow,
  found: { zeros: readonly SectionZero[]; nearMisses: readonly NearMiss[] },
  sizes: Float64Array,
): SmallestTransversality {
  let smallest: SmallestTransversality = { cosine: 1, time: 0, missed: false };
  for (const zero of found.zeros) {
    const cosine = Math.abs(transversality(flow, zero.state, sizes));
    if (cosine < smallest.cosine) smallest = { cosine, time: zero.time, missed: false };
  }
  for (const miss of found.nearMisses) {
    const scale = transversalScale(flow, miss.state, sizes);
    const cosine = scale === 0 ? 0 : Math.sqrt(2 * Math.abs(miss.value * miss.curvature)) / scale;
    if (cosine < smallest.cosine) smallest = { cosine, time: miss.time, missed: true };
  }
  return smallest;
}
