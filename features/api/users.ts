import { infiniteQueryOptions, useInfiniteQuery, useMutation, useQueryClient } from '@tanstack/react-query';
import type { User, UserChange, UserPage } from '@/schemas/generated/contract';
import { getJson, patchJson } from '@/features/api/client';

const root = ['user'] as const;

export const userQueries = {
  root,
  list: (text: string) =>
    infiniteQueryOptions({
      queryKey: [...root, 'list', text] as const,
      queryFn: ({ pageParam, signal }) => getJson<UserPage>('/users', { query: { text, after: pageParam }, signal }),
      initialPageParam: '',
      getNextPageParam: (page) => page.next,
    }),
};

/** Accounts, page after page; administrators only. */
export const useUsers = (text = '') => useInfiniteQuery(userQueries.list(text));

/** Set an account's role. */
export function useChangeUser() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: ({ id, change }: { id: string; change: UserChange }) =>
      patchJson<User>(`/users/${encodeURIComponent(id)}`, change),
    onSuccess: () => cache.invalidateQueries({ queryKey: root }),
  });
}
