/** A difference of two states, angles taken to the nearest multiple of their modulus. */
export interface StateDifference {
  difference: Float64Array;
  /** Whole turns that were taken off, per coordinate; null where it is no angle. */
  winding: (number | null)[];
}

/**
 * Subtract two states; where a coordinate is an angle, take off the whole turns.
 *
 * @param to      n coordinates.
 * @param from    n coordinates.
 * @param moduli  modulus of each coordinate, null where it is no angle.
 */
export function stateDifference(
  to: Float64Array,
  from: Float64Array,
  moduli: readonly (number | null)[],
): StateDifference {
  const winding: (number | null)[] = [];
  const difference = to.map((value, i) => {
    const modulus = moduli[i] ?? null;
    const turns = modulus === null ? 0 : Math.round((value - from[i]!) / modulus);
    winding.push(modulus === null ? null : turns);
    return modulus === null ? value - from[i]! : value - from[i]! - turns * modulus;
  });
  return { difference, winding };
}
