import { queryOptions, useQuery, useQueryClient } from '@tanstack/react-query';
import type { System, SystemList } from '@/schemas/generated/contract';
import { getJson } from '@/features/api/client';

/** Definitions change seldom; their counts may be a few minutes old. */
const FRESH_MS = 300_000;

const root = ['system'] as const;

export const systemQueries = {
  root,
  all: () =>
    queryOptions({
      queryKey: [...root, 'all'] as const,
      queryFn: ({ signal }) => getJson<SystemList>('/systems', { signal }),
      select: (list) => list.items,
      staleTime: FRESH_MS,
    }),
  one: (slug: string) =>
    queryOptions({
      queryKey: [...root, 'one', slug] as const,
      queryFn: ({ signal }) => getJson<System>(`/systems/${encodeURIComponent(slug)}`, { signal }),
      staleTime: FRESH_MS,
    }),
};

/** All systems. */
export const useSystems = () => useQuery(systemQueries.all());

/** One system, by its name in addresses; what the list says of it stands until its own answer is there. */
export function useSystem(slug: string, enabled = true) {
  const cache = useQueryClient();
  const listed = () => cache.getQueryData(systemQueries.all().queryKey)?.items.find((system) => system.slug === slug);
  return useQuery({ ...systemQueries.one(slug), enabled, placeholderData: listed });
}
