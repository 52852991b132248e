import { crossingDistances } from '@/features/notation/crossing-distances';
import { toDouble } from '@/features/notation/to-double';
import type { CheckedOrbit, Entry } from '@/schemas/generated/contract';

/** An entry beside a submitted orbit. */
export interface Beside {
  entry: Entry;
  /** Crossing of the entry, as drawn, with which its staff begins. */
  start: number;
  /** Places where the letters differ; none where the two have different numbers of returns. */
  differs: number[];
  /** How far each crossing is from its partner, in sizes of the orbit's extents; null for different numbers of returns. */
  distances: number[] | null;
}

/** An orbit's letters as its incipit draws them; null where it has none. */
type Letters = string | null | undefined;

/** Crossings with the start first, as incipits draw them. */
function startFirst<T>(crossings: readonly T[]): T[] {
  return [...crossings.slice(-1), ...crossings.slice(0, -1)];
}

/** Times of an orbit's crossings as drawn, the first 0. */
export const drawnTimes = (orbit: CheckedOrbit): number[] => [
  0,
  ...orbit.crossings.slice(0, -1).map(({ time }) => toDouble(time)),
];

/** Places where the letters of an entry, begun at `start`, differ from the submission's, as far as the shorter reaches. */
function differing(own: Letters, other: Letters, start: number): number[] {
  if (!own || !other) return [];
  const theirs = Array.from(other);
  return Array.from(own)
    .slice(0, theirs.length)
    .flatMap((letter, i) => (letter === theirs[(i + start) % theirs.length] ? [] : [i]));
}

/**
 * An entry begun where most of its letters agree with the submission's, and where its crossings are nearest when that
 * leaves a choice.
 *
 * @param own, other letters as drawn.
 */
export function besideEntry(orbit: CheckedOrbit, own: Letters, entry: Entry, other: Letters): Beside {
  const isSameLength = orbit.crossings.length === entry.crossings.length;
  const points = startFirst(orbit.crossings).map(({ point }) => point);
  const others = startFirst(entry.crossings).map(({ point }) => point);
  const rotations = others.map((_, start) => ({ start, differs: differing(own, other, start) }));
  const fewest = Math.min(...rotations.map(({ differs }) => differs.length));
  const agreeing = rotations.filter(({ differs }) => differs.length === fewest);
  if (!isSameLength) return { entry, start: agreeing[0]?.start ?? 0, differs: [], distances: null };
  const measured = agreeing.map((rotation) => ({
    ...rotation,
    distances: crossingDistances({ own: points, other: others, start: rotation.start, extent: orbit.extent }),
  }));
  return { entry, ...measured.reduce((one, two) => (sum(two.distances) < sum(one.distances) ? two : one)) };
}

const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0);
