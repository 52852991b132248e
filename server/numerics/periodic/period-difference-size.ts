/**
 * Measure a difference dT of periods: max(|dT| / T, max over i of |fᵢ(x₀)| |dT| / sᵢ), a pure number.
 *
 * @param difference  dT, time.
 * @param period      T > 0, time.
 * @param field       f(x₀), n velocities.
 * @param sizes       n positive sizes, see orbitSizes.
 */
export function periodDifferenceSize(
  difference: number,
  period: number,
  field: Float64Array,
  sizes: Float64Array,
): number {
  const fastest = field.reduce((speed, entry, i) => Math.max(speed, Math.abs(entry) / sizes[i]!), 0);
  return Math.abs(difference) * Math.max(1 / period, fastest);
}
