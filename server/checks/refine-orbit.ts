import { type Claim } from '@/server/checks/claim';
import { correctClaim } from '@/server/checks/correct-claim';
import { ENGINE_VERSION } from '@/server/checks/engine-version';
import { STEPS_LARGEST } from '@/server/checks/limits';
import { preciseSystem } from '@/server/checks/precise-system';
import { rawRun } from '@/server/checks/raw-run';
import { readClaim, type ClaimBody } from '@/server/checks/read-claim';
import { startPoint } from '@/server/checks/start-point';
import { type CheckedSystem } from '@/server/formulas/checked-system';
import { parseSection } from '@/server/formulas/parse-section';
import { type CorrectedOrbit } from '@/server/numerics/periodic/correct-orbit';
import { decimalOfFixed } from '@/server/numerics/precision/decimal-of-fixed';
import { CrossingFinder } from '@/server/numerics/precision/crossing-finder';
import { doubleOfFixed } from '@/server/numerics/precision/fixed-number';
import { type PreciseCrossing } from '@/server/numerics/precision/locate-crossing';
import { type PreciseFlow, StoppedRun } from '@/server/numerics/precision/precise-flow';
import { fixedOfRational, parseRational } from '@/server/numerics/precision/rational';
import {
  NoConvergence,
  type RefinedOrbit,
  type RefinementInput,
  refinePeriodic,
} from '@/server/numerics/precision/refine-periodic';

/** Counted crossings nearer than this share of the period to its end are the closing one itself. */
const CLOSING_WINDOW = 1e-9;

/** Digits that doubles give; a refinement begins beyond. */
export const DIGITS_OF_DOUBLES = 17;

/** An orbit with as many correct digits as were asked for, counted against the orbit's extent and its period. */
export interface Refinement {
  ok: true;
  digits: number;
  point: string[];
  period: string;
  returnTimes: string[];
  /** Counted crossings with 0 < t ≤ T; the last is the point itself. */
  crossings: { time: string; point: string[] }[];
  /** What was held where the orbit belongs to a family, in words; null for an isolated orbit. */
  held: string | null;
  /** Largest miss of a segment, as a decimal with exponent, in sizes. */
  residual: string;
  /** Cost of the corrections in integrations with all digits. */
  flows: number;
  engine: string;
}

/** Why an orbit has no more digits. */
export interface RefinementFailure {
  ok: false;
  reason: 'not-closed' | 'not-converged' | 'too-long' | 'out-of-domain';
  /** One sentence. */
  message: string;
}

/** An orbit that closed in double precision. */
export interface RefinementRequest {
  system: CheckedSystem;
  /** What was checked; `hold` says what a family keeps, at its value in the point as typed. */
  claim: ClaimBody;
  orbit: { point: readonly string[]; period: string; crossings?: readonly { point: readonly string[] }[] };
  digits: number;
  shouldStop?: (() => boolean) | undefined;
}

/**
 * Find an orbit's point, period and return times to many digits.
 *
 * Numbers of the system, of the parameters and of the held value count as typed: decimals and fractions are exact.
 */
export function refineOrbit(request: RefinementRequest): Refinement | RefinementFailure {
  const { system, claim, orbit } = request;
  const points = orbit.crossings?.slice(0, -1).map(({ point }) => [...point]) ?? [];
  const { parameters, section, hold, tolerance } = claim;
  const read = readClaim(system, {
    ...{ section, point: [...orbit.point], period: orbit.period },
    ...(parameters && { parameters }),
    ...(hold !== undefined && { hold }),
    ...(tolerance !== undefined && { tolerance }),
    ...(points.length > 0 && { points }),
  });
  if (!read.ok) throw new RangeError(read.errors.map(({ pointer, message }) => `${pointer}: ${message}`).join(' '));
  try {
    return refined(request, read.claim);
  } catch (error) {
    return failureOf(error);
  }
}

