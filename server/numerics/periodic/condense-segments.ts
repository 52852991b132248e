import { factorQr } from '@/server/numerics/linear/factor-qr';
import { solveTriangular } from '@/server/numerics/linear/solve-triangular';
import { triangularise } from '@/server/numerics/linear/triangularise';

/** One linearised segment: ξ(end) = M ξ(start) + v θ + d, in sizes. */
export interface LinearSegment {
  /** n × n, row-major. */
  m: Float64Array;
  /** Change of the end when the whole period grows by θ times itself. */
  v: Float64Array;
  /** End of the segment minus start of the next. */
  defect: Float64Array;
}

/** P ξ₁ + Q ξ(end) + c θ = r with orthonormal rows [P Q]: what a chain of segments says about its two ends. */
export interface EndRelation {
  p: Float64Array;
  q: Float64Array;
  c: Float64Array;
  r: Float64Array;
}

/** A chain of segments without its inner nodes. */
export interface CondensedChain {
  relation: EndRelation;
  /** Corrections of all nodes ξ₁ … ξ_K from those of the first node and of the period. */
  recover(first: Float64Array, last: Float64Array, theta: number): Float64Array[];
}

/**
 * Eliminate the inner nodes of a chain of segments by orthogonal transformations.
 *
 * The relation between the first and the last node is kept as n orthonormal rows [P Q], never as the product
 * M = −Q⁻¹ P: growth and decay of any size then show as entries near 1 and near 0, and nothing overflows or drowns.
 *
 * @param segments  K ≥ 1 linearised segments of dimension n.
 *
 * Accuracy: backward stable; independent of the norm of the product of the segments.
 * Cost: about 20 n³ products a segment.
 * Source: structured orthogonal elimination, S. J. Wright, SIAM J. Sci. Stat. Comput. 13 (1992) 742–764 (from memory);
 *         here in sequence, since chains are short.
 */
export function condenseSegments(segments: readonly LinearSegment[]): CondensedChain {
  const n = segments[0]!.v.length;
  let relation = orthonormalRows(relationOf(segments[0]!, n), n);
  const eliminated: Float64Array[] = [];
  for (const segment of segments.slice(1)) {
    const { kept, next } = eliminate(relation, segment, n);
    eliminated.push(kept);
    relation = orthonormalRows(next, n);
  }
  return {
    relation,
    recover(first, last, theta) {
      const nodes: Float64Array[] = [];
      let following = last;
      for (let j = eliminated.length - 1; j >= 0; j -= 1) {
        following = backSubstitute(eliminated[j]!, n, { first, following, theta });
        nodes.unshift(following);
      }
      return [first, ...nodes];
    },
  };
}

/** −M ξ₁ + ξ₂ − v θ = d. */
function relationOf({ m, v, defect }: LinearSegment, n: number): EndRelation {
  const q = new Float64Array(n * n);
  for (let i = 0; i < n; i += 1) q[i * n + i] = 1;
  return { p: m.map((entry) => -entry), q, c: v.map((entry) => -entry), r: Float64Array.from(defect) };
}

/** Columns of the work array: ξ (to be eliminated), ξ₁, next ξ, θ, right-hand side. */
function eliminate(
  { p, q, c, r }: EndRelation,
  { m, v, defect }: LinearSegment,
  n: number,
): { kept: Float64Array; next: EndRelation } {
  const width = 3 * n + 2;
  const work = new Float64Array(2 * n * width);
  for (let i = 0; i < n; i += 1) {
    const upper = i * width;
    const lower = (n + i) * width;
    for (let j = 0; j < n; j += 1) {
      work[upper + j] = q[i * n + j]!;
      work[upper + n + j] = p[i * n + j]!;
      work[lower + j] = -m[i * n + j]!;
    }
    work[lower + 2 * n + i] = 1;
    work[upper + 3 * n] = c[i]!;
    work[lower + 3 * n] = -v[i]!;
    work[upper + 3 * n + 1] = r[i]!;
    work[lower + 3 * n + 1] = defect[i]!;
  }
  triangularise(work, { rows: 2 * n, cols: width, pivots: n });
  const block = (from: number): Float64Array =>
    Float64Array.from({ length: n * n }, (_, k) => work[(n + Math.floor(k / n)) * width + from + (k % n)]!);
  const column = (at: number): Float64Array => Float64Array.from({ length: n }, (_, i) => work[(n + i) * width + at]!);
  return {
    kept: work.slice(0, n * width),
    next: { p: block(n), q: block(2 * n), c: column(3 * n), r: column(3 * n + 1) },
  };
}

/** Multiply the relation from the left so that [P Q] has orthonormal rows. */
function orthonormalRows({ p, q, c, r }: EndRelation, n: number): EndRelation {
  const columns = Float64Array.from({ length: 2 * n * n }, (_, k) => {
    const row = Math.floor(k / n);
    return row < n ? p[(k % n) * n + row]! : q[(k % n) * n + row - n]!;
  });
  const factors = factorQr(columns, 2 * n, n);
  const part = (from: number): Float64Array =>
    Float64Array.from({ length: n * n }, (_, k) => factors.q[(from + (k % n)) * n + Math.floor(k / n)]!);
  return { p: part(0), q: part(n), c: solveTriangular(factors.r, c, true), r: solveTriangular(factors.r, r, true) };
}

function backSubstitute(
  kept: Float64Array,
  n: number,
  known: { first: Float64Array; following: Float64Array; theta: number },
): Float64Array {
  const width = 3 * n + 2;
  const triangle = new Float64Array(n * n);
  const right = new Float64Array(n);
  for (let i = 0; i < n; i += 1) {
    const row = i * width;
    let sum = kept[row + 3 * n + 1]! - kept[row + 3 * n]! * known.theta;
    for (let j = 0; j < n; j += 1) {
      triangle[i * n + j] = kept[row + j]!;
      sum -= kept[row + n + j]! * known.first[j]! + kept[row + 2 * n + j]! * known.following[j]!;
    }
    right[i] = sum;
  }
  return solveTriangular(triangle, right);
}
