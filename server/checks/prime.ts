import { type Finding } from '@/schemas/generated/contract';
import { type Claim } from '@/server/checks/claim';
import { figure } from '@/server/checks/figure';
import { finding } from '@/server/checks/finding';
import { SAME_ORBIT } from '@/server/checks/limits';
import { type RunControl } from '@/server/checks/raw-run';
import { type RawRun, type Survey } from '@/server/checks/study';
import { correctOrbit } from '@/server/numerics/periodic/correct-orbit';
import { differenceSize } from '@/server/numerics/periodic/difference-size';
import { stateDifference } from '@/server/numerics/periodic/state-difference';

/**
 * Find the number of returns after which the orbit is closed for the first time.
 *
 * Where all crossings repeat after fewer returns, Newton is run with that shorter period; it counts when it ends on the same
 * point.
 */
export function primeReturns(claim: Claim, raw: RawRun, survey: Survey, control: RunControl): number {
  const candidate = survey.primeReturns;
  const all = survey.crossings.length;
  if (candidate === all) return all;
  const period = survey.crossings[candidate - 1]!.time;
  const shorter = correctOrbit({
    flow: claim.flow,
    start: survey.start,
    period,
    stepEnds: [...raw.stepEnds.filter((time) => time < period), period],
    sizes: survey.sizes,
    moduli: claim.moduli,
    hold: claim.hold ?? undefined,
    maxSteps: control.maxSteps,
    shouldStop: control.shouldStop,
  });
  if (!shorter.converged) return all;
  const { difference } = stateDifference(shorter.nodes[0]!, survey.start, claim.moduli);
  return differenceSize(difference, survey.sizes) <= SAME_ORBIT ? candidate : all;
}

/** Say that the stated period is a multiple of the prime one. */
export function primePeriod(survey: Survey): Finding[] {
  const all = survey.crossings.length;
  const times = all / survey.primeReturns;
  if (times === 1) return [];
  const { time } = survey.crossings[survey.primeReturns - 1]!;
  return [
    finding('period-is-multiple', {
      message:
        `The orbit closes already after ${survey.primeReturns} of the ${all} returns, at t = ${String(time)}: the period ` +
        `is ${figure(times)} times the prime one.`,
      value: times,
      limit: 1,
    }),
  ];
}
