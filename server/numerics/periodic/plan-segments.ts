import { multiplyMatrices } from '@/server/numerics/linear/multiply-matrices';
import { differenceSize } from '@/server/numerics/periodic/difference-size';
import { frobeniusNorm } from '@/server/numerics/periodic/frobenius-norm';
import { scaleMatrix } from '@/server/numerics/periodic/scale-matrix';
import { type Shot, type ShotSegment } from '@/server/numerics/periodic/shoot';
import { type ShootingPlan } from '@/server/numerics/periodic/shooting-plan';
import { type Flow } from '@/server/numerics/taylor/flow';

/** Growth above which a segment is cut, and which no part of it may exceed. */
const LARGEST_NORM = 1e3;

/** Growth at which a part may end: what a node misses by grows little further to the crossings behind it. */
const PART_NORM = 10;

/** A shot cut into segments. */
export interface CutShot {
  plan: ShootingPlan;
  nodes: Float64Array[];
  segments: ShotSegment[];
}

/** How segments are measured. */
interface CutScale {
  flow: Flow;
  /** n positive sizes, see orbitSizes. */
  sizes: Float64Array;
}

/**
 * Cut the segments of a shot that grow beyond 1e3, in sizes, into parts that grow by 10 to 1e3 each.
 *
 * A part ends where the flow is not fast, if it can: a node in a close approach would move by the rounding of the time times
 * the speed there.
 *
 * @param shot   integrated with variations.
 * @param nodes  start of each of its segments.
 * @param scale  the flow and the sizes.
 * @returns      plan, nodes and segments; new nodes are where the shot came by, so that no cut adds a defect.
 */
export function planSegments(shot: Shot, nodes: readonly Float64Array[], scale: CutScale): CutShot {
  const cut: CutShot = { plan: [], nodes: [], segments: [] };
  shot.segments.forEach((segment, i) => {
    const edges = [0, ...cutsOf(segment, scale), segment.pieces.length];
    for (let e = 0; e + 1 < edges.length; e += 1) {
      const part = partOf(segment, edges[e]!, edges[e + 1]!);
      cut.plan.push({ borders: part.borders });
      cut.nodes.push(e === 0 ? nodes[i]! : part.starts[0]!);
      cut.segments.push(part);
    }
  });
  return cut;
}

/**
 * The pieces before which a segment is cut: the first place where the growth is enough and the flow not faster than it mostly
 * is; without one, the slowest there was before the growth became too much.
 */
function cutsOf({ pieces, starts }: ShotSegment, { flow, sizes }: CutScale): number[] {
  const n = sizes.length;
  const norm = (m: Float64Array): number => frobeniusNorm(scaleMatrix(m, sizes));
  if (!growsBeyond(pieces, norm)) return [];
  const speeds = starts.map((start) => differenceSize(flow.field(start), sizes));
  const usual = [...speeds].sort((a, b) => a - b)[Math.floor(speeds.length / 2)]!;
  const cuts: number[] = [];
  let product: Float64Array | null = null;
  let best = -1;
  for (let k = 0; k < pieces.length; k += 1) {
    const growth = product === null ? 1 : norm(product);
    if (growth >= PART_NORM && (best === -1 || speeds[k]! < speeds[best]!)) best = k;
    const next: Float64Array = product === null ? pieces[k]! : multiplyMatrices(pieces[k]!, product, n, n);
    const isSlow = best === k && speeds[k]! <= usual;
    if (product === null || (!isSlow && norm(next) <= LARGEST_NORM)) {
      product = next;
      continue;
    }
    k = isSlow || best === -1 ? k : best;
    cuts.push(k);
    product = pieces[k]!;
    best = -1;
  }
  return cuts;
}

function partOf({ borders, starts, pieces, end }: ShotSegment, from: number, to: number): ShotSegment {
  const n = starts[from]!.length;
  const reached = starts[to] ?? end;
  const own = pieces.slice(from, to);
  return {
    ...{ borders: borders.slice(from, to + 1), starts: starts.slice(from, to), pieces: own },
    ...{ end: reached, derivedEnd: reached },
    monodromy: own.reduce((earlier, later) => multiplyMatrices(later, earlier, n, n)),
  };
}

/** Whether the product of the first pieces is ever larger than what one segment may grow by. */
function growsBeyond(pieces: readonly Float64Array[], norm: (m: Float64Array) => number): boolean {
  const n = Math.sqrt(pieces[0]!.length);
  let product = pieces[0]!;
  return pieces.some((piece, k) => {
    if (k > 0) product = multiplyMatrices(piece, product, n, n);
    return k > 0 && norm(product) > LARGEST_NORM;
  });
}
