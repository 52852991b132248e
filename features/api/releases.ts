import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { Release, ReleaseList } from '@/schemas/generated/contract';
import { getJson, idempotencyHeader, newIdempotencyKey, postJson } from '@/features/api/client';

const root = ['release'] as const;

/** A release that is being cut is looked at again this often. */
const CUTTING_MS = 2_000;

const releaseQueries = {
  root,
  list: () =>
    queryOptions({
      queryKey: [...root, 'list'] as const,
      queryFn: async ({ signal }) => (await getJson<ReleaseList>('/releases', { signal })).items,
      refetchInterval: ({ state }) => (state.data?.some(isCutting) ? CUTTING_MS : false),
    }),
};

export const isCutting = ({ state }: Release): boolean => state === 'cutting';

/** All releases, the newest first. */
export const useReleases = () => useQuery(releaseQueries.list());

/** Have a release cut; curators only. */
export function useCutRelease() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (note: string) =>
      postJson<Release>('/releases', { note }, { headers: idempotencyHeader(newIdempotencyKey()) }),
    onSettled: () => cache.invalidateQueries({ queryKey: root }),
  });
}
