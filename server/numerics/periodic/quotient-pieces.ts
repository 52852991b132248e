import { multiplyMatrices } from '@/server/numerics/linear/multiply-matrices';
import { orthonormalise } from '@/server/numerics/linear/orthonormalise';

/** A segment of an orbit with an invariant subspace at its start. */
export interface FramedSegment {
  /** Derivatives of its pieces in order of time, n × n, in sizes. */
  pieces: readonly Float64Array[];
  /** Orthonormal basis of the subspace at the segment's start, n × u, row-major. */
  basis: Float64Array;
}

/**
 * Take an invariant subspace out of a product of matrices: what the pieces do to the rest of the space.
 *
 * Each piece acts on an orthonormal frame whose first u columns span the subspace; the trailing block of its triangle is the
 * quotient. At every segment's start the first columns are put back on the subspace as it is known there, so that what
 * they pick up of a growing direction does not add up.
 *
 * @param segments  in order of time; the subspace at the end of the last is that at the start of the first.
 * @param n         dimension.
 * @returns         square matrices of dimension n − u, in order of time, whose product has the multipliers of the whole
 *                  without those of the subspace.
 *
 * Accuracy: as good as the bases; defective multipliers that are taken out no longer spoil those near them.
 * Cost: about 6 n³ products a piece.
 * Source: deflation of an invariant subspace (common practice).
 */
export function quotientPieces(segments: readonly FramedSegment[], n: number): Float64Array[] {
  const u = segments[0]!.basis.length / n;
  const quotient: Float64Array[] = [];
  const start = frame(segments[0]!.basis, null, n);
  let present = start;
  const push = (next: Float64Array): void => {
    const r = new Float64Array(n * n);
    orthonormalise(next, r, n);
    quotient.push(trailingBlock(r, n, u));
    present = next;
  };
  segments.forEach(({ pieces, basis }, index) => {
    if (index > 0) push(frame(basis, present, n));
    for (const piece of pieces) push(multiplyMatrices(piece, present, n, n));
  });
  quotient.push(changeOfFrame(start, present, n, u));
  return quotient;
}

/** The basis followed by the trailing columns of the present frame, or by columns that complete it. */
function frame(basis: Float64Array, present: Float64Array | null, n: number): Float64Array {
  const u = basis.length / n;
  const columns = Float64Array.from({ length: n * n }, (_, k) => {
    const [i, j] = [Math.floor(k / n), k % n];
    if (j < u) return basis[i * u + j]!;
    return present === null ? 0 : present[i * n + j]!;
  });
  if (present === null) orthonormalise(columns, new Float64Array(n * n), n);
  return columns;
}

function trailingBlock(r: Float64Array, n: number, u: number): Float64Array {
  const size = n - u;
  return Float64Array.from({ length: size * size }, (_, k) => r[(u + Math.floor(k / size)) * n + u + (k % size)]!);
}

/** Trailing columns of the last frame in those of the first. */
function changeOfFrame(first: Float64Array, last: Float64Array, n: number, u: number): Float64Array {
  const size = n - u;
  return Float64Array.from({ length: size * size }, (_, k) => {
    const [i, j] = [u + Math.floor(k / size), u + (k % size)];
    let product = 0;
    for (let l = 0; l < n; l += 1) product += first[l * n + i]! * last[l * n + j]!;
    return product;
  });
}
