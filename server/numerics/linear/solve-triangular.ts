/**
 * Solve R x = b or Rᵀ x = b for an upper triangular R.
 *
 * @param r          n × n, row-major; only the upper triangle is read.
 * @param b          length n; left as it is.
 * @param transposed solve with Rᵀ instead.
 * @returns          x, newly allocated. A zero on the diagonal gives infinities or NaN, as division does.
 *
 * Accuracy: backward stable.
 * Cost: n²/2 products.
 * Source: substitution (common practice).
 */
export function solveTriangular(r: Float64Array, b: Float64Array, transposed = false): Float64Array {
  const n = b.length;
  if (r.length !== n * n) throw new RangeError(`triangle of ${r.length} entries for ${n} unknowns`);
  const x = Float64Array.from(b);
  for (let step = 0; step < n; step += 1) {
    const i = transposed ? step : n - 1 - step;
    let sum = x[i]!;
    if (transposed) for (let j = 0; j < i; j += 1) sum -= r[j * n + i]! * x[j]!;
    else for (let j = i + 1; j < n; j += 1) sum -= r[i * n + j]! * x[j]!;
    x[i] = sum / r[i * n + i]!;
  }
  return x;
}
