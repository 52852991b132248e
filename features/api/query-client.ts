import { QueryClient } from '@tanstack/react-query';

/** Answers stay fresh this long unless a resource says otherwise. */
const FRESH_MS = 30_000;

/**
 * The cache of everything the server said. Nothing is retried behind the person's back: the screens say what
 * failed and offer to try again. Requests go out even where the browser believes to be offline, so that being
 * offline shows as an error and not as waiting.
 */
export const createQueryClient = (): QueryClient =>
  new QueryClient({
    defaultOptions: {
      queries: { staleTime: FRESH_MS, retry: false, refetchOnWindowFocus: false, networkMode: 'always' },
      mutations: { retry: false, networkMode: 'always' },
    },
  });
