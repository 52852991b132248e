import { type Claim } from '@/server/checks/claim';
import { type RunControl } from '@/server/checks/raw-run';
import { type RawRun } from '@/server/checks/study';
import { chainOfPoints } from '@/server/numerics/periodic/chain-of-points';
import { correctOrbit, type CorrectedOrbit, type FailedCorrection } from '@/server/numerics/periodic/correct-orbit';
import { orbitSizes } from '@/server/numerics/periodic/orbit-sizes';

/** How a claim is corrected: limits, and whom to tell about Newton's steps. */
export interface CorrectionControl extends RunControl {
  onIteration?: ((iteration: number) => void) | undefined;
}

/** What a correction led to, with the run whose sizes it used. */
export interface ClaimCorrection {
  raw: RawRun;
  correction: CorrectedOrbit | FailedCorrection;
}

/**
 * Correct the orbit as typed: from its section points where they are stated and the run from the first alone does not close,
 * else from that run.
 */
export function correctClaim(claim: Claim, raw: RawRun, control: CorrectionControl): ClaimCorrection {
  const { maxSteps, shouldStop, onIteration } = control;
  const input = {
    ...{ flow: claim.flow, start: raw.start, period: claim.period.value, stepEnds: raw.stepEnds },
    ...{ sizes: raw.sizes, moduli: claim.moduli, hold: claim.hold ?? undefined },
    ...{ maxSteps, shouldStop, onIteration },
  };
  if (claim.points !== null && raw.relative > claim.tolerance) {
    const stated = claim.points.map((point) => Float64Array.from(point, ({ value }) => value));
    const points = [raw.start, ...stated];
    const chain = chainOfPoints({ flow: claim.flow, points, longest: input.period, maxSteps, shouldStop });
    if (chain !== null) {
      const sizes = orbitSizes(chain.watch.extent(), claim.moduli);
      const correction = correctOrbit({ ...input, chain, period: chain.period, sizes });
      if (correction.converged || correction.failure !== null) return { raw: { ...raw, sizes }, correction };
    }
  }
  return { raw, correction: correctOrbit(input) };
}
