/**
 * Write a derivative of states by states in sizes: S⁻¹ M S with S = diag(s).
 *
 * @param m      n × n, row-major.
 * @param sizes  n positive sizes.
 */
export function scaleMatrix(m: Float64Array, sizes: Float64Array): Float64Array {
  const n = sizes.length;
  return m.map((entry, k) => (entry * sizes[k % n]!) / sizes[Math.floor(k / n)]!);
}
