/**
 * Write a derivative of states by states in sizes: S⁻¹ M S with S = diag(s).
 *
 * @param m      n × n, row-major.
 * @param sizes  n positive sizes.
 */
export function scaleMatrix(m: Float64Array, sizes: Float64Array): Float64Array {
  const n = sizes.length;
  const scaled = new Float64Array(n * n);
  for (let i = 0; i < n; i += 1) {
    for (let j = 0; j < n; j += 1) scaled[i * n + j] = (m[i * n + j]! * sizes[j]!) / sizes[i]!;
  }
  return scaled;
}
