/** A column whose remainder is below this share of its length depends on the earlier ones, as far as doubles can tell. */
const DEPENDENT = 1e-15;

/**
 * Factor a square matrix in place into orthonormal columns and an upper triangle with a diagonal that is not negative.
 *
 * Gram–Schmidt, each column projected twice. A column that depends on the earlier ones gets a zero on the diagonal of R and
 * is replaced by a unit vector orthogonal to them.
 *
 * @param z  n × n, row-major; overwritten with Q.
 * @param r  n × n, row-major; overwritten with R, z = Q·R.
 *
 * Accuracy: ‖QᵀQ − I‖ within a small multiple of the unit roundoff.
 * Cost: about 4 n³ products, no allocation.
 * Source: twice is enough, L. Giraud, J. Langou, M. Rozložník, Computers & Mathematics with Applications 50 (2005)
 *         1069–1075 (from memory).
 */
export function orthonormalise(z: Float64Array, r: Float64Array, n: number): void {
  r.fill(0);
  for (let j = 0; j < n; j += 1) {
    const before = columnLength(z, n, j);
    project(z, r, { n, j });
    project(z, r, { n, j });
    const after = columnLength(z, n, j);
    if (after > DEPENDENT * before) {
      r[j * n + j] = after;
      for (let i = 0; i < n; i += 1) z[i * n + j]! /= after;
    } else complete(z, n, j);
  }
}

/** Take the parts along the earlier columns off column j and add them to R. */
function project(z: Float64Array, r: Float64Array | null, { n, j }: { n: number; j: number }): void {
  for (let k = 0; k < j; k += 1) {
    let part = 0;
    for (let i = 0; i < n; i += 1) part += z[i * n + k]! * z[i * n + j]!;
    for (let i = 0; i < n; i += 1) z[i * n + j]! -= part * z[i * n + k]!;
    if (r !== null) r[k * n + j]! += part;
  }
}

function columnLength(z: Float64Array, n: number, j: number): number {
  let largest = 0;
  for (let i = 0; i < n; i += 1) largest = Math.max(largest, Math.abs(z[i * n + j]!));
  if (largest === 0) return 0;
  let sum = 0;
  for (let i = 0; i < n; i += 1) {
    const share = z[i * n + j]! / largest;
    sum += share * share;
  }
  return largest * Math.sqrt(sum);
}

/** Replace column j by a unit vector orthogonal to the earlier ones: the rest of the axis that has most of it left. */
function complete(z: Float64Array, n: number, j: number): void {
  let axis = 0;
  let least = Infinity;
  for (let i = 0; i < n; i += 1) {
    let covered = 0;
    for (let k = 0; k < j; k += 1) covered += z[i * n + k]! ** 2;
    if (covered < least) {
      least = covered;
      axis = i;
    }
  }
  for (let i = 0; i < n; i += 1) z[i * n + j] = i === axis ? 1 : 0;
  project(z, null, { n, j });
  project(z, null, { n, j });
  const length = columnLength(z, n, j);
  for (let i = 0; i < n; i += 1) z[i * n + j]! /= length;
}
