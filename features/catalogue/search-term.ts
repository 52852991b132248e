/** Where in the search line a term was read: characters `start` to `end`, the end not included. */
interface Span {
  start: number;
  end: number;
}

/** What one part of the search line was understood as. */
export type SearchTerm = Span &
  (
    | { kind: 'system'; slug: string; name: string }
    | { kind: 'parameter'; name: string; value: string }
    /** Every period that rounds to these digits. */
    | { kind: 'period'; value: string }
    | { kind: 'period-range'; min: string | null; max: string | null }
    | { kind: 'returns'; min: string; max: string }
    /** The whole itinerary, up to cyclic shift. */
    | { kind: 'itinerary'; value: string }
    /** Letters that stand somewhere in the itinerary. */
    | { kind: 'contains'; value: string }
    | { kind: 'stability'; values: string[] }
    /** The least level of evidence. */
    | { kind: 'evidence'; value: string }
    | { kind: 'near'; point: string[] }
    | { kind: 'accession'; value: string }
    | { kind: 'words'; value: string }
  );

export type TermKind = SearchTerm['kind'];

/** What the parser needs to know of a system. */
export interface SearchableSystem {
  slug: string;
  name: string;
  parameters: string[];
  /** Every letter of its itineraries. */
  letters: string[];
}

/** Values of `stability` that a person may type. */
export const STABILITIES = ['stable', 'saddle', 'unstable', 'neutral', 'undecided'] as const;
/** Levels of evidence, the weakest first. */
export const EVIDENCE_LEVELS = ['re-integrated', 'refined', 'proved'] as const;
