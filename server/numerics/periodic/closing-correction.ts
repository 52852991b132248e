import { leastNormSolve } from '@/server/numerics/linear/least-norm-solve';
import { triangularise } from '@/server/numerics/linear/triangularise';
import { type EndRelation } from '@/server/numerics/periodic/condense-segments';

/** The section as the linearised correction sees it, in sizes. */
export interface LinearSection {
  /** Gradient of u times the sizes, n entries. */
  gradient: Float64Array;
  /** u at the point. */
  value: number;
}

/** A quantity that is to keep its value while the orbit moves along its family, linearised, in sizes. */
interface LinearHold {
  /** Gradient of the quantity times the sizes, n entries. */
  gradient: Float64Array;
  /** Its value at the point minus the one to be kept. */
  value: number;
}

/** A correction of the first node and of the period. */
export interface ClosingCorrection {
  /** Change of the first node, in sizes. */
  first: Float64Array;
  /** Change of the period, as a share of it. */
  theta: number;
  /** Dimension of the family that the point could move along on the section. */
  freeDirections: number;
  /** Whether the quantity could be held: the family has a direction that changes it. */
  isHeld: boolean;
}

/** What a family leaves open: how the point is told among its members. */
interface FamilyChoice {
  /** The quantity to be held, if any. */
  hold: LinearHold | null;
  /**
   * How far the point has moved in each of these directions (an orthonormal basis, n × width, row-major), in sizes, from
   * where it is to stay; left out, it stays where it is.
   */
  driftIn?: (open: Float64Array) => Float64Array;
}

/** A quantity whose change along the family is below this share of its steepness cannot be held. */
const UNCHANGING = 1e-6;

/**
 * Solve for the smallest change of the point that closes a chain of segments on itself.
 *
 *   (P + Q) ξ + c θ = r,   g·ξ = −u      (the end is the start, the start stays on the section)
 *
 * θ is eliminated by one reflection, so that it costs nothing; of all ξ that remain the shortest is taken, in a family
 * the one that undoes the drift, or that keeps the held quantity, h·ξ = −(value).
 *
 * @param relation  what the chain says about its ends, see condenseSegments.
 * @param section   gradient and value of u at the first node.
 * @param cutOff    singular values at or below cutOff·σ_max count as zero.
 * @param family    which member is to be found; of no effect on an isolated orbit.
 *
 * Accuracy: that of the singular values; heuristic where they have no gap at the cut-off.
 * Cost: one singular value decomposition of n × n.
 * Source: least-norm Newton for under-determined systems (common practice); T free and the point held: our convention.
 */
export function closingCorrection(
  relation: EndRelation,
  section: LinearSection,
  cutOff: number,
  { hold, driftIn }: FamilyChoice = { hold: null },
): ClosingCorrection {
  const n = relation.c.length;
  const width = n + 2;
  const work = new Float64Array((n + 1) * width);
  for (let i = 0; i < n; i += 1) {
    work[i * width] = relation.c[i]!;
    for (let j = 0; j < n; j += 1) work[i * width + 1 + j] = relation.p[i * n + j]! + relation.q[i * n + j]!;
    work[i * width + n + 1] = relation.r[i]!;
  }
  const steepness = Math.hypot(...section.gradient);
  const last = n * width;
  for (let j = 0; j < n; j += 1) work[last + 1 + j] = steepness === 0 ? 0 : section.gradient[j]! / steepness;
  work[last + n + 1] = steepness === 0 ? 0 : -section.value / steepness;
  triangularise(work, { rows: n + 1, cols: width, pivots: 1 });
  const a = new Float64Array(n * n);
  const b = new Float64Array(n);
  for (let i = 0; i < n; i += 1) {
    for (let j = 0; j < n; j += 1) a[i * n + j] = work[(i + 1) * width + 1 + j]!;
    b[i] = work[(i + 1) * width + n + 1]!;
  }
  const { x, rank, open } = leastNormSolve({ a, rows: n, cols: n, b, cutOff });
  const slopes = hold && slopesIn(open, hold);
  // What is held decides in its own direction; the drift is taken back in the others.
  const others = slopes ? othersIn(open, slopes) : open;
  if (driftIn && others.length > 0) undo(driftIn(others), x, others);
  if (hold && slopes) keep(hold, x, { open, slopes });
  let rest = work[n + 1]!;
  for (let j = 0; j < n; j += 1) rest -= work[1 + j]! * x[j]!;
  return { first: x, theta: rest / work[0]!, freeDirections: n - rank, isHeld: slopes !== null };
}

/** Take a drift in the open directions back from x. */
function undo(drift: Float64Array, x: Float64Array, open: Float64Array): void {
  const width = drift.length;
  for (let i = 0; i < x.length; i += 1) {
    for (let j = 0; j < width; j += 1) x[i]! -= open[i * width + j]! * drift[j]!;
  }
}

/** How a quantity changes along each open direction; null where they hardly change it. */
function slopesIn(open: Float64Array, { gradient }: LinearHold): Float64Array | null {
  const n = gradient.length;
  const width = open.length / n;
  const slopes = new Float64Array(width);
  for (let i = 0; i < n; i += 1) {
    for (let j = 0; j < width; j += 1) slopes[j]! += gradient[i]! * open[i * width + j]!;
  }
  return Math.hypot(...slopes) > UNCHANGING * Math.hypot(...gradient) ? slopes : null;
}

/** A basis of the open directions in which a quantity does not change: all but one, turned by a reflection. */
function othersIn(open: Float64Array, slopes: Float64Array): Float64Array {
  const width = slopes.length;
  const n = open.length / width;
  const mirror = Float64Array.from(slopes);
  mirror[0]! += Math.sign(slopes[0]! || 1) * Math.hypot(...slopes);
  const size = mirror.reduce((sum, entry) => sum + entry * entry, 0);
  const others = new Float64Array(n * (width - 1));
  for (let i = 0; i < n; i += 1) {
    let share = 0;
    for (let j = 0; j < width; j += 1) share += (2 * open[i * width + j]! * mirror[j]!) / size;
    for (let j = 1; j < width; j += 1) others[i * (width - 1) + j - 1] = open[i * width + j]! - share * mirror[j]!;
  }
  return others;
}

/** Add to x the shortest change in the open directions with which h·x = −value. */
function keep(
  { gradient, value }: LinearHold,
  x: Float64Array,
  { open, slopes }: { open: Float64Array; slopes: Float64Array },
): void {
  const width = slopes.length;
  let missing = -value;
  for (let i = 0; i < x.length; i += 1) missing -= gradient[i]! * x[i]!;
  const along = Math.hypot(...slopes);
  for (let i = 0; i < x.length; i += 1) {
    for (let j = 0; j < width; j += 1) x[i]! += (open[i * width + j]! * slopes[j]! * missing) / along ** 2;
  }
}
