import { singularValues } from '@/server/numerics/linear/singular-values';

/** A problem A x ≈ b with the cut-off that decides on the rank. */
export interface LeastNormProblem {
  /** rows × cols, row-major. */
  a: Float64Array;
  rows: number;
  cols: number;
  b: Float64Array;
  /** Singular values at or below cutOff · σ_max count as zero; 0 ≤ cutOff < 1. */
  cutOff: number;
}

/**
 * Solve A x ≈ b in the least-squares sense and, where that leaves x open, take the shortest x.
 *
 *   x = Σ over σⱼ > cutOff·σ_max of vⱼ (uⱼ·b) / σⱼ
 *
 * @returns  x (length cols), the rank that was decided, all singular values, descending, and an orthonormal basis of what
 *           they leave open, cols × (cols − rank), row-major.
 * @throws {RangeError} when a shape does not fit or an entry is not finite.
 *
 * Accuracy: that of the singular values.
 * Cost: one singular value decomposition.
 * Source: the Moore–Penrose inverse (common practice).
 */
export function leastNormSolve(problem: LeastNormProblem): {
  x: Float64Array;
  rank: number;
  sigma: Float64Array;
  open: Float64Array;
} {
  const { a, rows, cols, b, cutOff } = problem;
  if (b.length !== rows) throw new RangeError(`${b.length} right-hand sides for ${rows} rows`);
  const { u, sigma, v } = singularValues(a, rows, cols);
  const limit = cutOff * (sigma[0] ?? 0);
  const x = new Float64Array(cols);
  let rank = 0;
  for (let j = 0; j < cols; j += 1) {
    if (!(sigma[j]! > limit)) continue;
    rank += 1;
    let projection = 0;
    for (let i = 0; i < rows; i += 1) projection += u[i * cols + j]! * b[i]!;
    projection /= sigma[j]!;
    for (let i = 0; i < cols; i += 1) x[i]! += projection * v[i * cols + j]!;
  }
  const width = cols - rank;
  const open = new Float64Array(cols * width);
  for (let i = 0; i < cols; i += 1) {
    for (let j = 0; j < width; j += 1) open[i * width + j] = v[i * cols + rank + j]!;
  }
  return { x, rank, sigma, open };
}
