import { multiplyMatrices } from '@/server/numerics/linear/multiply-matrices';
import { frobeniusNorm } from '@/server/numerics/periodic/frobenius-norm';
import { scaleMatrix } from '@/server/numerics/periodic/scale-matrix';
import { type Shot, type ShotSegment } from '@/server/numerics/periodic/shoot';
import { type ShootingPlan } from '@/server/numerics/periodic/shooting-plan';

/** Growth above which an orbit is shot in several segments, each below it. */
const SEGMENT_NORM = 1e3;

/** A single shot cut into segments. */
export interface CutShot {
  plan: ShootingPlan;
  nodes: Float64Array[];
  segments: ShotSegment[];
}

/**
 * Cut a single shot into segments by growth: each as long as the norm of its derivative, in sizes, stays below 1e3.
 *
 * @param shot   one segment over the whole period, integrated with variations.
 * @param sizes  n positive sizes, see orbitSizes.
 * @returns      plan, nodes and segments; the ends are those of the shot, so that only the last one has a defect.
 */
export function planSegments(shot: Shot, sizes: Float64Array): CutShot {
  const n = sizes.length;
  const { borders, starts, pieces, end } = shot.segments[0]!;
  const cut: CutShot = { plan: [], nodes: [], segments: [] };
  let first = 0;
  let product = pieces[0]!;
  const close = (next: number): void => {
    cut.plan.push({ borders: borders.slice(first, next + 1) });
    cut.nodes.push(starts[first]!);
    cut.segments.push({
      borders: borders.slice(first, next + 1),
      starts: starts.slice(first, next),
      pieces: pieces.slice(first, next),
      end: starts[next] ?? end,
      monodromy: product,
    });
  };
  for (let k = 1; k < pieces.length; k += 1) {
    const grown = multiplyMatrices(pieces[k]!, product, n, n);
    if (frobeniusNorm(scaleMatrix(grown, sizes)) > SEGMENT_NORM) {
      close(k);
      first = k;
      product = pieces[k]!;
    } else product = grown;
  }
  close(pieces.length);
  return cut;
}
