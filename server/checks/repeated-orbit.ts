import { type Claim } from '@/server/checks/claim';
import { isWithinDigits } from '@/server/checks/digits';
import { rawRun, type RunControl } from '@/server/checks/raw-run';
import { type RawRun } from '@/server/checks/study';
import { correctOrbit, type CorrectedOrbit } from '@/server/numerics/periodic/correct-orbit';
import { differenceSize } from '@/server/numerics/periodic/difference-size';
import { periodDifferenceSize } from '@/server/numerics/periodic/period-difference-size';
import { stateDifference } from '@/server/numerics/periodic/state-difference';

/** A return nearer to the start than this, after a share of the period that is nearly 1/2, 1/3, …, may close a turn. */
const NEAR_RETURN = 1e-2;

/** Near returns that are tried; the first is the right one wherever the point is known to a few digits. */
const MOST_TRIED = 4;

/** A shorter orbit that the typed one runs through several times. */
export interface RepeatedOrbit {
  turns: number;
  /** The shorter orbit as typed, followed once. */
  raw: RawRun;
  orbit: CorrectedOrbit;
}

/**
 * Find the shorter orbit that the typed one repeats, where the typed one departs from it before its period is over: after
 * many turns of an unstable orbit the end says nothing any more, its first near return does.
 *
 * @returns null where no near return belongs to an orbit that is, turn for turn, within the tolerance or the digits.
 */
export function repeatedOrbit(claim: Claim, raw: RawRun, control: RunControl): RepeatedOrbit | null {
  const { flow, moduli, period } = claim;
  const near = raw.watch.zeros.filter(({ direction, time, state }) => {
    const turns = Math.round(period.value / time);
    if (direction !== 1 || turns < 2) return false;
    const late = periodDifferenceSize(period.value / turns - time, time, raw.field, raw.sizes);
    return (
      late <= NEAR_RETURN &&
      differenceSize(stateDifference(state, raw.start, moduli).difference, raw.sizes) <= NEAR_RETURN
    );
  });
  for (const { time } of near.slice(0, MOST_TRIED)) {
    const turn = rawRun(claim, { start: raw.start, onSection: true, period: time }, control);
    if (!turn.ok) return null;
    const orbit = correctOrbit({
      ...{ flow, start: raw.start, period: time, stepEnds: turn.stepEnds, sizes: turn.sizes, moduli },
      ...{ hold: claim.hold ?? undefined, maxSteps: control.maxSteps, shouldStop: control.shouldStop },
    });
    const turns = Math.round(period.value / time);
    if (!orbit.converged) continue;
    const whole = { point: orbit.nodes[0]!, period: turns * orbit.period };
    if (isWithinDigits(claim, turn, whole)) return { turns, raw: turn, orbit };
  }
  return null;
}
