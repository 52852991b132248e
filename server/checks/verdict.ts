import { type Claim } from '@/server/checks/claim';
import { type RawRun, type Shifts, type Verdict } from '@/server/checks/study';
import { type CorrectedOrbit, type FailedCorrection } from '@/server/numerics/periodic/correct-orbit';
import { differenceSize } from '@/server/numerics/periodic/difference-size';
import { orbitCrossings } from '@/server/numerics/periodic/orbit-crossings';
import { periodDifferenceSize } from '@/server/numerics/periodic/period-difference-size';
import { stateDifference } from '@/server/numerics/periodic/state-difference';

/** Measure how far the corrected orbit is from what was typed; null where there is none. */
export function shiftsOf(claim: Claim, raw: RawRun, correction: CorrectedOrbit | FailedCorrection): Shifts | null {
  if (!correction.converged) return null;
  const typed = Float64Array.from(claim.point, ({ value }) => value);
  const { difference } = stateDifference(correction.nodes[0]!, typed, claim.moduli);
  const period = claim.period.value;
  return {
    point: Math.max(differenceSize(difference, raw.sizes), shiftOfPoints(claim, raw, correction)),
    period: periodDifferenceSize(correction.period - period, period, raw.field, raw.sizes),
  };
}

/** How far the section points that were stated are from the corrected orbit's; 0 where it has another number of them. */
function shiftOfPoints({ points, moduli }: Claim, { sizes }: RawRun, { watch, period, nodes }: CorrectedOrbit): number {
  const found = points === null ? [] : orbitCrossings(watch.zeros, period, nodes[0]!);
  if (points === null || found.length !== points.length + 1) return 0;
  return points.reduce((size, point, k) => {
    const typed = Float64Array.from(point, ({ value }) => value);
    return Math.max(size, differenceSize(stateDifference(found[k]!.state, typed, moduli).difference, sizes));
  }, 0);
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
