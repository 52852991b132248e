import { toDouble } from './to-double';

export interface CrossingDistancesOptions {
  /** Points of the crossings of one orbit, in order of time. */
  own: readonly (readonly string[])[];
  /** Those of the other, as many. */
  other: readonly (readonly string[])[];
  /** Crossing of the other that stands beside the first. */
  start: number;
  /** Smallest and largest value of each coordinate: distances are in these sizes; in the coordinates' own units without. */
  extent?: readonly (readonly number[])[];
}

/** How far each crossing of one orbit is from its partner in another: the largest difference of a coordinate. For pictures. */
export function crossingDistances({ own, other, start, extent }: CrossingDistancesOptions): number[] {
  const sizeOf = (coordinate: number) => {
    const [low = 0, high = 0] = extent?.[coordinate] ?? [0, 1];
    return high > low ? high - low : 1;
  };
  return own.map((point, i) => {
    const partner = other[(i + start) % other.length] ?? [];
    const differences = point.map((value, k) => Math.abs(toDouble(value) - toDouble(partner[k] ?? value)) / sizeOf(k));
    return Math.max(0, ...differences);
  });
}
