/** Shape of a row-major matrix and how many of its leading columns are worked on. */
export interface TriangulariseShape {
  rows: number;
  cols: number;
  /** Columns to be made upper triangular, 0 ≤ pivots ≤ min(rows, cols). */
  pivots: number;
}

/**
 * Make the leading columns of a matrix upper triangular by Householder reflections, in place.
 *
 * For each pivot column k the reflection H = I − β v vᵀ, v = x ± ‖x‖ e₁, acts on rows k and below of the whole
 * matrix, so that right-hand sides may simply stand in further columns.
 *
 * @param a      rows × cols, row-major; overwritten with Qᵀ a. Entries below the diagonal of the pivot columns
 *               become exactly 0.
 * @param shape  dimensions and number of pivot columns.
 * @throws {RangeError} when the length is not rows·cols or there are more pivots than rows or columns.
 *
 * Accuracy: backward stable, the rows keep their norms column by column.
 * Cost: about 2·rows·cols·pivots products, one allocation of length rows.
 * Source: A. S. Householder, Journal of the ACM 5 (1958) 339–342; sign of v so that nothing cancels (common practice).
 */
export function triangularise(a: Float64Array, shape: TriangulariseShape): void {
  const { rows, cols, pivots } = shape;
  if (a.length !== rows * cols || pivots > rows || pivots > cols) {
    throw new RangeError(`cannot triangularise ${pivots} columns of ${rows} × ${cols}`);
  }
  const v = new Float64Array(rows);
  for (let k = 0; k < pivots; k += 1) {
    const norm = columnNorm(a, shape, k);
    if (norm === 0) continue;
    const head = a[k * cols + k]!;
    const target = head > 0 ? -norm : norm;
    const tail = reflectionVector(a, shape, { k, target, v });
    if (tail !== 0) reflect(a, shape, { k, v, beta: 2 / tail });
    a[k * cols + k] = target;
    for (let i = k + 1; i < rows; i += 1) a[i * cols + k] = 0;
  }
}

function columnNorm(a: Float64Array, { rows, cols }: TriangulariseShape, k: number): number {
  let largest = 0;
  for (let i = k; i < rows; i += 1) largest = Math.max(largest, Math.abs(a[i * cols + k]!));
  if (largest === 0) return 0;
  let sum = 0;
  for (let i = k; i < rows; i += 1) sum += (a[i * cols + k]! / largest) ** 2;
  return largest * Math.sqrt(sum);
}

/** Fills v with x − target·e₁, scaled by the column's norm, and returns its squared length. */
function reflectionVector(
  a: Float64Array,
  { rows, cols }: TriangulariseShape,
  { k, target, v }: { k: number; target: number; v: Float64Array },
): number {
  let length = 0;
  for (let i = k; i < rows; i += 1) {
    const entry = (a[i * cols + k]! - (i === k ? target : 0)) / target;
    v[i] = entry;
    length += entry * entry;
  }
  return length;
}

function reflect(
  a: Float64Array,
  { rows, cols }: TriangulariseShape,
  { k, v, beta }: { k: number; v: Float64Array; beta: number },
): void {
  for (let j = k + 1; j < cols; j += 1) {
    let sum = 0;
    for (let i = k; i < rows; i += 1) sum += v[i]! * a[i * cols + j]!;
    sum *= beta;
    for (let i = k; i < rows; i += 1) a[i * cols + j]! -= sum * v[i]!;
  }
}
