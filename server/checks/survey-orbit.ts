import { type Claim } from '@/server/checks/claim';
import { type ClosedOrbit } from '@/server/checks/closed-orbit';
import { itineraryOf } from '@/server/checks/itinerary';
import { invariantsAlong } from '@/server/checks/invariants';
import { SAME_ORBIT } from '@/server/checks/limits';
import { orbitMultipliers } from '@/server/checks/orbit-multipliers';
import { pairing } from '@/server/checks/pairing';
import { type Survey } from '@/server/checks/study';
import { multiplyMatrices } from '@/server/numerics/linear/multiply-matrices';
import { type Multiplier } from '@/server/numerics/periodic/floquet-multipliers';
import { frobeniusNorm } from '@/server/numerics/periodic/frobenius-norm';
import { judgeStability } from '@/server/numerics/periodic/judge-stability';
import { orbitCrossings } from '@/server/numerics/periodic/orbit-crossings';
import { scaleMatrix } from '@/server/numerics/periodic/scale-matrix';
import { smallestRepetition } from '@/server/numerics/periodic/smallest-repetition';
import { smallestTransversality } from '@/server/numerics/periodic/smallest-transversality';
import { transversality } from '@/server/numerics/periodic/transversality';
import { type Flow } from '@/server/numerics/taylor/flow';

/** Multipliers are known to at least this; a modulus nearer to 1 cannot be told from it. */
const CIRCLE_FLOOR = 1e-8;

/** Rounding of the multipliers of a matrix of norm 1, with room for their condition. */
const CIRCLE_ROUNDING = 1e3 * Number.EPSILON;

/**
 * Measure a closed orbit: crossings, multipliers, stability, transversality, itinerary, invariants, self-checks.
 *
 * @returns null when its multipliers cannot be computed.
 */
export function surveyOrbit(claim: Claim, orbit: ClosedOrbit): Survey | null {
  const { flow, moduli } = claim;
  const { start, period, sizes, watch } = orbit;
  const multipliers = orbitMultipliers(flow, orbit);
  if (multipliers === null) return null;
  const unitMultipliers = multipliers.filter(isUnit).length;
  const crossings = orbitCrossings(watch.zeros, period, start);
  const points = crossings.map(({ state }) => state);
  const zeros = [...watch.zeros, { time: 0, timeLow: 0, state: start, direction: 1 as const }];
  const { lowest, highest } = watch.extent();
  return {
    ...{ start, period, sizes, crossings, multipliers, unitMultipliers, winding: orbit.winding },
    extent: Array.from(lowest, (low, i) => [low, highest[i]!]),
    ...judgeStability({
      multipliers: withoutTrivial(multipliers),
      accuracy: Math.max(CIRCLE_FLOOR, CIRCLE_ROUNDING * growthOf(orbit)),
      divergenceIntegral: orbit.divergenceIntegral,
    }),
    flowCheck: flowCheck(flow, orbit),
    liouville: liouville(multipliers, orbit.divergenceIntegral),
    pairing: pairing(claim, orbit, { multipliers, crossings }),
    smallest: smallestTransversality(flow, { zeros, nearMisses: watch.nearMisses }, sizes),
    transversalities: points.map((point) => transversality(flow, point, sizes)),
    itinerary: itineraryOf(claim, points),
    invariants: invariantsAlong(claim, points, sizes),
    primeReturns: smallestRepetition({ points, sizes, moduli }, SAME_ORBIT),
  };
}

/** The multipliers without the one trivial 1. */
export function withoutTrivial(multipliers: readonly Multiplier[]): Multiplier[] {
  const trivial = multipliers.findIndex(isUnit);
  return multipliers.filter((_, i) => i !== trivial);
}

function isUnit({ re, im, logModulus }: Multiplier): boolean {
  return re === 1 && im === 0 && logModulus === 0;
}

/** Norms of the segments' derivatives together, in sizes: what the rounding of one step can grow to in the multipliers. */
function growthOf({ segments, sizes }: ClosedOrbit): number {
  return segments.reduce((sum, { monodromy }) => sum + frobeniusNorm(scaleMatrix(monodromy!, sizes)), 0);
}

/** Largest ‖M f(start) − f(end)‖ / (‖M‖ ‖f(start)‖) of the segments, in sizes. */
function flowCheck(flow: Flow, { segments, sizes }: ClosedOrbit): number {
  const n = sizes.length;
  let largest = 0;
  for (const { starts, derivedEnd, monodromy } of segments) {
    const before = flow.field(starts[0]!).map((entry, i) => entry / sizes[i]!);
    const after = flow.field(derivedEnd).map((entry, i) => entry / sizes[i]!);
    const m = scaleMatrix(monodromy!, sizes);
    const image = multiplyMatrices(m, before, n, n);
    const miss = Math.hypot(...image.map((entry, i) => entry - after[i]!));
    largest = Math.max(largest, miss / (frobeniusNorm(m) * Math.hypot(...before)));
  }
  return largest;
}

/** Σ log|λ| − ∫ div f dt; null where a multiplier vanished in rounding. */
function liouville(multipliers: readonly Multiplier[], divergenceIntegral: number): number | null {
  const sum = multipliers.reduce((total, { logModulus }) => total + logModulus, 0);
  return Number.isFinite(sum) ? sum - divergenceIntegral : null;
}
