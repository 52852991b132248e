import { useEffect } from 'react';
import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { Check, CheckRequest, DraftBody, Trace } from '@/schemas/generated/contract';
import { apiAddress, getJson, idempotencyHeader, requestJson } from '@/features/api/client';

/** Without server-sent events a running check is asked for again after this long. */
const POLL_MS = 1000;
/** Points of the polyline that a figure draws. */
const TRACE_POINTS = 2000;

const root = ['check'] as const;
const pathOf = (id: string, more = '') => `/checks/${encodeURIComponent(id)}${more}`;

/** Whether the machine has nothing more to say. */
export const isOver = (check: Pick<Check, 'checkState'>): boolean =>
  check.checkState !== 'queued' && check.checkState !== 'running';

const checkQueries = {
  root,
  one: (id: string) =>
    queryOptions({
      queryKey: [...root, 'one', id] as const,
      queryFn: ({ signal }) => getJson<Check>(pathOf(id), { signal }),
      staleTime: 0,
    }),
  trace: (id: string) =>
    queryOptions({
      queryKey: [...root, 'trace', id] as const,
      queryFn: ({ signal }) => getJson<Trace>(pathOf(id, '/trace'), { query: { points: TRACE_POINTS }, signal }),
      staleTime: Infinity,
    }),
};

/** Start a check; the body goes out as typed. The answer is the check, waiting, running or done. */
export function useStartCheck() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: async ({ body, key }: { body: CheckRequest | DraftBody; key: string }) =>
      (await requestJson<Check>('/checks', { method: 'POST', body, headers: idempotencyHeader(key) })).data,
    onSuccess: (check) => cache.setQueryData(checkQueries.one(check.id).queryKey, check),
  });
}

/** One check, followed live while it runs: by server-sent events, and by asking again, which also catches up after a lost stream. */
export function useCheck(id: string | null) {
  const cache = useQueryClient();
  const query = useQuery({
    ...checkQueries.one(id ?? ''),
    enabled: id !== null,
    refetchInterval: ({ state }) => (state.data && isOver(state.data) ? false : POLL_MS),
  });
  const isRunning = id !== null && !(query.data && isOver(query.data));
  useEffect(() => {
    if (id === null || !isRunning) return;
    return followCheck(id, (progress) => {
      if (progress) {
        cache.setQueryData(checkQueries.one(id).queryKey, (known) => (known ? { ...known, ...progress } : known));
      } else {
        void cache.invalidateQueries({ queryKey: checkQueries.one(id).queryKey });
      }
    });
  }, [cache, id, isRunning]);
  return query;
}

/** The polyline of a finished check; held back until there is one. */
export const useCheckTrace = (id: string | null, enabled = true) =>
  useQuery({ ...checkQueries.trace(id ?? ''), enabled: enabled && id !== null });

type Progress = Pick<Check, 'checkState' | 'progress'>;

/**
 * Listen to a check's server-sent events until it is over.
 *
 * @param onNews gets the progress, or null when the whole check is to be asked for again.
 * @returns what ends the listening.
 */
function followCheck(id: string, onNews: (progress: Progress | null) => void): () => void {
  if (typeof EventSource === 'undefined') return () => undefined;
  const source = new EventSource(apiAddress(pathOf(id, '/events')));
  const onEvent = (event: Event) => {
    const news = readProgress(event);
    onNews(news && !isOver(news) ? news : null);
    if (news && isOver(news)) source.close();
  };
  for (const name of ['message', 'progress', 'state', 'done']) source.addEventListener(name, onEvent);
  return () => source.close();
}

function readProgress(event: Event): Progress | null {
  if (!(event instanceof MessageEvent) || typeof event.data !== 'string') return null;
  try {
    const { checkState, progress } = JSON.parse(event.data) as Partial<Progress>;
    return checkState === undefined ? null : { checkState, progress: progress ?? null };
  } catch {
    return null;
  }
}
