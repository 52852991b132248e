import { QueryClientProvider } from '@tanstack/react-query';
import { render } from '@testing-library/react';
import type { ReactElement } from 'react';
import { createQueryClient } from '@/features/api/query-client';
import { LiveRegion, Main } from '@/features/ui';
import type { Problem } from '@/schemas/generated/contract';

/** What a faked call answers: a body, a problem, or nothing ever. */
export type FakeAnswer = { body: unknown; status?: number; headers?: Record<string, string> } | 'never' | 'offline';

export interface FakeCall {
  method: string;
  path: string;
  query: URLSearchParams;
  headers: Record<string, string>;
  body: unknown;
}

type Answerer = FakeAnswer | ((call: FakeCall) => FakeAnswer);

/** A problem as the server sends it. */
export const problem = (status: number, code: string, detail: string): FakeAnswer => ({
  status,
  headers: { 'Content-Type': 'application/problem+json' },
  body: {
    type: 'about:blank',
    title: code,
    status,
    detail,
    code,
    instance: '7f3c-19a2',
    errors: [],
    meanwhile: null,
  } satisfies Problem,
});

/**
 * Answer every request of the client from a table of `METHOD /path`; what is not in it is a 404.
 *
 * @returns the calls, in their order.
 */
export function fakeArchive(answers: Record<string, Answerer>): FakeCall[] {
  const calls: FakeCall[] = [];
  globalThis.fetch = (input, init = {}) => {
    const url = new URL(input as string, 'http://localhost');
    const call: FakeCall = {
      method: init.method ?? 'GET',
      path: url.pathname.replace(/^\/api\/v1/, ''),
      query: url.searchParams,
      headers: (init.headers ?? {}) as Record<string, string>,
      body: typeof init.body === 'string' ? JSON.parse(init.body) : undefined,
    };
    calls.push(call);
    const answer = answers[`${call.method} ${call.path}`] ?? problem(404, 'not-found', 'There is nothing here.');
    return respond(typeof answer === 'function' ? answer(call) : answer, init.signal ?? null);
  };
  return calls;
}

function respond(answer: FakeAnswer, signal: AbortSignal | null): Promise<Response> {
  if (answer === 'offline') return Promise.reject(new TypeError('Failed to fetch'));
  if (answer === 'never') {
    return new Promise((_, reject) => {
      signal?.addEventListener('abort', () => reject(new DOMException('stopped', 'AbortError')));
    });
  }
  const { body, status = 200, headers = {} } = answer;
  const all = new Map(Object.entries({ 'Content-Type': 'application/json', 'X-Request-Id': '7f3c-19a2', ...headers }));
  return Promise.resolve({
    ok: status < 400,
    status,
    headers: { get: (name: string) => all.get(name) ?? null },
    json: () => Promise.resolve(body),
    text: () => Promise.resolve(String(body)),
  } as unknown as Response);
}

/** Draw a screen as the frame does, with a cache of its own that keeps no timer alive. */
export function renderScreen(screen: ReactElement) {
  const cache = createQueryClient();
  cache.setDefaultOptions({ queries: { ...cache.getDefaultOptions().queries, gcTime: Infinity } });
  const within = (element: ReactElement) => (
    <QueryClientProvider client={cache}>
      <Main>{element}</Main>
      <LiveRegion />
    </QueryClientProvider>
  );
  const drawn = render(within(screen));
  return { ...drawn, redraw: (element: ReactElement) => drawn.rerender(within(element)) };
}
