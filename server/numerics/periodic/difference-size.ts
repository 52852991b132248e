/**
 * Measure a difference of states: max over i of |Dᵢ| / sᵢ, a pure number.
 *
 * @param difference  n coordinates.
 * @param sizes       n positive sizes, see orbitSizes.
 * @returns           Infinity where an entry is not a number.
 */
export function differenceSize(difference: Float64Array, sizes: Float64Array): number {
  let size = 0;
  for (let i = 0; i < difference.length; i += 1) {
    const share = Math.abs(difference[i]!) / sizes[i]!;
    if (Number.isNaN(share)) return Infinity;
    size = Math.max(size, share);
  }
  return size;
}
