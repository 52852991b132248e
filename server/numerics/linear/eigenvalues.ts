import { balanceMatrix } from '@/server/numerics/linear/balance-matrix';
import { hessenbergForm } from '@/server/numerics/linear/hessenberg-form';

/** QR steps allowed for one eigenvalue; ten is plenty unless the shifts run in a circle (common practice). */
const STEPS_PER_EIGENVALUE = 60;

/** Steps after which one unusual shift breaks a circle. */
const EXCEPTIONAL_EVERY = 11;

/** A complex number. */
export interface Complex {
  re: number;
  im: number;
}

/**
 * Compute all eigenvalues of a real square matrix.
 *
 * Balanced, brought to Hessenberg form, then implicit double-shift QR steps until 1 × 1 and 2 × 2 blocks are left.
 *
 * @param a  n × n, row-major; left as it is.
 * @returns  n eigenvalues, conjugates next to each other with the positive imaginary part first, in no other order; null
 *           when the iteration does not settle or an entry is not finite.
 *
 * Accuracy: exact for a matrix within a small multiple of ulp·‖A‖ (after balancing) of A; a defective eigenvalue of
 *           multiplicity k is therefore spread by (ulp·‖A‖)^(1/k).
 * Cost: about 10 n³ products.
 * Source: J. G. F. Francis, The Computer Journal 4 (1961/62) 265–271 and 332–345 (from memory).
 */
export function eigenvalues(a: Float64Array, n: number): Complex[] | null {
  if (a.length !== n * n) throw new RangeError(`${a.length} entries are not ${n} × ${n}`);
  if (!a.every(Number.isFinite)) return null;
  const h = Float64Array.from(a);
  balanceMatrix(h, n);
  hessenbergForm(h, n);
  const found: Complex[] = [];
  let last = n - 1;
  let steps = 0;
  while (last >= 0) {
    const first = activeStart(h, n, last);
    if (first >= last - 1) {
      found.push(...(first === last ? [{ re: h[last * n + last]!, im: 0 }] : pairOf(h, n, first)));
      last = first - 1;
      steps = 0;
      continue;
    }
    steps += 1;
    if (steps > STEPS_PER_EIGENVALUE) return null;
    francisStep(h, n, { first, last, exceptional: steps % EXCEPTIONAL_EVERY === 0 });
  }
  return found;
}

/** First row of the unreduced block that ends at row `last`; clears the negligible subdiagonal entry above it. */
function activeStart(h: Float64Array, n: number, last: number): number {
  for (let k = last; k > 0; k -= 1) {
    const near = Math.abs(h[k * n + k]!) + Math.abs(h[(k - 1) * n + k - 1]!);
    if (Math.abs(h[k * n + k - 1]!) <= Number.EPSILON * near || h[k * n + k - 1] === 0) {
      h[k * n + k - 1] = 0;
      return k;
    }
  }
  return 0;
}

/** The two eigenvalues of the 2 × 2 block at row k, without cancellation. */
function pairOf(h: Float64Array, n: number, k: number): Complex[] {
  const a = h[k * n + k]!;
  const b = h[k * n + k + 1]!;
  const c = h[(k + 1) * n + k]!;
  const d = h[(k + 1) * n + k + 1]!;
  const half = (a - d) / 2;
  const discriminant = half * half + b * c;
  if (discriminant < 0) {
    const im = Math.sqrt(-discriminant);
    const re = (a + d) / 2;
    return [
      { re, im },
      { re, im: -im },
    ];
  }
  const shift = half + (half < 0 ? -1 : 1) * Math.sqrt(discriminant);
  const far = d + shift;
  const near = shift === 0 ? d : d - (b * c) / shift;
  return [
    { re: far, im: 0 },
    { re: near, im: 0 },
  ];
}

interface ActiveBlock {
  first: number;
  last: number;
  exceptional: boolean;
}

/** One implicit double-shift QR step on rows and columns first … last. */
function francisStep(h: Float64Array, n: number, block: ActiveBlock): void {
  const { first, last } = block;
  let [x, y, z] = firstColumn(h, n, block);
  for (let k = first; k < last; k += 1) {
    const size = k === last - 1 ? 2 : 3;
    const v = size === 3 ? [x, y, z] : [x, y];
    const norm = Math.hypot(...v);
    if (norm !== 0) {
      v[0]! += x < 0 ? -norm : norm;
      const length = v.reduce((sum, entry) => sum + entry * entry, 0);
      applyReflection(h, n, { k, v, beta: 2 / length, block });
      if (k > first) {
        for (let i = 1; i < size; i += 1) h[(k + i) * n + k - 1] = 0;
      }
    }
    x = h[(k + 1) * n + k]!;
    y = k + 2 <= last ? h[(k + 2) * n + k]! : 0;
    z = k + 3 <= last ? h[(k + 3) * n + k]! : 0;
  }
}

/** The first column of (H − σ₁)(H − σ₂), σ the eigenvalues of the trailing 2 × 2 block, up to a factor. */
function firstColumn(h: Float64Array, n: number, { first, last, exceptional }: ActiveBlock): [number, number, number] {
  const at = (i: number, j: number): number => h[i * n + j]!;
  let sum = at(last - 1, last - 1) + at(last, last);
  let product = at(last - 1, last - 1) * at(last, last) - at(last - 1, last) * at(last, last - 1);
  if (exceptional) {
    const size = Math.abs(at(last, last - 1)) + Math.abs(at(last - 1, Math.max(first, last - 2)));
    sum = 1.5 * size;
    product = size * size;
  }
  const a = at(first, first);
  const below = at(first + 1, first);
  return [
    a * a + at(first, first + 1) * below - sum * a + product,
    below * (a + at(first + 1, first + 1) - sum),
    below * at(first + 2, first + 1),
  ];
}

function applyReflection(
  h: Float64Array,
  n: number,
  { k, v, beta, block }: { k: number; v: number[]; beta: number; block: ActiveBlock },
): void {
  const { first, last } = block;
  for (let j = Math.max(first, k - 1); j < n; j += 1) {
    let sum = 0;
    v.forEach((entry, i) => (sum += entry * h[(k + i) * n + j]!));
    v.forEach((entry, i) => (h[(k + i) * n + j]! -= beta * sum * entry));
  }
  for (let i = 0; i <= Math.min(last, k + 3); i += 1) {
    let sum = 0;
    v.forEach((entry, j) => (sum += entry * h[i * n + k + j]!));
    v.forEach((entry, j) => (h[i * n + k + j]! -= beta * sum * entry));
  }
}
