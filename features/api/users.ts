import { infiniteQueryOptions, useInfiniteQuery, useMutation, useQueryClient } from '@tanstack/react-query';
import type { User, UserChange, UserPage } from '@/schemas/generated/contract';
import { getJson, patchJson } from '@/features/api/client';

const root = ['user'] as const;

/** Accounts of one page: the list is short, and is searched here. */
const PAGE_SIZE = 200;

const userQueries = {
  root,
  list: () =>
    infiniteQueryOptions({
      queryKey: [...root, 'list'] as const,
      queryFn: ({ pageParam, signal }) =>
        getJson<UserPage>('/users', { query: { limit: PAGE_SIZE, after: pageParam }, signal }),
      initialPageParam: '',
      getNextPageParam: (page) => page.next,
    }),
};

const holds = (user: User, text: string): boolean =>
  [user.name, user.email].some((part) => part.toLowerCase().includes(text.trim().toLowerCase()));

/** Accounts, page after page, whose name or e-mail holds the words; administrators only. */
export const useUsers = (text = '') =>
  useInfiniteQuery({
    ...userQueries.list(),
    select: (data) => ({
      ...data,
      pages: data.pages.map((page) => ({ ...page, items: page.items.filter((user) => holds(user, text)) })),
    }),
  });

/** Set an account's role. */
export function useChangeUser() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: ({ id, change }: { id: string; change: UserChange }) =>
      patchJson<User>(`/users/${encodeURIComponent(id)}`, change),
    onSuccess: () => cache.invalidateQueries({ queryKey: root }),
  });
}
