/** Halvings after which roots that still stand together are one tangency: 2⁻²⁶ of a step. */
const MAX_DEPTH = 26;

/** Interior Bernstein coefficients below this share of the largest coefficient have no sign: rounding noise. */
const ZERO_BAND = 4e-16;

/** Where an interval may be cut; the first whose value is not noise is taken. */
const CUTS = [0.5, 0.46875, 0.5625, 0.40625, 0.65625];

/** An interval of (0, 1) that holds one root, or roots too close to be told apart. */
export interface RootInterval {
  low: number;
  high: number;
  /** Sign of the polynomial just before and just after the interval's roots. */
  before: 1 | -1;
  after: 1 | -1;
  /** Whether more than one root may be inside. */
  tangent: boolean;
}

/**
 * Isolate the roots of a polynomial inside the open interval (0, 1).
 *
 * Three tests, the cheap ones first: |c₀| > Σ |cₖ| means none; |c₁| > Σ k |cₖ| means monotone, so the end signs decide;
 * else the sign changes of the Bernstein coefficients bᵢ = Σₖ C(i,k)/C(d,k) cₖ are counted (0: none, 1: exactly one) and
 * the interval is cut by de Casteljau's scheme until all are counted or 26 cuts deep.
 *
 * @param c  coefficients c₀ … c_d in the variable of the unit interval, d ≥ 0.
 * @returns  disjoint intervals in ascending order. A root exactly at 0 or 1 is not among them; signs there are those just
 *           inside. A polynomial that is all zero has none.
 *
 * Accuracy: the number of roots is right unless some are within about 1e-8 of a double root, which is then `tangent` or,
 *           where the polynomial only touches zero, absent.
 * Cost: 2d additions for most steps of an orbit; d² for each cut.
 * Source: G. E. Collins, A. G. Akritas (1976) and J. M. Lane, R. F. Riesenfeld, BIT 21 (1981) 112–117 (from memory); for
 *         Taylor steps F. Biscani, D. Izzo, MNRAS 513 (2022) 4833–4844.
 */
export function isolateRoots(c: Float64Array): RootInterval[] {
  let rest = 0;
  let slopes = 0;
  for (let k = 1; k < c.length; k += 1) {
    rest += Math.abs(c[k]!);
    if (k > 1) slopes += k * Math.abs(c[k]!);
  }
  if (Math.abs(c[0]!) > rest || (c[0] === 0 && rest === 0)) return [];
  if (c.length > 1 && Math.abs(c[1]!) > slopes) return monotoneRoot(c);
  let largest = 0;
  for (let k = 0; k < c.length; k += 1) largest = Math.max(largest, Math.abs(c[k]!));
  const found: RootInterval[] = [];
  descend({ b: bernsteinCoefficients(c), low: 0, high: 1, depth: 0 }, ZERO_BAND * largest, found);
  return found;
}

function monotoneRoot(c: Float64Array): RootInterval[] {
  const start = c[0]!;
  let end = 0;
  for (let k = c.length - 1; k >= 0; k -= 1) end += c[k]!;
  if (!((start < 0 && end > 0) || (start > 0 && end < 0))) return [];
  const before = start < 0 ? -1 : 1;
  return [{ low: 0, high: 1, before, after: before === 1 ? -1 : 1, tangent: false }];
}

function bernsteinCoefficients(c: Float64Array): Float64Array {
  const d = c.length - 1;
  const b = new Float64Array(d + 1);
  for (let i = 0; i <= d; i += 1) {
    let ratio = 1;
    for (let k = 0; k <= i; k += 1) {
      b[i]! += ratio * c[k]!;
      ratio *= (i - k) / (d - k);
    }
  }
  return b;
}

interface Piece {
  b: Float64Array;
  low: number;
  high: number;
  depth: number;
}

function descend(piece: Piece, band: number, found: RootInterval[]): void {
  const { changes, first, last } = signChanges(piece.b, band);
  if (changes === 0 || first === 0 || last === 0) return;
  const { low, high } = piece;
  if (changes === 1) {
    found.push({ low, high, before: first, after: last, tangent: false });
    return;
  }
  const halves = piece.depth >= MAX_DEPTH ? null : cut(piece, band);
  if (halves === null) {
    found.push({ low, high, before: first, after: last, tangent: true });
    return;
  }
  descend(halves[0], band, found);
  descend(halves[1], band, found);
}

/** Sign changes along the coefficients: the two ends count with whatever sign they have, the others outside the band. */
function signChanges(b: Float64Array, band: number): { changes: number; first: 1 | -1 | 0; last: 1 | -1 | 0 } {
  let changes = 0;
  let first: 1 | -1 | 0 = 0;
  let last: 1 | -1 | 0 = 0;
  for (let i = 0; i < b.length; i += 1) {
    const isEnd = i === 0 || i === b.length - 1;
    const entry = b[i]!;
    if (entry === 0 || (!isEnd && Math.abs(entry) <= band)) continue;
    const sign = entry > 0 ? 1 : -1;
    if (last !== 0 && sign !== last) changes += 1;
    if (first === 0) first = sign;
    last = sign;
  }
  return { changes, first, last };
}

/** Cut where the polynomial's value has a sign; null where it has none at any of the places tried. */
function cut({ b, low, high, depth }: Piece, band: number): [Piece, Piece] | null {
  const d = b.length - 1;
  for (const share of CUTS) {
    const left = new Float64Array(d + 1);
    const right = Float64Array.from(b);
    for (let level = 0; level <= d; level += 1) {
      left[level] = right[0]!;
      for (let i = 0; i < d - level; i += 1) right[i] = (1 - share) * right[i]! + share * right[i + 1]!;
    }
    if (Math.abs(right[0]!) <= band) continue;
    const middle = low + share * (high - low);
    return [
      { b: left, low, high: middle, depth: depth + 1 },
      { b: right, low: middle, high, depth: depth + 1 },
    ];
  }
  return null;
}
