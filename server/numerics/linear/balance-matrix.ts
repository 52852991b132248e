/** A scaling that gains less than this share of the norms is not worth making (common practice). */
const WORTHWHILE = 0.95;

/** Passes over the matrix; a handful always suffices for powers of two within the range of doubles. */
const MAX_PASSES = 100;

/**
 * Balance a square matrix in place: scale by D⁻¹ A D, D a diagonal of powers of 2, until rows and columns have norms
 * of like size. Eigenvalues stay exactly the same, their computed values become better.
 *
 * @param a  n × n, row-major; overwritten.
 *
 * Accuracy: exact, only exponents change.
 * Cost: a few times 2n² additions.
 * Source: B. N. Parlett, C. Reinsch, Numerische Mathematik 13 (1969) 293–304 (from memory); no permutations.
 */
export function balanceMatrix(a: Float64Array, n: number): void {
  for (let pass = 0; pass < MAX_PASSES; pass += 1) {
    let changed = false;
    for (let i = 0; i < n; i += 1) if (balanceIndex(a, n, i)) changed = true;
    if (!changed) return;
  }
}

function balanceIndex(a: Float64Array, n: number, i: number): boolean {
  let column = 0;
  let row = 0;
  for (let j = 0; j < n; j += 1) {
    if (j === i) continue;
    column += Math.abs(a[j * n + i]!);
    row += Math.abs(a[i * n + j]!);
  }
  if (column === 0 || row === 0) return false;
  const factor = 2 ** Math.round(Math.log2(row / column) / 2);
  if (factor === 1 || column * factor + row / factor > WORTHWHILE * (column + row)) return false;
  for (let j = 0; j < n; j += 1) a[j * n + i]! *= factor;
  for (let j = 0; j < n; j += 1) a[i * n + j]! /= factor;
  return true;
}
