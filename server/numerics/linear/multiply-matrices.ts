/**
 * Multiply two dense matrices: C = A·B.
 *
 * @param a      m × k, row-major.
 * @param b      k × n, row-major.
 * @param rows   m.
 * @param inner  k.
 * @returns      m × n, row-major, newly allocated.
 * @throws {RangeError} when a length is not the product of its dimensions.
 *
 * Accuracy: each entry within k·ulp of Σ |aᵢₗ||bₗⱼ| (common practice).
 * Cost: m·k·n products, one allocation.
 */
export function multiplyMatrices(a: Float64Array, b: Float64Array, rows: number, inner: number): Float64Array {
  const cols = inner === 0 ? 0 : b.length / inner;
  if (a.length !== rows * inner || !Number.isInteger(cols)) {
    throw new RangeError(`cannot multiply ${a.length} entries as ${rows} × ${inner} by ${b.length}`);
  }
  const product = new Float64Array(rows * cols);
  for (let i = 0; i < rows; i += 1) {
    for (let l = 0; l < inner; l += 1) {
      const factor = a[i * inner + l]!;
      if (factor === 0) continue;
      for (let j = 0; j < cols; j += 1) product[i * cols + j]! += factor * b[l * cols + j]!;
    }
  }
  return product;
}
