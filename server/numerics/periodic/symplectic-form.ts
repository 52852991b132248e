import { singularValues } from '@/server/numerics/linear/singular-values';
import { triangularise } from '@/server/numerics/linear/triangularise';

/** Singular values at or below this share of the largest are zero. */
const CUT_OFF = 1e-10;

/** A form whose smallest singular value is below this share of its largest is degenerate. */
const DEGENERATE = 1e-6;

/**
 * Tell whether linear flows x' = Aₖ x have a constant symplectic form in common: Ω antisymmetric, not degenerate, with
 * Ω Aₖ symmetric for every k. A Hamiltonian field has one at all its points; its monodromy matrices then have multipliers in
 * reciprocal pairs.
 *
 * Ω A − (Ω A)ᵀ = 0 is linear in the n (n − 1)/2 entries of Ω; one scattered member of its solutions is tested.
 *
 * @param jacobians  n × n, row-major, at points of one orbit.
 * @param n          dimension.
 * @returns          false for an odd dimension, and where no form is found.
 *
 * Accuracy: heuristic: a few points stand for all. A form that depends on the point is not looked for.
 * Cost: elimination of (number of points)·e rows of length e = n (n − 1)/2, and a singular value decomposition of e × e.
 * Source: the definition of an infinitesimally symplectic matrix (common practice); the search for Ω is ours.
 */
export function hasSymplecticForm(jacobians: readonly Float64Array[], n: number): boolean {
  if (n % 2 !== 0 || jacobians.length === 0) return false;
  const pairs = pairsOf(n);
  const e = pairs.length;
  const rows = Math.max(e, jacobians.length * e);
  const work = new Float64Array(rows * e);
  jacobians.forEach((a, k) => writeConditions(work, a, { from: k * e, pairs, n }));
  triangularise(work, { rows, cols: e, pivots: e });
  const { sigma, v } = singularValues(work.slice(0, e * e), e, e);
  const limit = CUT_OFF * sigma[0]!;
  const form = new Float64Array(n * n);
  for (let j = 0; j < e; j += 1) {
    if (sigma[j]! > limit) continue;
    const weight = Math.sin(1 + 2.3 * j);
    pairs.forEach(([p, q], at) => {
      form[p * n + q]! += weight * v[at * e + j]!;
      form[q * n + p]! -= weight * v[at * e + j]!;
    });
  }
  const { sigma: own } = singularValues(form, n, n);
  return own[n - 1]! > DEGENERATE * own[0]!;
}

function pairsOf(n: number): [number, number][] {
  const pairs: [number, number][] = [];
  for (let p = 0; p < n; p += 1) for (let q = p + 1; q < n; q += 1) pairs.push([p, q]);
  return pairs;
}

/** Entry (i, j), i < j, of Ω A + Aᵀ Ω, one row each, in the entries Ω(p, q), p < q. */
function writeConditions(
  work: Float64Array,
  a: Float64Array,
  { from, pairs, n }: { from: number; pairs: readonly [number, number][]; n: number },
): void {
  const e = pairs.length;
  const norm = a.reduce((largest, entry) => Math.max(largest, Math.abs(entry)), 0) || 1;
  pairs.forEach(([i, j], row) => {
    pairs.forEach(([p, q], col) => {
      let entry = 0;
      if (i === p) entry += a[q * n + j]!;
      if (i === q) entry -= a[p * n + j]!;
      if (j === q) entry += a[p * n + i]!;
      if (j === p) entry -= a[q * n + i]!;
      work[(from + row) * e + col] = entry / norm;
    });
  });
}
