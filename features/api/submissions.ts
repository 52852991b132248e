import {
  infiniteQueryOptions,
  queryOptions,
  useInfiniteQuery,
  useMutation,
  useQuery,
  useQueryClient,
} from '@tanstack/react-query';
import type { Decision, DraftBody, Submission, SubmissionPage } from '@/schemas/generated/contract';
import { deleteJson, getJson, idempotencyHeader, requestJson, type Tagged } from '@/features/api/client';
import { orbitQueries } from '@/features/api/orbits';
import { sessionQuery } from '@/features/api/session';
import { systemQueries } from '@/features/api/systems';

/** A submission that the machine works on is asked for again after this long. */
const WORKING_POLL_MS = 1500;
/** The queue follows what others do. */
const QUEUE_POLL_MS = 30_000;

const root = ['submission'] as const;
const pathOf = (id: string, more = '') => `/submissions/${encodeURIComponent(id)}${more}`;

const isWorking = (submission: Pick<Submission, 'checkState'>): boolean =>
  submission.checkState === 'queued' || submission.checkState === 'running';

export const submissionQueries = {
  root,

  list: (queue: 'mine' | 'review' | 'returned') =>
    infiniteQueryOptions({
      queryKey: [...root, 'list', queue] as const,
      queryFn: ({ pageParam, signal }) =>
        getJson<SubmissionPage>('/submissions', {
          query: { ...(queue === 'mine' ? {} : { queue }), after: pageParam },
          signal,
        }),
      initialPageParam: '',
      getNextPageParam: (page) => page.next,
      staleTime: 0,
      refetchInterval: ({ state }) =>
        state.data?.pages.some((page) => page.items.some(isWorking)) ? WORKING_POLL_MS : QUEUE_POLL_MS,
    }),

  one: (id: string) =>
    queryOptions({
      queryKey: [...root, 'one', id] as const,
      queryFn: ({ signal }) => requestJson<Submission>(pathOf(id), { signal }),
      staleTime: 0,
      refetchInterval: ({ state }) => (state.data && isWorking(state.data.data) ? WORKING_POLL_MS : false),
    }),
};

/** My submissions, newest change first. */
export const useMySubmissions = (enabled = true) => useInfiniteQuery({ ...submissionQueries.list('mine'), enabled });

/** Those to review; curators only. */
export const useReviewQueue = (enabled = true) => useInfiniteQuery({ ...submissionQueries.list('review'), enabled });

/** Those that a curator sent back and that wait for their contributors; curators only. */
export const useReturnedSubmissions = (enabled = true) =>
  useInfiniteQuery({ ...submissionQueries.list('returned'), enabled });

/** One submission with the ETag that its changes need. */
export const useSubmission = (id: string) => useQuery(submissionQueries.one(id));

/** What a change needs: the submission, and the ETag it was read under. */
interface Versioned {
  id: string;
  etag: string | null;
}

const ifMatch = (etag: string | null): Record<string, string> => (etag === null ? {} : { 'If-Match': etag });

/** A mutation whose answer is the submission as it now stands: keep it, and refresh every list it appears in. */
function useSubmissionChange<V>(change: (variables: V) => Promise<Tagged<Submission>>) {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: change,
    onSuccess: (answer) => {
      cache.setQueryData(submissionQueries.one(answer.data.id).queryKey, answer);
      void cache.invalidateQueries({ queryKey: [...root, 'list'] });
      void cache.invalidateQueries({ queryKey: sessionQuery().queryKey });
    },
  });
}

const post = (path: string, body?: unknown, headers: Record<string, string> = {}) =>
  requestJson<Submission>(path, { method: 'POST', body, headers });

/** Keep a draft, or send it at once. One `key` for one intention makes a repeated attempt harmless. */
export const useCreateSubmission = () =>
  useSubmissionChange(({ body, send, key }: { body: DraftBody; send?: boolean; key: string }) =>
    post('/submissions', send ? { ...body, send } : body, idempotencyHeader(key)),
  );

/** Replace the body of a draft or a returned submission. */
export const useChangeSubmission = () =>
  useSubmissionChange(({ id, etag, body }: Versioned & { body: DraftBody }) =>
    requestJson<Submission>(pathOf(id), { method: 'PATCH', body, headers: ifMatch(etag) }),
  );

/** Send a draft or a returned submission: starts the check of exactly this revision. */
export const useSendSubmission = () =>
  useSubmissionChange(({ id, etag }: Versioned) => post(pathOf(id, '/send'), undefined, ifMatch(etag)));

export const useClaimSubmission = () =>
  useSubmissionChange(({ id, takeOver }: { id: string; takeOver?: boolean }) =>
    post(pathOf(id, '/claim'), takeOver ? { takeOver } : {}),
  );

/** Give a claim back. */
export function useReleaseSubmission() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: ({ id }: { id: string }) => deleteJson<unknown>(pathOf(id, '/claim')),
    onSuccess: () => cache.invalidateQueries({ queryKey: root }),
  });
}

/** Accept, return or decline; needs the ETag of what was read. An accepted orbit changes the catalogue. */
export function useDecideSubmission() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: ({ id, etag, decision }: Versioned & { decision: Decision }) =>
      post(pathOf(id, '/decision'), decision, ifMatch(etag)),
    onSuccess: (answer) => {
      cache.setQueryData(submissionQueries.one(answer.data.id).queryKey, answer);
      void cache.invalidateQueries({ queryKey: [...root, 'list'] });
      void cache.invalidateQueries({ queryKey: sessionQuery().queryKey });
      void cache.invalidateQueries({ queryKey: orbitQueries.root });
      void cache.invalidateQueries({ queryKey: systemQueries.root });
    },
  });
}

export const useWithdrawSubmission = () =>
  useSubmissionChange(({ id, comment }: { id: string; comment?: string }) =>
    post(pathOf(id, '/withdraw'), comment ? { comment } : {}),
  );

/** Check the current revision again. */
export const useRecheckSubmission = () =>
  useSubmissionChange(({ id }: { id: string }) => post(pathOf(id, '/recheck'), {}));

/** Say something in the discussion. */
export function useCommentSubmission() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: ({ id, text }: { id: string; text: string }) =>
      requestJson<unknown>(pathOf(id, '/comments'), { method: 'POST', body: { text } }),
    onSuccess: (_answer, { id }) => cache.invalidateQueries({ queryKey: submissionQueries.one(id).queryKey }),
  });
}
