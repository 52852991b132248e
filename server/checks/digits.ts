import { type CheckReport, type Finding } from '@/schemas/generated/contract';
import { figure } from '@/server/checks/figure';
import { finding } from '@/server/checks/finding';
import { DIGITS_HALF_UNITS } from '@/server/checks/limits';
import { type RawRun, type Study } from '@/server/checks/study';
import { type Claim } from '@/server/checks/claim';
import { multiplyMatrices } from '@/server/numerics/linear/multiply-matrices';
import { periodDifferenceSize } from '@/server/numerics/periodic/period-difference-size';
import { scaleMatrix } from '@/server/numerics/periodic/scale-matrix';
import { type ShotSegment } from '@/server/numerics/periodic/shoot';
import { stateDifference } from '@/server/numerics/periodic/state-difference';

/** Growth of rounding over a run: 10 ulp ‖M‖ √steps. */
const ROUNDING_GROWTH = 10;

/** A raw closure up to this many times the expected one is what the digits let expect. */
const CLOSURE_AS_EXPECTED = 10;

/** An orbit that takes one segment only grows by less than 1e3: the end tells well enough where it goes. */
const UNSTABLE_SEGMENTS = 2;

/** Where more than this share of the extent is to be expected, the raw closure carries no information. */
const INFORMATIVE_CLOSURE = 0.1;

/** A double holds no more digits than this. */
const DIGITS_OF_DOUBLE = 16;

/**
 * Compute the raw closure, in sizes, that the digits as typed let expect: what half a unit of every last place and the
 * rounding of the run grow to over one period.
 *
 * @returns null where it cannot be computed or says nothing (beyond 1e300).
 */
export function expectedClosure(claim: Claim, raw: RawRun, segments: readonly ShotSegment[]): number | null {
  const n = raw.sizes.length;
  if (segments.length === 0 || segments.some(({ monodromy }) => monodromy === null)) return null;
  const whole = segments
    .map(({ monodromy }) => scaleMatrix(monodromy!, raw.sizes))
    .reduce((earlier, later) => multiplyMatrices(later, earlier, n, n));
  const rounding = ROUNDING_GROWTH * Number.EPSILON * Math.sqrt(raw.stepEnds.length);
  let largest = 0;
  for (let i = 0; i < n; i += 1) {
    let size = (Math.abs(raw.field[i]!) / raw.sizes[i]!) * claim.period.halfUnit;
    for (let j = 0; j < n; j += 1) {
      const entry = whole[i * n + j]!;
      const half = claim.point[j]!.halfUnit / raw.sizes[j]!;
      size += Math.abs(entry - (i === j ? 1 : 0)) * half + Math.abs(entry) * rounding;
    }
    largest = Math.max(largest, size);
  }
  return largest < 1e300 ? largest : null;
}

/** Digits of the orbit's extent that were typed, and that the correction confirms. */
export function digitsOf({ claim, raw, shifts, correction }: Study): CheckReport['digits'] {
  if (shifts === null) return null;
  const coarsest = Math.max(
    ...claim.point.map(({ halfUnit }, i) => halfUnit / raw.sizes[i]!),
    periodDifferenceSize(claim.period.halfUnit, claim.period.value, raw.field, raw.sizes),
  );
  const moved = Math.max(shifts.point, shifts.period, correction.residual);
  return { typed: digitsIn(coarsest), confirmed: digitsIn(moved) };
}

function digitsIn(share: number): number {
  if (!(share > 0)) return DIGITS_OF_DOUBLE;
  return Math.max(0, Math.min(DIGITS_OF_DOUBLE, Math.floor(-Math.log10(share))));
}

/** Whether an orbit lies within ten half-units of the digits as typed, or within the tolerance. */
export function isWithinDigits(
  claim: Claim,
  { field, sizes }: Pick<RawRun, 'field' | 'sizes'>,
  found: { point: Float64Array; period: number },
): boolean {
  const { tolerance, period } = claim;
  const typed = Float64Array.from(claim.point, ({ value }) => value);
  const { difference } = stateDifference(found.point, typed, claim.moduli);
  const pointFits = claim.point.every(({ halfUnit }, i) => {
    return Math.abs(difference[i]!) <= Math.max(DIGITS_HALF_UNITS * halfUnit, tolerance * sizes[i]!);
  });
  const late = found.period - period.value;
  const periodFits =
    Math.abs(late) <= DIGITS_HALF_UNITS * period.halfUnit ||
    periodDifferenceSize(late, period.value, field, sizes) <= tolerance;
  return pointFits && periodFits;
}

/** Whether an orbit that does not close is only typed with too few digits, and how many would do. */
export function tooFewDigits(study: Study): Finding[] {
  const { claim, raw, shifts, correction, verdict } = study;
  if (verdict !== 'does-not-close') return [];
  if (shifts === null || !correction.converged) return tooUnstable(study);
  if (!isWithinDigits(claim, raw, { point: correction.nodes[0]!, period: correction.period })) return [];
  const { tolerance } = claim;
  const shift = Math.max(shifts.point, shifts.period);
  const places = Math.max(...claim.point.map((_, i) => placesFor(tolerance * raw.sizes[i]!)));
  const perTime = periodDifferenceSize(1, claim.period.value, raw.field, raw.sizes);
  return [
    finding('too-few-digits', {
      message:
        `The digits as typed do not tell the orbit apart: the nearest one is ${figure(shift)} of the extent away, the ` +
        `tolerance is ${figure(tolerance)}. State the point to ${places} decimal places and the period to ` +
        `${placesFor(tolerance / perTime)}; the corrected orbit has them.`,
      value: shift,
      limit: tolerance,
    }),
  ];
}

/**
 * Say that an orbit which no correction was found for may well be one: that the end misses by no more than the digits let
 * expect, so that one point does not tell whether it closes.
 */
function tooUnstable({ claim, raw, correction, expectedClosure: expected }: Study): Finding[] {
  const { tolerance } = claim;
  if (claim.points !== null || correction.typed.length < UNSTABLE_SEGMENTS) return [];
  if (expected !== null && (expected <= tolerance || raw.relative > CLOSURE_AS_EXPECTED * expected)) return [];
  const grown = expected === null ? 'beyond measure' : `to ${figure(expected)} of the extent`;
  const isLost = expected === null || expected > INFORMATIVE_CLOSURE;
  const remedy = isLost
    ? 'State the section point of every return as well (points).'
    : 'State more digits, or the section point of every return as well (points).';
  return [
    finding('too-few-digits', {
      message:
        `The orbit is so unstable that what the digits leave open grows ${grown} in one period, and no correction was ` +
        `found from them: the end, ${figure(raw.relative)} of the extent away, does not tell whether it closes. ${remedy}`,
      value: expected,
      limit: tolerance,
    }),
  ];
}

/** Decimal places with which half a unit is at most the given difference. */
function placesFor(difference: number): number {
  return Math.max(0, Math.ceil(-Math.log10(2 * difference)));
}
