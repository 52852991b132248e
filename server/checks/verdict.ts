import { type Claim } from '@/server/checks/claim';
import { type RawRun, type Shifts, type Verdict } from '@/server/checks/study';
import { type CorrectedOrbit, type FailedCorrection } from '@/server/numerics/periodic/correct-orbit';
import { differenceSize } from '@/server/numerics/periodic/difference-size';
import { periodDifferenceSize } from '@/server/numerics/periodic/period-difference-size';
import { stateDifference } from '@/server/numerics/periodic/state-difference';

/** Measure how far the corrected orbit is from what was typed; null where there is none. */
export function shiftsOf(claim: Claim, raw: RawRun, correction: CorrectedOrbit | FailedCorrection): Shifts | null {
  if (!correction.converged) return null;
  const typed = Float64Array.from(claim.point, ({ value }) => value);
  const { difference } = stateDifference(correction.nodes[0]!, typed, claim.moduli);
  const period = claim.period.value;
  return {
    point: differenceSize(difference, raw.sizes),
    period: periodDifferenceSize(correction.period - period, period, raw.field, raw.sizes),
  };
}

/**
 * Judge the closure.
 *
 * `closes`: the raw closure is within the tolerance. `closes-after-correction`: it is not, but the correction converges and
 * moves point and period by no more than the tolerance. Else `does-not-close`.
 */
export function verdictOf(tolerance: number, raw: RawRun, shifts: Shifts | null): Verdict {
  if (raw.relative <= tolerance) return 'closes';
  if (shifts !== null && shifts.point <= tolerance && shifts.period <= tolerance) return 'closes-after-correction';
  return 'does-not-close';
}
