import { factorQr } from '@/server/numerics/linear/factor-qr';
import { leastNormSolve } from '@/server/numerics/linear/least-norm-solve';
import { multiplyMatrices } from '@/server/numerics/linear/multiply-matrices';
import { condenseSegments } from '@/server/numerics/periodic/condense-segments';
import { type UnitSpace } from '@/server/numerics/periodic/unit-space';

/** Singular values below this share of the largest are zero: the unit space has none. */
const CUT_OFF = 1e-12;

/**
 * Carry the subspace of the multipliers that equal 1 to the start of every segment of an orbit.
 *
 * The vectors at the inner nodes solve the whole chain with their values at its two ends given, so that neither growth nor
 * decay along the orbit spoils them: with W the basis at the first node, M W = W J, and J from Q W J = −P W.
 *
 * @param matrices  derivative of each segment, n × n, in order of time, in sizes.
 * @param space     the subspace at the start of the first, of size ≥ 1.
 * @returns         an orthonormal basis at the start of each segment, n × size, row-major.
 *
 * Accuracy: that of the basis, times the condition of the chain of segments, not of their product.
 * Cost: one elimination of the chain, about 20 n³ products a segment.
 * Source: the boundary value problem that multiple shooting solves, without right-hand side (our own use of it).
 */
export function unitBases(matrices: readonly Float64Array[], { basis, size }: UnitSpace): Float64Array[] {
  const n = basis.length / size;
  const zero = new Float64Array(n);
  const chain = condenseSegments(matrices.map((m) => ({ m, v: zero, defect: zero })));
  const ends = carriedEnds(chain.relation, basis, size);
  const columns = Array.from({ length: size }, (_, j) =>
    chain.recover(columnOf(basis, n, { size, j }), columnOf(ends, n, { size, j }), 0),
  );
  return matrices.map((_, node) => {
    if (node === 0) return basis;
    const vectors = Float64Array.from({ length: n * size }, (_entry, k) => {
      return columns[k % size]![node]![Math.floor(k / size)]!;
    });
    return factorQr(vectors, n, size).q;
  });
}

/** M W, which is W J. */
function carriedEnds({ p, q }: { p: Float64Array; q: Float64Array }, basis: Float64Array, size: number): Float64Array {
  const n = basis.length / size;
  const a = multiplyMatrices(q, basis, n, n);
  const right = multiplyMatrices(p, basis, n, n);
  const j = new Float64Array(size * size);
  for (let col = 0; col < size; col += 1) {
    const b = columnOf(right, n, { size, j: col }).map((entry) => -entry);
    const { x } = leastNormSolve({ a, rows: n, cols: size, b, cutOff: CUT_OFF });
    for (let row = 0; row < size; row += 1) j[row * size + col] = x[row]!;
  }
  return multiplyMatrices(basis, j, n, size);
}

function columnOf(a: Float64Array, n: number, { size, j }: { size: number; j: number }): Float64Array {
  return Float64Array.from({ length: n }, (_, i) => a[i * size + j]!);
}
