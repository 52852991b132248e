import { identityMatrix } from '@/server/numerics/linear/identity-matrix';

/** Rotations stop when the cosine between two columns is below this: a few units of roundoff. */
const ORTHOGONAL = 1e-15;

/** Sweeps over all pairs; convergence is quadratic and seldom takes more than ten (common practice). */
const MAX_SWEEPS = 60;

/** A = U·diag(σ)·Vᵀ, σ in descending order. */
export interface SingularValues {
  /** rows × cols; column j is zero where σⱼ is zero. */
  u: Float64Array;
  /** cols values, ≥ 0, descending. */
  sigma: Float64Array;
  /** cols × cols, orthogonal: its columns for σⱼ = 0 span the null space, also when rows < cols. */
  v: Float64Array;
}

/**
 * Decompose a matrix into singular values and vectors by one-sided Jacobi rotations.
 *
 * Columns are rotated in pairs until all are orthogonal: A·V = U·Σ.
 *
 * @param a     rows × cols, row-major, any shape; left as it is.
 * @throws {RangeError} when the length does not fit or an entry is not finite.
 *
 * Accuracy: singular values to about cols·ulp of the largest, and small ones to high relative accuracy where they come
 *           from the columns' scaling.
 * Cost: about 6·rows·cols² products a sweep, 4 to 10 sweeps.
 * Source: M. R. Hestenes, J. SIAM 6 (1958) 51–90 (from memory); J. Demmel, K. Veselić, SIAM J. Matrix Anal. Appl. 13
 *         (1992) 1204–1245 for the accuracy (from memory).
 */
export function singularValues(a: Float64Array, rows: number, cols: number): SingularValues {
  if (a.length !== rows * cols) throw new RangeError(`${a.length} entries are not ${rows} × ${cols}`);
  if (!a.every(Number.isFinite)) throw new RangeError('a matrix entry is not finite');
  const w = transpose(a, rows, cols);
  const v = identityMatrix(cols);
  let total = 0;
  for (const entry of w) total += entry * entry;
  const negligible = total * Number.EPSILON ** 2;
  for (let sweep = 0; sweep < MAX_SWEEPS; sweep += 1) {
    let rotated = false;
    for (let p = 0; p < cols - 1; p += 1) {
      for (let q = p + 1; q < cols; q += 1) {
        const turn = rotation(w, { rows, p, q, negligible });
        if (turn === null) continue;
        rotated = true;
        rotateRows(w, rows, { p, q, ...turn });
        rotateRows(v, cols, { p, q, ...turn });
      }
    }
    if (!rotated) break;
  }
  return sorted(w, v, rows, cols);
}

function transpose(a: Float64Array, rows: number, cols: number): Float64Array {
  const t = new Float64Array(a.length);
  for (let i = 0; i < rows; i += 1) {
    for (let j = 0; j < cols; j += 1) t[j * rows + i] = a[i * cols + j]!;
  }
  return t;
}

/** Cosine and sine that make columns p and q orthogonal (they are kept as rows of w), or null where they are. */
function rotation(
  w: Float64Array,
  { rows, p, q, negligible }: { rows: number; p: number; q: number; negligible: number },
): { c: number; s: number } | null {
  let alpha = 0;
  let beta = 0;
  let gamma = 0;
  for (let i = 0; i < rows; i += 1) {
    const x = w[p * rows + i]!;
    const y = w[q * rows + i]!;
    alpha += x * x;
    beta += y * y;
    gamma += x * y;
  }
  if (alpha <= negligible || beta <= negligible) return null;
  if (Math.abs(gamma) <= ORTHOGONAL * Math.sqrt(alpha * beta)) return null;
  const zeta = (beta - alpha) / (2 * gamma);
  const t = (zeta < 0 ? -1 : 1) / (Math.abs(zeta) + Math.hypot(1, zeta));
  const c = 1 / Math.sqrt(1 + t * t);
  return { c, s: c * t };
}

function rotateRows(
  m: Float64Array,
  length: number,
  { p, q, c, s }: { p: number; q: number; c: number; s: number },
): void {
  for (let i = 0; i < length; i += 1) {
    const x = m[p * length + i]!;
    const y = m[q * length + i]!;
    m[p * length + i] = c * x - s * y;
    m[q * length + i] = s * x + c * y;
  }
}

function sorted(w: Float64Array, v: Float64Array, rows: number, cols: number): SingularValues {
  const norms: number[] = [];
  const order: number[] = [];
  for (let j = 0; j < cols; j += 1) {
    norms.push(rowNorm(w, j * rows, rows));
    order.push(j);
  }
  order.sort((i, j) => norms[j]! - norms[i]!);
  const result = {
    u: new Float64Array(rows * cols),
    sigma: new Float64Array(cols),
    v: new Float64Array(cols * cols),
  };
  order.forEach((from, to) => {
    const norm = norms[from]!;
    result.sigma[to] = norm;
    for (let i = 0; i < rows; i += 1) result.u[i * cols + to] = norm === 0 ? 0 : w[from * rows + i]! / norm;
    for (let i = 0; i < cols; i += 1) result.v[i * cols + to] = v[from * cols + i]!;
  });
  return result;
}

function rowNorm(w: Float64Array, from: number, length: number): number {
  let largest = 0;
  for (let i = from; i < from + length; i += 1) largest = Math.max(largest, Math.abs(w[i]!));
  if (largest === 0) return 0;
  let sum = 0;
  for (let i = from; i < from + length; i += 1) sum += (w[i]! / largest) ** 2;
  return largest * Math.sqrt(sum);
}
