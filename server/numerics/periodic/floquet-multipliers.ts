import { eigenvalues, type Complex } from '@/server/numerics/linear/eigenvalues';
import { factorQr } from '@/server/numerics/linear/factor-qr';
import { identityMatrix } from '@/server/numerics/linear/identity-matrix';
import { multiplyMatrices } from '@/server/numerics/linear/multiply-matrices';
import { orthonormalise } from '@/server/numerics/linear/orthonormalise';

/** Sweeps over the orbit; moduli that differ by a factor 2 are told apart to rounding in 50. */
const MAX_SWEEPS = 60;

/** Two invariant subspaces count as separated when one leaks less than this into the other. */
const SEPARATED = 1e-13;

/** A leak that no further sweep makes smaller. */
const ROUNDING = 4 * Number.EPSILON;

/** Sweeps over which it is judged how fast a leak closes. */
const WINDOW = 8;

/** A multiplier with the logarithm of its modulus, which neither overflows nor vanishes. */
export interface Multiplier {
  /** λ = exp(logModulus)·(re + i im), re² + im² = 1. */
  re: number;
  im: number;
  logModulus: number;
}

/**
 * Compute all eigenvalues of a product of matrices M = P_N … P₁ without forming it.
 *
 * Orthogonal iteration: Z = Pᵢ Q, Z = Q' R, once round the orbit a sweep. After a sweep Q₀ᵀ M Q₀ = B R with B = Q₀ᵀ Q_N
 * and R the product of the triangles. Where B has become block diagonal, the blocks' own products give the multipliers
 * of each block, each to its own relative accuracy; moduli that do not separate stay together in one block.
 *
 * @param pieces  N ≥ 1 matrices n × n, row-major, in order of time, in sizes; each well conditioned (below about 1e8).
 * @param n       dimension.
 * @returns       n multipliers, largest modulus first, conjugates adjacent with positive imaginary part first; null when
 *                the eigenvalues of a block cannot be found or an entry is not finite.
 *
 * Accuracy: relative, about N·ulp·(condition) for each separated multiplier, however large or small.
 * Cost: about 6 N n³ products a sweep.
 * Source: QR sweeps as for Lyapunov exponents (common practice); blocks as in the periodic Schur form of A. W. Bojanczyk,
 *         G. H. Golub, P. Van Dooren, SPIE 1770 (1992) 31–42 (from memory), which this does not compute.
 */
export function floquetMultipliers(pieces: readonly Float64Array[], n: number): Multiplier[] | null {
  if (n === 0) return [];
  const last = sweepUntilSeparated(pieces, startingBasis(n), n);
  const found = last === null ? null : multipliersOf(last, n);
  return found === null ? null : found.sort((a, b) => b.logModulus - a.logModulus);
}

/** Sweep until all multipliers are separated that rounding lets, or that the sweeps left can still separate. */
function sweepUntilSeparated(pieces: readonly Float64Array[], start: Float64Array, n: number): Sweep | null {
  let best: Sweep | null = null;
  const history: number[][] = [];
  while (history.length < MAX_SWEEPS) {
    best = sweepOnce(pieces, best?.basis ?? start, n);
    if (best === null) return null;
    history.push(leaksOf(best.b, n));
    if (history.at(-1)!.every((_, cut) => isDone(history, cut))) break;
  }
  return best;
}

/** Whether a cut leaks no more than rounding, or leaks so steadily that it will not be closed. */
function isDone(history: readonly number[][], cut: number): boolean {
  const leak = history.at(-1)![cut]!;
  const before = history.at(-2)?.[cut] ?? Infinity;
  if (leak <= ROUNDING || (leak <= SEPARATED && leak > before / 2)) return true;
  const earlier = history.at(-1 - WINDOW)?.[cut];
  if (earlier === undefined) return false;
  return leak * (leak / earlier) ** ((MAX_SWEEPS - history.length) / WINDOW) > SEPARATED;
}

interface Sweep {
  basis: Float64Array;
  b: Float64Array;
  triangles: Float64Array[];
}

/** A full orthogonal basis without any relation to the axes, the same in every run. */
function startingBasis(n: number): Float64Array {
  const a = Float64Array.from({ length: n * n }, (_, k) => Math.sin(1 + 7.3 * k + 0.37 * k * k));
  for (let i = 0; i < n; i += 1) a[i * n + i]! += 0.5;
  return factorQr(a, n, n).q;
}

function sweepOnce(pieces: readonly Float64Array[], start: Float64Array, n: number): Sweep | null {
  let basis = start;
  const triangles: Float64Array[] = [];
  for (const piece of pieces) {
    const z = multiplyMatrices(piece, basis, n, n);
    const r = new Float64Array(n * n);
    orthonormalise(z, r, n);
    triangles.push(r);
    basis = z;
  }
  // What is not finite in one piece is so in the last basis.
  for (const entry of basis) if (!Number.isFinite(entry)) return null;
  const b = new Float64Array(n * n);
  for (let k = 0; k < n; k += 1) {
    for (let i = 0; i < n; i += 1) {
      const factor = start[k * n + i]!;
      for (let j = 0; j < n; j += 1) b[i * n + j]! += factor * basis[k * n + j]!;
    }
  }
  return { basis, b, triangles };
}

/** For j = 1 … n − 1: the largest entry of B that leads between columns below j and columns from j on. */
function leaksOf(b: Float64Array, n: number): number[] {
  const leaks: number[] = [];
  for (let j = 1; j < n; j += 1) {
    let leak = 0;
    for (let i = j; i < n; i += 1) {
      for (let k = 0; k < j; k += 1) leak = Math.max(leak, Math.abs(b[i * n + k]!), Math.abs(b[k * n + i]!));
    }
    leaks.push(leak);
  }
  return leaks;
}

function multipliersOf({ b, triangles }: Sweep, n: number): Multiplier[] | null {
  const cuts = leaksOf(b, n).flatMap((leak, index) => (leak <= SEPARATED ? [index + 1] : []));
  const edges = [0, ...cuts, n];
  const all: Multiplier[] = [];
  for (let e = 0; e + 1 < edges.length; e += 1) {
    const from = edges[e]!;
    const size = edges[e + 1]! - from;
    const values = blockMultipliers({ b, triangles }, n, { from, size });
    if (values === null) return null;
    all.push(...values);
  }
  return all;
}

/** Eigenvalues of B_bb · Π R_bb, the product rescaled as it grows. */
function blockMultipliers(
  { b, triangles }: Pick<Sweep, 'b' | 'triangles'>,
  n: number,
  { from, size }: { from: number; size: number },
): Multiplier[] | null {
  const block = (a: Float64Array): Float64Array =>
    Float64Array.from({ length: size * size }, (_, k) => a[(from + Math.floor(k / size)) * n + from + (k % size)]!);
  let product: Float64Array = identityMatrix(size);
  let log = 0;
  for (const triangle of triangles) {
    product = multiplyMatrices(block(triangle), product, size, size);
    const largest = product.reduce((norm, entry) => Math.max(norm, Math.abs(entry)), 0);
    if (largest === 0) return null;
    product = product.map((entry) => entry / largest);
    log += Math.log(largest);
  }
  const values = eigenvalues(multiplyMatrices(block(b), product, size, size), size);
  return values === null ? null : values.map((value) => multiplierOf(value, log));
}

function multiplierOf({ re, im }: Complex, log: number): Multiplier {
  const modulus = Math.hypot(re, im);
  if (modulus === 0) return { re: 1, im: 0, logModulus: -Infinity };
  return { re: re / modulus, im: im / modulus, logModulus: log + Math.log(modulus) };
}
