import { EVIDENCE_LEVELS, type SearchTerm } from '@/features/catalogue/search-term';

/** What the filter fields show of a search line; empty where it says nothing. */
export interface FilterValues {
  /** One period, to its digits. */
  rounded: string;
  periodFrom: string;
  periodTo: string;
  returnsFrom: string;
  returnsTo: string;
  contains: string;
  stability: string[];
  evidence: string;
  near: string;
}

export function filterValues(terms: readonly SearchTerm[]): FilterValues {
  const values: FilterValues = {
    rounded: '',
    periodFrom: '',
    periodTo: '',
    returnsFrom: '',
    returnsTo: '',
    contains: '',
    stability: [],
    evidence: EVIDENCE_LEVELS[0],
    near: '',
  };
  for (const term of terms) Object.assign(values, valuesOf(term));
  return values;
}

function valuesOf(term: SearchTerm): Partial<FilterValues> {
  switch (term.kind) {
    case 'period':
      return { rounded: term.value };
    case 'period-range':
      return { periodFrom: term.min ?? '', periodTo: term.max ?? '' };
    case 'returns':
      return { returnsFrom: term.min, returnsTo: term.max };
    case 'contains':
      return { contains: term.value };
    case 'stability':
      return { stability: term.values };
    case 'evidence':
      return { evidence: term.value };
    case 'near':
      return { near: term.point.join(', ') };
    case 'system':
    case 'parameter':
    case 'itinerary':
    case 'accession':
    case 'words':
      return {};
  }
}
