import type { OrbitPage } from '@/schemas/generated/contract';
import { presentEntry } from '@/server/presenters/entry';
import type { FoundPage } from '@/server/services/search-orbits';

interface PageParts {
  next: string | null;
  withIncipits: boolean;
  withDistances: boolean;
}

/** One page of a search as the API shows it. */
export const presentOrbitPage = (
  { rows, total, upToSymmetry }: FoundPage,
  { next, withIncipits, withDistances }: PageParts,
): OrbitPage => ({
  items: rows.map(presentEntry),
  next,
  total,
  upToSymmetry,
  incipits: withIncipits ? Object.fromEntries(rows.map(({ accession, incipit }) => [accession, incipit])) : null,
  distances: withDistances
    ? Object.fromEntries(rows.flatMap(({ accession, distance }) => (distance === null ? [] : [[accession, distance]])))
    : null,
});
