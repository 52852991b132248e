import { type CheckedOrbit, type CheckReport } from '@/schemas/generated/contract';
import { type Hold } from '@/server/checks/claim';
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

/** The closure of the orbit as typed; null where its run ended before the period. */
export function closureOf({ absolute, relative }: RawRun, tolerance: number): CheckReport['closure'] {
  if (!Number.isFinite(relative)) return null;
  return { absolute, relative, tolerance };
}

/** What the correction did. */
export function correctionOf(corrected: CorrectedOrbit, shifts: Shifts, hold: Hold | null): CheckReport['correction'] {
  return {
    iterations: corrected.iterations,
    shift: shifts.point,
    periodShift: shifts.period,
    residual: corrected.residual,
    segments: corrected.plan.length,
    held: heldWords(corrected, hold),
    freeDirections: corrected.freeDirections,
    basinRatio: corrected.basinRatio,
  };
}

/** What was held, in words. */
function heldWords({ freeDirections, isHeld }: CorrectedOrbit, hold: Hold | null): string {
  if (freeDirections === 0) return 'the section; point and period are free';
  const near = 'the point, as near as its family allows; the period is free';
  if (hold === null) return near;
  return isHeld ? `${hold.name}, and ${near}` : `${near} (${hold.name} does not change along the family)`;
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
    selfCheck: { flow: survey.flowCheck, liouville: survey.liouville, pairing: survey.pairing },
    stability: survey.stability,
    unstableDirections: survey.unstableDirections,
    itinerary: survey.itinerary,
    smallestTransversality: survey.smallest.cosine,
    extent: survey.extent,
    invariants: survey.invariants.map(({ name, value, drift }) => ({ name, value: decimalOf(value), drift })),
    winding: survey.winding,
  };
}
