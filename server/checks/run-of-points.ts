import { type Claim } from '@/server/checks/claim';
import { type RunControl } from '@/server/checks/raw-run';
import { type RawRun } from '@/server/checks/study';
import { chainOfPoints } from '@/server/numerics/periodic/chain-of-points';
import { orbitSizes } from '@/server/numerics/periodic/orbit-sizes';

/**
 * The run of an orbit that departs from itself and then ends early: each stated section point is followed to the next return.
 *
 * @returns a run without a closure (it is infinite); null where no points are stated or one of them does not return.
 */
export function runOfPoints(claim: Claim, start: Float64Array, { maxSteps, shouldStop }: RunControl): RawRun | null {
  const { flow, moduli, period } = claim;
  if (claim.points === null) return null;
  const stated = claim.points.map((point) => Float64Array.from(point, ({ value }) => value));
  const chain = chainOfPoints({ flow, points: [start, ...stated], longest: period.value, maxSteps, shouldStop });
  if (chain === null) return null;
  const extent = chain.watch.extent();
  return {
    ok: true,
    ...{ start, end: start, field: flow.field(start), extent, sizes: orbitSizes(extent, moduli), watch: chain.watch },
    ...{ returnsInside: chain.nodes.length, stepEnds: chain.stepEnds, absolute: Infinity, relative: Infinity },
    winding: moduli.map(() => null),
  };
}