function refined(request: RefinementRequest, claim: Claim): Refinement | RefinementFailure {
  const { shouldStop, digits } = request;
  const control = { maxSteps: STEPS_LARGEST, shouldStop };
  const { start } = startPoint(claim);
  const typed = rawRun(claim, { start, onSection: true, period: claim.period.value }, control);
  if (!typed.ok) return typed.reason === 'stopped' ? tooLong : notClosed;
  const { correction, raw } = correctClaim(claim, typed, control);
  const section = parseSection(request.system, request.claim.section);
  if (!correction.converged || !section.ok) return notClosed;
  const { parameters } = request.claim;
  const hold = claim.hold && correction.isHeld ? claim.hold.name : null;
  const precise = preciseSystem(request.system, { ...(parameters && { parameters }), section: section.section, hold });
  const finder = new CrossingFinder(precise, knownCrossings(correction));
  const result = refinePeriodic(
    {
      ...{ flow: claim.flow, precise, orbit: correction, sizes: raw.sizes, digits, shouldStop },
      anchor: ({ bits }) => exactPoint(request.orbit.point, bits),
      hold: hold === null ? null : heldAt(request.claim, claim, { precise, first: correction.nodes[0]! }),
    },
    (segment, step) => finder.see(segment, step),
  );
  const crossings = finder.found(result.durations);
  if (crossings === null) return notConverged;
  const whole = [...crossings, { time: result.period, point: result.nodes[0]! }];
  return inDecimals(digits, result, { crossings: whole, sizes: raw.sizes, hold });
}

function knownCrossings({ period, plan, watch }: CorrectedOrbit): { times: number[]; begins: number[] } {
  const counted = watch.zeros.filter(({ time, direction }) => direction === 1 && time < period * (1 - CLOSING_WINDOW));
  return { times: counted.map(({ time }) => time), begins: plan.map(({ borders }) => borders[0]! * period) };
}

/** What is held stays at its value in the point as typed. */
function heldAt(
  typed: ClaimBody,
  claim: Claim,
  { precise, first }: { precise: PreciseFlow; first: Float64Array },
): RefinementInput['hold'] {
  return {
    gradient: claim.hold!.gradientAt(first),
    target: (precision) => {
      return precise.valuesAt(exactPoint(typed.point, precision.bits), precision).hold!;
    },
  };
}

/** A point as typed, to the last bit. */
const exactPoint = (typed: readonly (string | number)[], bits: number): bigint[] =>
  typed.map((x) => fixedOfRational(parseRational(String(x)), bits));

interface Found {
  crossings: readonly PreciseCrossing[];
  sizes: Float64Array;
  hold: string | null;
}

/** Figures as decimals: every coordinate to `digits` digits of its extent, times to as many of the period. */
function inDecimals(digits: number, result: RefinedOrbit, { crossings, sizes, hold }: Found): Refinement {
  const { precision, period, residual, flows, freeDirections } = result;
  const { bits } = precision;
  const placesOf = (size: number): number => Math.max(0, digits - 1 - Math.floor(Math.log10(size)));
  const places = Array.from(sizes, placesOf);
  const placesOfTimes = placesOf(doubleOfFixed(period, bits));
  const point = (x: readonly bigint[]): string[] => x.map((value, i) => decimalOfFixed(value, bits, places[i]!));
  const time = (t: bigint): string => decimalOfFixed(t, bits, placesOfTimes);
  return {
    ok: true,
    digits,
    point: point(result.nodes[0]!),
    period: time(period),
    returnTimes: crossings.map((crossing, k) => time(crossing.time - (crossings[k - 1]?.time ?? 0n))),
    crossings: crossings.map((crossing) => ({ time: time(crossing.time), point: point(crossing.point) })),
    held: freeDirections === 0 ? null : (hold ?? 'the point, as near as its family allows'),
    residual: residual.toExponential(1),
    flows,
    engine: ENGINE_VERSION,
  };
}

function failureOf(error: unknown): RefinementFailure {
  if (error instanceof StoppedRun) return tooLong;
  if (error instanceof NoConvergence) return notConverged;
  if (!(error instanceof RangeError)) throw error;
  return {
    ok: false,
    reason: 'out-of-domain',
    message: `With many digits the field is not defined along the orbit: ${error.message}.`,
  };
}

const notClosed: RefinementFailure = {
  ok: false,
  reason: 'not-closed',
  message: 'In double precision no orbit closes here from which more digits could be found.',
};

const tooLong: RefinementFailure = {
  ok: false,
  reason: 'too-long',
  message: 'The time for this computation was over before the digits were found.',
};

const notConverged: RefinementFailure = {
  ok: false,
  reason: 'not-converged',
  message: 'The corrections do not fall as they must: more digits than doubles have could not be confirmed.',
};
