import type { OrbitFilter } from '@/features/api/orbits';
import { EVIDENCE_LEVELS, type SearchTerm } from '@/features/catalogue/search-term';

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
      return { returns: term.min === term.max ? term.min : `${term.min}..${term.max}` };
    case 'itinerary':
      return { itinerary: term.value };
    case 'contains':
      return { itineraryContains: term.value };
    case 'stability':
      return { stability: term.values.join(',') };
    case 'evidence':
      return { evidence: levelsFrom(term.value).join(',') };
    case 'near':
      return { near: term.point.join(',') };
    case 'words':
      return { text: before.text ? `${before.text} ${term.value}` : term.value };
    case 'accession':
      return {};
  }
}

/** A level of evidence and every stronger one. */
const levelsFrom = (least: string): string[] =>
  EVIDENCE_LEVELS.slice(
    Math.max(
      0,
      EVIDENCE_LEVELS.findIndex((level) => level === least),
    ),
  );
