import { factorQr } from '@/server/numerics/linear/factor-qr';
import { multiplyMatrices } from '@/server/numerics/linear/multiply-matrices';
import { singularValues } from '@/server/numerics/linear/singular-values';
import { type EndRelation } from '@/server/numerics/periodic/condense-segments';

/** The invariant subspace of the multipliers that equal 1. */
export interface UnitSpace {
  /** Its dimension, the algebraic multiplicity of 1: 0 … n. */
  size: number;
  /** Orthonormal basis, n × size, row-major. */
  basis: Float64Array;
}

/**
 * Find the multipliers that equal 1, with their algebraic multiplicity, by ranks and not by eigenvalues.
 *
 * ker (M − I) ⊂ ker (M − I)² ⊂ … is built step by step: with P ξ + Q η = 0 meaning η = M ξ,
 * (M − I) w = v is (P + Q) w = −Q v, so the next kernel is that of [P + Q | Q V], V a basis of the last one.
 *
 * @param relation  the chain's relation between its ends, rows [P Q] orthonormal.
 * @param cutOff    singular values at or below this count as zero; the rows have length 1, so it is a pure number.
 *
 * Accuracy: a multiplier nearer to 1 than about cutOff·(size of M) counts as 1.
 * Cost: at most n singular value decompositions of n × 2n.
 * Source: the staircase of V. N. Kublanovskaya (1966) and G. H. Golub, J. H. Wilkinson, SIAM Review 18 (1976) 578–619
 *         (from memory), applied to the pencil P + λ Q instead of M.
 */
export function unitSpace({ p, q }: Pick<EndRelation, 'p' | 'q'>, cutOff: number): UnitSpace {
  const n = Math.sqrt(p.length);
  const sum = p.map((entry, k) => entry + q[k]!);
  let basis = new Float64Array(0);
  let size = 0;
  for (let level = 0; level < n; level += 1) {
    const next = nextKernel({ sum, image: multiplyMatrices(q, basis, n, n), n, size, cutOff });
    const grown = next.length / n;
    if (grown <= size) break;
    basis = next;
    size = grown;
  }
  return { size, basis };
}

/** Orthonormal basis (n × d, row-major) of the w with (P + Q) w in the span of the image's columns. */
function nextKernel({
  sum,
  image,
  n,
  size,
  cutOff,
}: {
  sum: Float64Array;
  image: Float64Array;
  n: number;
  size: number;
  cutOff: number;
}): Float64Array<ArrayBuffer> {
  const cols = n + size;
  const a = new Float64Array(n * cols);
  for (let i = 0; i < n; i += 1) {
    for (let j = 0; j < n; j += 1) a[i * cols + j] = sum[i * n + j]!;
    for (let j = 0; j < size; j += 1) a[i * cols + n + j] = image[i * size + j]!;
  }
  const { sigma, v } = singularValues(a, n, cols);
  const rank = sigma.filter((value) => value > cutOff).length;
  const d = Math.min(n, cols - rank);
  const heads = Float64Array.from({ length: n * d }, (_, k) => v[Math.floor(k / d) * cols + cols - d + (k % d)]!);
  return d === 0 ? new Float64Array(0) : Float64Array.from(factorQr(heads, n, d).q);
}
