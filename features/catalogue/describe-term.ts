import { mathName } from '@/features/notation/math-name';
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
      return { name: `parameter ${mathName(term.name)}`, value: term.value, mono: true };
    case 'period':
      return { name: 'period', value: `${term.value}, rounded`, mono: true };
    case 'period-range':
      return { name: 'period', value: rangeWords(term.min, term.max), mono: true };
    case 'near':
      return { name: 'near', value: term.point.join(', ').replaceAll('-', '−'), mono: true };
    case 'returns':
      return { name: 'returns', value: term.min === term.max ? term.min : `${term.min} to ${term.max}`, mono: true };
    case 'contains':
      return { name: 'itinerary contains', value: term.value, mono: true };
    case 'itinerary':
    case 'accession':
      return { name: term.kind, value: term.value, mono: true };
    case 'stability':
      return { name: 'stability', value: term.values.join(' or '), mono: false };
    case 'evidence':
      return { name: 'evidence, at least', value: term.value, mono: false };
    case 'words':
      return { name: 'words', value: term.value, mono: false };
  }
}

/** A term in running text: "9 returns", "period 6.6 to 6.75". */
export function termInText(term: SearchTerm): string {
  const { name, value } = describeTerm(term);
  if (term.kind === 'returns') return `${value} ${value === '1' ? 'return' : 'returns'}`;
  return term.kind === 'system' || term.kind === 'words' ? value : `${name} ${value}`;
}

/** "6.6 to 6.75", "from 6.6", "up to 6.75". */
function rangeWords(min: string | null, max: string | null): string {
  if (min === null) return max === null ? '' : `up to ${max}`;
  return max === null ? `from ${min}` : `${min} to ${max}`;
}
