import { useEffect, useRef } from 'react';
import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { getJson, idempotencyHeader, newIdempotencyKey, postJson } from '@/features/api/client';
import { orbitQueries } from '@/features/api/orbits';
import type { Refinement } from '@/schemas/generated/contract';

const root = ['refinement'] as const;

/** A refinement that waits or runs is looked at again this often. */
const UNDER_WAY_MS = 1_500;
const FRESH_MS = 60_000;

const pathOf = (accession: string): string => `/orbits/${encodeURIComponent(accession)}/refinements`;

const refinementQueries = {
  root,
  of: (accession: string) =>
    queryOptions({
      queryKey: [...root, accession] as const,
      queryFn: async ({ signal }) => (await getJson<{ items: Refinement[] }>(pathOf(accession), { signal })).items,
      staleTime: FRESH_MS,
      refetchInterval: ({ state }) => (state.data?.some(isUnderWay) ? UNDER_WAY_MS : false),
    }),
};

export const isUnderWay = ({ state }: Pick<Refinement, 'state'>): boolean => state === 'queued' || state === 'running';

/** What was tried to compute an entry to many digits, the newest first; the entry is read again when one is over. */
export function useRefinements(accession: string) {
  const cache = useQueryClient();
  const query = useQuery(refinementQueries.of(accession));
  const waiting = query.data?.filter(isUnderWay).length ?? 0;
  const before = useRef(0);
  useEffect(() => {
    if (waiting < before.current) void cache.invalidateQueries({ queryKey: orbitQueries.root });
    before.current = waiting;
  }, [cache, waiting]);
  return query;
}

/** Ask for an entry with many digits. */
export function useRefineOrbit(accession: string) {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (digits: number) =>
      postJson<Refinement>(pathOf(accession), { digits }, { headers: idempotencyHeader(newIdempotencyKey()) }),
    onSettled: () => cache.invalidateQueries({ queryKey: refinementQueries.of(accession).queryKey }),
  });
}
