import { compareLetters } from '@/features/notation/compare-letters';
import { crossingDistances } from '@/features/notation/crossing-distances';
import { toDouble } from '@/features/notation/to-double';
import type { CheckedOrbit, Entry } from '@/schemas/generated/contract';

/** An entry beside a submitted orbit of as many returns. */
export interface Beside {
  entry: Entry;
  /** Crossing of the entry, as drawn, with which its staff begins. */
  start: number;
  /** Places where the letters differ. */
  differs: number[];
  /** Time of each crossing of the submission, the first 0. */
  times: number[];
  /** How far each crossing is from its partner, in sizes of the orbit's extents. */
  distances: number[];
}

/** Crossings with the start first, as incipits draw them. */
function startFirst<T>(crossings: readonly T[]): T[] {
  return [...crossings.slice(-1), ...crossings.slice(0, -1)];
}

/**
 * Where an entry agrees best with a submitted orbit, by letters, and how far its crossings then are.
 *
 * @returns null when they have no itineraries, or different numbers of returns.
 */
export function besideEntry(orbit: CheckedOrbit, entry: Entry): Beside | null {
  if (orbit.itinerary === null || entry.itinerary === null) return null;
  // Itineraries are read up to rotation; nearness of the points says where the two orbits begin together.
  const letters = compareLetters(orbit.itinerary, entry.itinerary);
  if (letters === null || orbit.crossings.length !== entry.crossings.length) return null;
  const own = startFirst(orbit.crossings);
  const other = startFirst(entry.crossings).map(({ point }) => point);
  const points = own.map(({ point }) => point);
  const rotations = other.map((_, start) => ({
    start,
    distances: crossingDistances({ own: points, other, start, extent: orbit.extent }),
  }));
  const best = rotations.reduce((nearest, one) => (sum(one.distances) < sum(nearest.distances) ? one : nearest));
  return {
    entry,
    start: best.start,
    differs: letters.differs,
    times: [0, ...orbit.crossings.slice(0, -1).map(({ time }) => toDouble(time))],
    distances: best.distances,
  };
}

const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0);
