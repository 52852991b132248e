import type { SearchTerm } from '@/features/catalogue/search-term';

export interface TermWords {
  /** What kind of thing was understood, such as "period". */
  name: string;
  value: string;
  /** The value is a number or code. */
  mono: boolean;
}

/** The words of a chip. */
export function describeTerm(term: SearchTerm): TermWords {
  switch (term.kind) {
    case 'system':
      return { name: 'system', value: term.name, mono: false };
    case 'parameter':
      return { name: `parameter ${term.name}`, value: term.value, mono: true };
    case 'period':
      return { name: 'period', value: `${term.value}, rounded`, mono: true };
    case 'period-range':
      return { name: 'period', value: rangeWords(term.min, term.max), mono: true };
    case 'near':
      return { name: 'near', value: term.point.join(', ').replaceAll('-', '−'), mono: true };
    case 'returns':
    case 'itinerary':
    case 'accession':
      return { name: term.kind, value: term.value, mono: true };
    case 'stability':
    case 'evidence':
    case 'words':
      return { name: term.kind, value: term.value, mono: false };
  }
}

/** "6.6 to 6.75", "from 6.6", "up to 6.75". */
export function rangeWords(min: string | null, max: string | null): string {
  if (min === null) return max === null ? '' : `up to ${max}`;
  return max === null ? `from ${min}` : `${min} to ${max}`;
}
