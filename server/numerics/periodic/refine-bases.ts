import { factorQr } from '@/server/numerics/linear/factor-qr';
import { leastNormSolve } from '@/server/numerics/linear/least-norm-solve';
import { multiplyMatrices } from '@/server/numerics/linear/multiply-matrices';
import { orthonormalise } from '@/server/numerics/linear/orthonormalise';
import { solveTriangular } from '@/server/numerics/linear/solve-triangular';
import { condenseSegments, type LinearSegment } from '@/server/numerics/periodic/condense-segments';

/** Corrections of a subspace; each squares what it is off by. */
const MAX_CORRECTIONS = 4;

/** A correction below this leaves its square, which is rounding. */
const SMALL_CORRECTION = 1e-7;

/** A correction above this means that the bases are not near an invariant subspace. */
const LARGEST_CORRECTION = 0.1;

/** Entries that a correction may have: its elimination costs their cube for every segment. */
const MOST_ENTRIES = 64;

/** Singular values below this share of the largest are zero: a multiplier outside the subspace equals one inside. */
const CUT_OFF = 1e-13;

/**
 * Improve the bases of an invariant subspace along a chain of matrices that closes on itself.
 *
 * In the orthogonal frame [Wᵢ Vᵢ] at each node, Mᵢ is [A C; E N]; Wᵢ + Vᵢ Xᵢ is invariant when
 * Xᵢ₊₁ A = E + N Xᵢ to first order, a linear chain in the entries of X that is eliminated as a chain of segments is.
 *
 * @param matrices  n × n, row-major, in order of time.
 * @param bases     orthonormal basis at the start of each, n × u.
 * @param n         dimension.
 * @returns         better bases; the ones given where u (n − u) is 0 or above 64, or they are no invariant subspace.
 *
 * Accuracy: rounding of the single matrices, times how well the subspace's multipliers are separated from the others.
 * Cost: about 20 (u (n − u))³ products a matrix and correction.
 * Source: Newton's rule for invariant subspaces, G. W. Stewart, SIAM Review 15 (1973) 727–764 (from memory), cut into segments.
 */
export function refineBases(
  matrices: readonly Float64Array[],
  bases: readonly Float64Array[],
  n: number,
): readonly Float64Array[] {
  const u = bases[0]!.length / n;
  const entries = u * (n - u);
  if (entries === 0 || entries > MOST_ENTRIES) return bases;
  let present = bases;
  for (let step = 0; step < MAX_CORRECTIONS; step += 1) {
    const frames = present.map((basis) => frameOf(basis, n, u));
    const changes = correctionOf(matrices, frames, { n, u });
    const size = changes.reduce((largest, x) => x.reduce((a, entry) => Math.max(a, Math.abs(entry)), largest), 0);
    if (!(size <= LARGEST_CORRECTION)) return bases;
    present = frames.map((frame, i) => moved(frame, changes[i]!, { n, u }));
    if (size <= SMALL_CORRECTION) break;
  }
  return present;
}

interface Shape {
  n: number;
  u: number;
}

/** The basis completed to an orthogonal frame. */
function frameOf(basis: Float64Array, n: number, u: number): Float64Array {
  const frame = Float64Array.from({ length: n * n }, (_, k) =>
    k % n < u ? basis[Math.floor(k / n) * u + (k % n)]! : 0,
  );
  orthonormalise(frame, new Float64Array(n * n), n);
  return frame;
}

/** Xᵢ, (n − u) × u, at every node. */
function correctionOf(
  matrices: readonly Float64Array[],
  frames: readonly Float64Array[],
  shape: Shape,
): Float64Array[] {
  const count = matrices.length;
  const chain = condenseSegments(
    matrices.map((m, i) => linearised(m, { from: frames[i]!, to: frames[(i + 1) % count]! }, shape)),
  );
  const { p, q, r } = chain.relation;
  const size = r.length;
  const a = p.map((entry, k) => entry + q[k]!);
  const { x } = leastNormSolve({ a, rows: size, cols: size, b: r, cutOff: CUT_OFF });
  return chain.recover(x, x, 0);
}

/** Xᵢ₊₁ = N Xᵢ A⁻¹ + E A⁻¹ in the entries of X, row by row. */
function linearised(
  m: Float64Array,
  { from, to }: { from: Float64Array; to: Float64Array },
  { n, u }: Shape,
): LinearSegment {
  const rest = n - u;
  const b = multiplyMatrices(transpose(to, n), multiplyMatrices(m, from, n, n), n, n);
  const block = (row: number, col: number, rows: number, cols: number): Float64Array =>
    Float64Array.from({ length: rows * cols }, (_, k) => b[(row + Math.floor(k / cols)) * n + col + (k % cols)]!);
  const inverse = inverseOf(block(0, 0, u, u), u);
  const size = rest * u;
  const l = new Float64Array(size * size);
  for (let i = 0; i < size; i += 1) {
    for (let j = 0; j < size; j += 1) {
      const across = b[(u + Math.floor(i / u)) * n + u + Math.floor(j / u)]!;
      l[i * size + j] = across * inverse[(j % u) * u + (i % u)]!;
    }
  }
  return { m: l, v: new Float64Array(size), defect: multiplyMatrices(block(u, 0, rest, u), inverse, rest, u) };
}

function inverseOf(a: Float64Array, size: number): Float64Array {
  const { q, r } = factorQr(a, size, size);
  const inverse = new Float64Array(size * size);
  for (let col = 0; col < size; col += 1) {
    const x = solveTriangular(r, q.slice(col * size, (col + 1) * size));
    for (let row = 0; row < size; row += 1) inverse[row * size + col] = x[row]!;
  }
  return inverse;
}

/** Orthonormal basis of W + V X. */
function moved(frame: Float64Array, x: Float64Array, { n, u }: Shape): Float64Array {
  const sum = Float64Array.from({ length: n * u }, (_, k) => {
    const [row, col] = [Math.floor(k / u), k % u];
    let entry = frame[row * n + col]!;
    for (let j = 0; j < n - u; j += 1) entry += frame[row * n + u + j]! * x[j * u + col]!;
    return entry;
  });
  return factorQr(sum, n, u).q;
}

function transpose(a: Float64Array, n: number): Float64Array {
  return Float64Array.from({ length: n * n }, (_, k) => a[(k % n) * n + Math.floor(k / n)]!);
}
