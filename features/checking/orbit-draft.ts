import type { DraftBody, System } from '@/schemas/generated/contract';

/** The form of an orbit as typed: every member is text, nothing is converted. */
export interface OrbitDraft {
  system: string;
  /** Only what differs from the system's defaults. */
  parameters: Record<string, string>;
  /** A section's name, or a formula. */
  section: string;
  point: string[];
  period: string;
  returns: string;
  /** Separated by spaces. */
  returnTimes: string;
  itinerary: string;
  tolerance: string;
  /** Correct digits asked for. */
  digits: string;
  note: string;
  /** Members of the body that the form has no field for; they are sent as they came. */
  rest: Record<string, unknown>;
}

export const emptyDraft: OrbitDraft = {
  system: '',
  parameters: {},
  section: '',
  point: [],
  period: '',
  returns: '',
  returnTimes: '',
  itinerary: '',
  tolerance: '',
  digits: '',
  note: '',
  rest: {},
};

/** An empty form of one system: its first section is chosen. */
export const draftOfSystem = (system: System): OrbitDraft => ({
  ...emptyDraft,
  system: system.slug,
  section: system.sections[0]?.name ?? '',
  point: system.document.variables.map(() => ''),
});

const textOf = (value: unknown): string =>
  typeof value === 'string' ? value : typeof value === 'number' ? String(value) : '';
const listOf = (value: unknown): unknown[] => (Array.isArray(value) ? value : []);

/** The form of a body; members that have no field, and values of an unexpected kind, go to `rest`. */
export function draftOfBody(body: DraftBody): OrbitDraft {
  const { system, parameters, section, point, period, returns, returnTimes, ...claims } = body;
  const { itinerary, tolerance, digits, note, ...rest } = claims;
  const given = typeof parameters === 'object' && parameters !== null ? Object.entries(parameters) : [];
  return {
    system: textOf(system),
    parameters: Object.fromEntries(given.map(([name, value]) => [name, textOf(value)])),
    section: sectionText(section),
    point: listOf(point).map(textOf),
    period: textOf(period),
    returns: textOf(returns),
    returnTimes: listOf(returnTimes).map(textOf).join(' '),
    itinerary: textOf(itinerary),
    tolerance: textOf(tolerance),
    digits: textOf(digits),
    note: textOf(note),
    rest: { ...rest, ...(isPlane(section) && { section }) },
  };
}

const isPlane = (section: unknown): boolean => typeof section === 'object' && section !== null && 'plane' in section;

function sectionText(section: unknown): string {
  if (typeof section === 'object' && section !== null && 'formula' in section) return textOf(section.formula);
  return textOf(section);
}

/**
 * The body that a form sends, as typed: empty members are left out.
 *
 * @param sectionNames names of the system's sections; any other text is a formula.
 */
export function bodyOfDraft(draft: OrbitDraft, sectionNames: readonly string[]): DraftBody {
  const { system, section, point, period, returns, itinerary, tolerance, digits, note, rest } = draft;
  const parameters = Object.fromEntries(Object.entries(draft.parameters).filter(([, value]) => value.trim() !== ''));
  const times = draft.returnTimes.split(/[\s,;]+/).filter((time) => time !== '');
  return {
    ...rest,
    ...(system && { system }),
    ...(Object.keys(parameters).length > 0 && { parameters }),
    ...(section.trim() && { section: sectionNames.includes(section) ? section : { formula: section.trim() } }),
    ...(point.some((coordinate) => coordinate.trim() !== '') && {
      point: point.map((coordinate) => coordinate.trim()),
    }),
    ...(returns.trim() && { returns: wholeNumber(returns) }),
    ...(period.trim() && { period: period.trim() }),
    ...(times.length > 0 && { returnTimes: times }),
    ...(itinerary.trim() && { itinerary: itinerary.trim() }),
    ...(tolerance.trim() && { tolerance: tolerance.trim() }),
    ...(digits.trim() && { digits: wholeNumber(digits) }),
    ...(note.trim() && { note }),
  };
}

/** A whole number as one; anything else stays as typed, and the server says what is wrong with it. */
const wholeNumber = (typed: string): number | string =>
  /^[0-9]{1,9}$/.test(typed.trim()) ? parseInt(typed, 10) : typed.trim();
