import { triangularise } from '@/server/numerics/linear/triangularise';

/** A = Q·R with Q orthonormal (rows × cols) and R upper triangular (cols × cols), R's diagonal ≥ 0. */
export interface QrFactors {
  q: Float64Array;
  r: Float64Array;
}

/**
 * Factor a tall or square matrix into orthonormal columns and an upper triangle with a diagonal that is not negative.
 *
 * @param a     rows × cols, row-major, rows ≥ cols; left as it is.
 * @returns     Q (rows × cols) and R (cols × cols), newly allocated. Where a has dependent columns, R has a zero on its
 *              diagonal and Q is still orthonormal.
 * @throws {RangeError} when rows < cols or the length does not fit.
 *
 * Accuracy: ‖A − QR‖ and ‖QᵀQ − I‖ within a small multiple of the unit roundoff.
 * Cost: about 4·rows²·cols products.
 * Source: Householder reflections on [A | I], from which Qᵀ is read; signs normalised so that the factorisation is
 *         unique and depends continuously on A.
 */
export function factorQr(a: Float64Array, rows: number, cols: number): QrFactors {
  if (rows < cols || a.length !== rows * cols) {
    throw new RangeError(`cannot factor ${a.length} entries as ${rows} × ${cols}`);
  }
  const width = cols + rows;
  const work = new Float64Array(rows * width);
  for (let i = 0; i < rows; i += 1) {
    for (let j = 0; j < cols; j += 1) work[i * width + j] = a[i * cols + j]!;
    work[i * width + cols + i] = 1;
  }
  triangularise(work, { rows, cols: width, pivots: cols });
  return readFactors(work, rows, cols);
}

function readFactors(work: Float64Array, rows: number, cols: number): QrFactors {
  const width = cols + rows;
  const q = new Float64Array(rows * cols);
  const r = new Float64Array(cols * cols);
  for (let k = 0; k < cols; k += 1) {
    const sign = work[k * width + k]! < 0 ? -1 : 1;
    for (let j = k; j < cols; j += 1) r[k * cols + j] = sign * work[k * width + j]!;
    for (let i = 0; i < rows; i += 1) q[i * cols + k] = sign * work[k * width + cols + i]!;
  }
  return { q, r };
}
