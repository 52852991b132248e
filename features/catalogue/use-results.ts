import { isRefusal } from '@/features/api/api-error';
import { useOrbit, useOrbitSearch, type OrbitFilter } from '@/features/api/orbits';
import type { Entry, OrbitPage } from '@/schemas/generated/contract';

export interface Results {
  isPending: boolean;
  /** A former result stands while a new one is on its way. */
  isOld: boolean;
  error: Error | null;
  /** The accession that was asked for belongs to no entry. */
  isUnknown: boolean;
  items: Entry[];
  total: OrbitPage['total'];
  upToSymmetry: OrbitPage['upToSymmetry'];
  incipits: Record<string, number[][]>;
  distances: Record<string, number>;
  hasMore: boolean;
  isLoadingMore: boolean;
  more: () => void;
  retry: () => void;
}

const NOTHING: OrbitPage['total'] = { value: 0, relation: 'exact' };

/** What a search finds. An accession is looked up by itself: everything else in the line is then left aside. */
export function useResults(filter: OrbitFilter, accession: string | null, enabled: boolean): Results {
  const search = useOrbitSearch(filter, enabled && accession === null);
  const entry = useOrbit(accession ?? '', enabled && accession !== null);
  if (accession !== null) {
    const items = entry.data ? [entry.data] : [];
    return {
      ...EMPTY,
      isPending: entry.isPending,
      error: entry.error,
      isUnknown: isRefusal(entry.error, 'unknown-accession', 'wrong-check-character'),
      items,
      total: { value: items.length, relation: 'exact' },
      retry: () => void entry.refetch(),
    };
  }
  const pages = search.data?.pages ?? [];
  return {
    isPending: search.isPending,
    isOld: search.isPlaceholderData,
    error: search.isFetchNextPageError ? null : search.error,
    isUnknown: false,
    items: pages.flatMap((page) => page.items),
    total: pages[0]?.total ?? NOTHING,
    upToSymmetry: pages[0]?.upToSymmetry ?? null,
    incipits: Object.assign({}, ...pages.map((page) => page.incipits)) as Record<string, number[][]>,
    distances: Object.assign({}, ...pages.map((page) => page.distances)) as Record<string, number>,
    hasMore: search.hasNextPage,
    isLoadingMore: search.isFetchingNextPage,
    more: () => void search.fetchNextPage(),
    retry: () => void search.refetch(),
  };
}

const EMPTY: Results = {
  isPending: true,
  isOld: false,
  error: null,
  isUnknown: false,
  items: [],
  total: NOTHING,
  upToSymmetry: null,
  incipits: {},
  distances: {},
  hasMore: false,
  isLoadingMore: false,
  more: () => undefined,
  retry: () => undefined,
};
