import type { OrbitFilter } from '@/features/api/orbits';
import type { SearchTerm } from '@/features/catalogue/search-term';

/** What the terms of a search line ask of the catalogue. */
export function searchFilter(terms: readonly SearchTerm[], sort?: string): OrbitFilter {
  const filter: OrbitFilter = {};
  for (const term of terms) Object.assign(filter, partOf(term, filter));
  return sort ? { ...filter, sort } : filter;
}

function partOf(term: SearchTerm, before: OrbitFilter): OrbitFilter {
  switch (term.kind) {
    case 'system':
      return { system: term.slug };
    case 'parameter':
      return { parameters: { ...before.parameters, [term.name]: term.value } };
    case 'period':
      return { period: term.value };
    case 'period-range':
      return {
        ...(term.min === null ? {} : { periodMin: term.min }),
        ...(term.max === null ? {} : { periodMax: term.max }),
      };
    case 'returns':
      return { returns: term.value };
    case 'itinerary':
      return { itinerary: term.value };
    case 'stability':
      return { stability: term.value };
    case 'evidence':
      return { evidence: term.value };
    case 'near':
      return { near: term.point.join(',') };
    case 'words':
      return { text: before.text ? `${before.text} ${term.value}` : term.value };
    case 'accession':
      return {};
  }
}
