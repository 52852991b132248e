import type { CheckRequest } from '@/schemas/generated/contract';
import { builtInSystems } from '@/server/systems/built-in-systems';
import { builtInOf, sectionFormula } from '@/tests/reference/built-in-of';
import { caseDocument } from '@/tests/reference/case-document';
import type { ReferenceCase } from '@/tests/reference/reference-case';
import { roundDecimal } from '@/tests/reference/round-decimal';

/** Digits that a double holds. */
const DOUBLE_DIGITS = 17;

export interface CaseRequest {
  /** Slug of the built-in system that the body names, or null where it carries a document of its own. */
  slug: string | null;
  /** The body of a check or, with a slug, of a submission: at most 17 significant digits. */
  body: CheckRequest;
  /** The same numbers with all digits of the case. */
  exact: { point: string[]; period: string; returnTimes: string[] | null };
}

/** Coordinates in the order of the variables; what is missing is left out and what is unknown stands at the end. */
function coordinates({ system, point }: ReferenceCase): string[] {
  const known = system.variables.filter((name) => name in point);
  const unknown = Object.keys(point).filter((name) => !system.variables.includes(name));
  return [...known, ...unknown].map((name) => point[name]!);
}

/** All multipliers of a case are given, the submission's leave out the trivial one. */
function withoutTrivial(multipliers: string[]): string[] {
  const trivial = multipliers.indexOf('1');
  return multipliers.filter((_, i) => i !== trivial);
}

/** Has the section letters, so that an itinerary can be claimed? */
function hasLetters(slug: string, section: string): boolean {
  const sections = builtInSystems.find((system) => system.slug === slug)?.sections ?? [];
  return (sections.find(({ name }) => name === section)?.letters ?? []).length > 0;
}

/**
 * A reference case as the body of a check: against the built-in system where the case is an instance of one, else
 * (or with `inline`) against a document of its own.
 */
export function caseRequest(reference: ReferenceCase, { inline = false } = {}): CaseRequest {
  const builtIn = inline ? null : builtInOf(reference);
  const section = builtIn?.section ?? { formula: sectionFormula(reference) };
  const exact = {
    point: coordinates(reference),
    period: reference.period,
    returnTimes: reference.claims?.return_times ?? reference.return_times ?? null,
  };
  const round = (text: string) => roundDecimal(text, DOUBLE_DIGITS);
  const returns = reference.claims?.crossings_directed ?? reference.crossings?.directed;
  const multipliers = reference.claims?.multipliers;
  const lettered = builtIn?.section ? hasLetters(builtIn.slug, builtIn.section) : false;

  const body: CheckRequest = {
    system: builtIn ? builtIn.slug : caseDocument(reference),
    ...(builtIn && { parameters: builtIn.parameters }),
    section,
    point: exact.point.map(round),
    ...(returns !== undefined && returns > 0 && { returns }),
    period: round(exact.period),
    ...(exact.returnTimes && exact.returnTimes.length > 0 && { returnTimes: exact.returnTimes.map(round) }),
    ...(lettered && reference.symbols !== undefined && { itinerary: reference.symbols }),
    ...(multipliers && { multipliers: withoutTrivial(multipliers) }),
  };
  return { slug: builtIn?.slug ?? null, body, exact };
}
