import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type {
  AcceptedAnswer,
  Confirmation,
  PasswordForgot,
  PasswordReset,
  Registration,
  Role,
  Session,
  SignIn,
  User,
} from '@/schemas/generated/contract';
import { deleteJson, getJson, postJson, requestJson } from '@/features/api/client';

/** What waits on the Desk is asked for again after this long. */
const FRESH_MS = 60_000;

export const sessionQuery = () =>
  queryOptions({
    queryKey: ['session'] as const,
    queryFn: ({ signal }) => getJson<Session>('/session', { signal }),
    staleTime: FRESH_MS,
    refetchInterval: FRESH_MS,
    refetchOnWindowFocus: true,
  });

/** Who am I, and what waits for me. */
export const useSession = () => useQuery(sessionQuery());

/** The person signed in; null for a reader without account and while that is not known yet. */
export const useUser = (): User | null => useSession().data?.user ?? null;

const ranks: Record<Role, number> = { reader: 0, contributor: 1, curator: 2, administrator: 3 };

/** Whether a role includes another. */
export const hasRole = (user: User | null, role: Role): boolean => user !== null && ranks[user.role] >= ranks[role];

/** Sign in; everything cached before belonged to somebody else and is asked for again. */
export function useSignIn() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: SignIn) => postJson<Session>('/session', body),
    onSuccess: async (session) => {
      cache.removeQueries({ predicate: (query) => isPersonal(query.queryKey) });
      cache.setQueryData(sessionQuery().queryKey, session);
      await cache.invalidateQueries({ queryKey: sessionQuery().queryKey });
    },
  });
}

/** Turn the daily mail about new submissions on or off. */
export function useChangeDigest() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: async (digest: boolean) =>
      (await requestJson<Session>('/session', { method: 'PATCH', body: { digest } })).data,
    onSuccess: (session) => cache.setQueryData(sessionQuery().queryKey, session),
  });
}

/** Sign out and forget what only this person may see. */
export function useSignOut() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: () => deleteJson<Session | undefined>('/session'),
    onSuccess: async () => {
      cache.removeQueries({ predicate: (query) => isPersonal(query.queryKey) });
      await cache.resetQueries({ queryKey: sessionQuery().queryKey });
    },
  });
}

const isPersonal = (key: readonly unknown[]): boolean =>
  key[0] === 'submission' || key[0] === 'user' || key[0] === 'check';

export const useRegister = () =>
  useMutation({ mutationFn: (body: Registration) => postJson<AcceptedAnswer>('/users', body) });

export function useConfirm() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: Confirmation) => postJson<unknown>('/users/confirm', body),
    onSuccess: () => cache.invalidateQueries({ queryKey: sessionQuery().queryKey }),
  });
}

export const useForgotPassword = () =>
  useMutation({ mutationFn: (body: PasswordForgot) => postJson<AcceptedAnswer>('/password/forgot', body) });

export function useResetPassword() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (body: PasswordReset) => postJson<unknown>('/password/reset', body),
    onSuccess: () => cache.invalidateQueries({ queryKey: sessionQuery().queryKey }),
  });
}
