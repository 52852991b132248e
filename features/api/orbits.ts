import {
  infiniteQueryOptions,
  keepPreviousData,
  queryOptions,
  useInfiniteQuery,
  useQuery,
} from '@tanstack/react-query';
import type { Entry, EntryImage, EntryRevision, OrbitPage, System, Trace } from '@/schemas/generated/contract';
import { apiAddress, getJson, getText, type Query } from '@/features/api/client';

/** What a catalogue search can ask for, under the names of the API. Every field is part of the cache key. */
export interface OrbitFilter {
  system?: string;
  parameters?: Record<string, string>;
  /** A period to the digits given. */
  period?: string;
  periodMin?: string;
  periodMax?: string;
  returns?: string;
  stability?: string;
  itinerary?: string;
  /** Letters that stand in the itinerary. */
  itineraryContains?: string;
  evidence?: string;
  text?: string;
  /** Coordinates, separated by commas. */
  near?: string;
  sort?: string;
}

export type ExportFormat = 'json' | 'ndjson' | 'csv';

/** Points of the polyline that a figure draws. */
const TRACE_POINTS = 2000;
/** Results on one page of a search. */
const PAGE_SIZE = 25;
/** The most entries that the API gives in one answer. */
const LARGEST_PAGE = 200;
const SEARCH_FRESH_MS = 60_000;

/** A filter as query parameters of the API. */
function filterQuery(filter: OrbitFilter): Query {
  const { parameters = {}, ...rest } = filter;
  const named = Object.entries(parameters).map(([name, value]) => [`parameters[${name}]`, value] as const);
  return { ...rest, ...Object.fromEntries(named) };
}

/** The address of an export of exactly this result. */
export const exportAddress = (filter: OrbitFilter, format: ExportFormat): string =>
  apiAddress(`/orbits.${format}`, filterQuery(filter));

const pathOf = (accession: string): string => `/orbits/${encodeURIComponent(accession)}`;

/** The ends of the addresses under which one entry is a file. */
export type EntryFile = 'json' | 'csv' | 'bib' | 'csl.json' | 'ris';

/** The address of one entry as a file. */
export const entryAddress = (accession: string, file: EntryFile): string => apiAddress(`${pathOf(accession)}.${file}`);

const root = ['orbit'] as const;

export const orbitQueries = {
  root,

  /** Entries change only by a new revision or a withdrawal: a cached one stays fresh for the visit. */
  one: (accession: string) =>
    queryOptions({
      queryKey: [...root, 'one', accession] as const,
      queryFn: ({ signal }) => getJson<Entry>(pathOf(accession), { signal }),
      staleTime: Infinity,
    }),

  trace: (accession: string) =>
    queryOptions({
      queryKey: [...root, 'trace', accession] as const,
      queryFn: ({ signal }) =>
        getJson<Trace>(`${pathOf(accession)}/trace`, { query: { points: TRACE_POINTS }, signal }),
      staleTime: Infinity,
    }),

  revisions: (accession: string) =>
    queryOptions({
      queryKey: [...root, 'revisions', accession] as const,
      queryFn: ({ signal }) => getJson<{ items: EntryRevision[] }>(`${pathOf(accession)}/revisions`, { signal }),
      staleTime: Infinity,
    }),

  /** The sentence to cite, and the same as BibTeX. */
  /** The line to cite an entry by. */
  citationLine: (accession: string) =>
    queryOptions({
      queryKey: [...root, 'citation-line', accession] as const,
      queryFn: async ({ signal }) => (await getText(`${pathOf(accession)}.txt`, { signal })).trim(),
      staleTime: Infinity,
    }),

  citation: (accession: string) =>
    queryOptions({
      queryKey: [...root, 'citation', accession] as const,
      queryFn: async ({ signal }) => {
        const [sentence, bibtex] = await Promise.all(
          ['txt', 'bib'].map((suffix) => getText(`${pathOf(accession)}.${suffix}`, { signal })),
        );
        return { sentence: sentence!.trim(), bibtex: bibtex!.trim() };
      },
      staleTime: SEARCH_FRESH_MS,
    }),

  /** Another entry may become an image while one looks. */
  images: (accession: string) =>
    queryOptions({
      queryKey: [...root, 'images', accession] as const,
      queryFn: ({ signal }) => getJson<{ items: EntryImage[] }>(`${pathOf(accession)}/images`, { signal }),
      staleTime: SEARCH_FRESH_MS,
    }),

  search: (filter: OrbitFilter) =>
    infiniteQueryOptions({
      queryKey: [...root, 'search', filter] as const,
      queryFn: ({ pageParam, signal }) =>
        getJson<OrbitPage>('/orbits', {
          query: { ...filterQuery(filter), include: 'incipit', limit: PAGE_SIZE, after: pageParam },
          signal,
        }),
      initialPageParam: '',
      getNextPageParam: (page) => page.next,
      staleTime: SEARCH_FRESH_MS,
    }),

  /** As many entries as one answer holds, without incipits: for pictures of many. */
  many: (filter: OrbitFilter) =>
    queryOptions({
      queryKey: [...root, 'many', filter] as const,
      queryFn: ({ signal }) =>
        getJson<OrbitPage>('/orbits', { query: { ...filterQuery(filter), limit: LARGEST_PAGE }, signal }),
      staleTime: SEARCH_FRESH_MS,
    }),

  /** A few entries, for a list inside a page. */
  few: (filter: OrbitFilter, limit: number) =>
    queryOptions({
      queryKey: [...root, 'few', filter, limit] as const,
      queryFn: ({ signal }) =>
        getJson<OrbitPage>('/orbits', { query: { ...filterQuery(filter), include: 'incipit', limit }, signal }),
      staleTime: SEARCH_FRESH_MS,
    }),
};

/** One entry, by its accession. */
export const useOrbit = (accession: string, enabled = true) => useQuery({ ...orbitQueries.one(accession), enabled });

/** The polyline of one entry. */
export const useOrbitTrace = (accession: string) => useQuery(orbitQueries.trace(accession));

/** The line to cite an entry by. */
export const useCitationLine = (accession: string) => useQuery(orbitQueries.citationLine(accession));

/** How to cite an entry; fetched when somebody wants to. */
export const useCitation = (accession: string, enabled: boolean) =>
  useQuery({ ...orbitQueries.citation(accession), enabled });

export const useOrbitRevisions = (accession: string) => useQuery(orbitQueries.revisions(accession));

/** Entries that are an entry's images under symmetries of its system. */
export const useOrbitImages = (accession: string) => useQuery(orbitQueries.images(accession));

/** The catalogue, page after page, under a filter; the former result stays while a new one is on its way. */
export const useOrbitSearch = (filter: OrbitFilter, enabled = true) =>
  useInfiniteQuery({ ...orbitQueries.search(filter), placeholderData: keepPreviousData, enabled });

/** A few entries under a filter; `enabled` holds it back until the filter is known. */
export const useFewOrbits = (filter: OrbitFilter, limit: number, enabled = true) =>
  useQuery({ ...orbitQueries.few(filter, limit), enabled });

/** As many entries as one answer holds, without incipits; `enabled` holds it back until the filter is known. */
export const useEntriesOf = (filter: OrbitFilter, enabled = true) =>
  useQuery({ ...orbitQueries.many(filter), enabled });

/** The entries of a system with its own parameters, for a picture of their crossings. */
export const useAllCrossings = ({ slug, document }: Pick<System, 'slug' | 'document'>) =>
  useEntriesOf({
    system: slug,
    parameters: Object.fromEntries(document.parameters.map(({ name, value }) => [name, String(value)])),
  });
