import { type Finding } from '@/schemas/generated/contract';
import { type Claim } from '@/server/checks/claim';
import { finding } from '@/server/checks/finding';
import { type RunControl } from '@/server/checks/raw-run';
import { type RawRun } from '@/server/checks/study';
import { differenceSize } from '@/server/numerics/periodic/difference-size';
import { stateDifference } from '@/server/numerics/periodic/state-difference';

/** A stated period may be a half, a third or a quarter of the orbit's. */
const MOST_TURNS = 4;

/**
 * Whether the orbit, run on, closes after a small number of stated periods: it was taken for closed at a symmetric image of
 * the start, or at another crossing.
 *
 * @returns how many periods it takes, 2 to 4; null where it does not close by then.
 */
export function closesLater(claim: Claim, raw: RawRun, { maxSteps, shouldStop }: RunControl): number | null {
  let state = raw.end;
  for (let turns = 2; turns <= MOST_TURNS; turns += 1) {
    const run = claim.flow.integrate({
      start: state,
      duration: claim.period.value,
      variations: false,
      maxSteps,
      ...(shouldStop === undefined ? {} : { shouldStop }),
    });
    if (!run.ok) return null;
    state = run.end;
    const { difference } = stateDifference(state, raw.start, claim.moduli);
    if (differenceSize(difference, raw.sizes) <= claim.tolerance) return turns;
  }
  return null;
}

/** Say that the stated period is a part of the orbit's. */
export function partOfPeriod(turns: number): Finding[] {
  const message = `The orbit closes after ${turns} of the stated periods: what is stated is 1/${turns} of its period.`;
  return [finding('orbit-nearby', { message, value: turns, limit: 1 })];
}
