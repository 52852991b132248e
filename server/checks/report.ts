import { type CheckedOrbit, type CheckReport } from '@/schemas/generated/contract';
import { decimalOf } from '@/server/checks/decimal-of';
import { multiplierDecimals } from '@/server/checks/multiplier-decimals';
import { type RawRun, type Shifts, type Survey } from '@/server/checks/study';
import { withoutTrivial } from '@/server/checks/survey-orbit';
import { type CorrectedOrbit } from '@/server/numerics/periodic/correct-orbit';

/** A report before anything is known. */
export const emptyReport = {
  verdict: 'does-not-close',
  closure: null,
  correction: null,
  orbit: null,
  findings: [],
  matches: [],
  digits: null,
  expectedClosure: null,
  endPoint: null,
  suggestion: null,
} as const satisfies Omit<CheckReport, 'engine'>;

/** The closure of the orbit as typed. */
export function closureOf({ absolute, relative }: RawRun, tolerance: number): CheckReport['closure'] {
  return { absolute, relative, tolerance };
}

/** What the correction did. */
export function correctionOf(corrected: CorrectedOrbit, shifts: Shifts): CheckReport['correction'] {
  const family = corrected.freeDirections > 0;
  return {
    iterations: corrected.iterations,
    shift: shifts.point,
    periodShift: shifts.period,
    residual: corrected.residual,
    segments: corrected.plan.length,
    held: family
      ? 'the point, as near as its family allows; the period is free'
      : 'the section; point and period are free',
    freeDirections: corrected.freeDirections,
  };
}

/** The orbit as found, figures as decimals. */
export function checkedOrbit(survey: Survey): CheckedOrbit {
  const nontrivial = withoutTrivial(survey.multipliers);
  return {
    point: Array.from(survey.start, decimalOf),
    period: decimalOf(survey.period),
    returns: survey.crossings.length,
    prime: survey.primeReturns === survey.crossings.length,
    crossings: survey.crossings.map(({ time, state, returnTime }, i) => ({
      time: decimalOf(time),
      point: Array.from(state, decimalOf),
      returnTime: decimalOf(returnTime),
      transversality: survey.transversalities[i]!,
    })),
    multipliers: nontrivial.map(multiplierDecimals),
    unitMultipliers: survey.unitMultipliers,
    exponents: nontrivial.map(({ logModulus }) => Math.max(-Number.MAX_VALUE, logModulus / survey.period)),
    selfCheck: { flow: survey.flowCheck, liouville: survey.liouville },
    stability: survey.stability,
    unstableDirections: survey.unstableDirections,
    itinerary: survey.itinerary,
    smallestTransversality: survey.smallest.cosine,
    extent: survey.extent,
    invariants: survey.invariants.map(({ name, value, drift }) => ({ name, value: decimalOf(value), drift })),
    winding: survey.winding,
  };
}
