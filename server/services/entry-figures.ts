import type { CheckedOrbit, CheckReport, Entry, SubmissionBody } from '@/schemas/generated/contract';
import { DIGITS_OF_DOUBLES } from '@/server/checks/refine-orbit';
import { sizesOf } from '@/server/checks/same-crossings';
import type { CheckedSystem } from '@/server/formulas/checked-system';
import type { EntryContent } from '@/server/models/orbit-revision';
import { numberOf } from '@/server/services/parameters-of';

/** A report of an orbit that closes. */
export type ClosedReport = CheckReport & { orbit: CheckedOrbit; closure: NonNullable<CheckReport['closure']> };

/** Largest modulus that is stored: beyond it a double has no number left. */
const LARGEST = Number.MAX_VALUE;

/** What an entry's revision says, from the report of the submission that became it. */
export const entryContent = (report: ClosedReport, submitted: SubmissionBody): EntryContent => {
  const { orbit } = report;
  return {
    point: orbit.point,
    period: orbit.period,
    returnTimes: orbit.crossings.map(({ returnTime }) => returnTime),
    crossings: orbit.crossings.map(({ time, point, transversality }) => ({ time, point, transversality })),
    multipliers: orbit.multipliers,
    unitMultipliers: orbit.unitMultipliers,
    exponents: orbit.exponents,
    unstableDirections: orbit.unstableDirections,
    smallestTransversality: orbit.smallestTransversality,
    extent: orbit.extent,
    invariants: orbit.invariants.map(({ name, value }) => ({ name, value })),
    closure: report.closure,
    correction: report.correction,
    verdict: report.verdict,
    findings: report.findings,
    submitted,
    note: submitted.note ?? null,
    engine: report.engine.version,
    ...(evidenceOf(report).evidence === 'refined' && { refinement: { held: heldIn(report), residual: null } }),
  };
};

/** What the check held, where the orbit belongs to a family. */
const heldIn = ({ correction }: ClosedReport): string | null =>
  correction !== null && correction.freeDirections > 0 ? correction.held : null;

/** How a report knows its figures: to more digits than doubles hold, they were refined. */
export function evidenceOf({ digits }: ClosedReport): { evidence: Entry['evidence']['level']; digits: number } {
  const confirmed = digits?.confirmed ?? 0;
  return { evidence: confirmed > DIGITS_OF_DOUBLES ? 'refined' : 're-integrated', digits: confirmed };
}

/** Modulus of the largest multiplier; 0 for an orbit of one variable, which has none. */
export function largestModulus({ multipliers }: CheckedOrbit): number {
  const [largest] = multipliers;
  return largest ? Math.min(LARGEST, Math.hypot(numberOf(largest.re).value, numberOf(largest.im).value)) : 0;
}

/** Sizes of an orbit's coordinates, which become its system's units when it is the first entry. */
export const orbitExtents = (orbit: CheckedOrbit, { variables }: CheckedSystem): number[] =>
  Array.from(
    sizesOf(
      orbit,
      variables.map(({ modulus }) => modulus),
    ),
  );

/** A crossing's place as a `cube`: in units of the system, angles reduced to one turn. */
export function crossingPlace(
  point: readonly number[],
  extents: readonly number[],
  { variables }: CheckedSystem,
): string {
  const coordinates = point.map((value, i) => {
    const modulus = variables[i]?.modulus ?? null;
    return (modulus === null ? value : value - modulus * Math.floor(value / modulus)) / extents[i]!;
  });
  return `(${coordinates.join(', ')})`;
}
