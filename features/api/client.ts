import type { Problem } from '@/schemas/generated/contract';
import { ApiError } from '@/features/api/api-error';

/** Where the API lives, on the page's own origin. */
const API_ROOT = '/api/v1';
/** How long the client waits for an answer before it says so. */
const ANSWER_TIMEOUT_MS = 10_000;

type QueryValue = string | number | boolean | null | undefined;
export type Query = Record<string, QueryValue | readonly string[]>;

export interface RequestOptions {
  method?: 'GET' | 'POST' | 'PATCH' | 'DELETE';
  query?: Query;
  body?: unknown;
  headers?: Record<string, string>;
  signal?: AbortSignal;
  timeoutMs?: number;
}

/** An answer together with its ETag, for requests that change what was read. */
export interface Tagged<T> {
  data: T;
  etag: string | null;
}

/** A path below the API with its query; members without a value are left out. */
export function apiAddress(path: string, query: Query = {}): string {
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query)) {
    for (const one of Array.isArray(value) ? (value as readonly string[]) : [value as QueryValue]) {
      if (one !== undefined && one !== null && one !== '') search.append(name, String(one));
    }
  }
  const text = search.toString();
  return `${API_ROOT}${path}${text ? `?${text}` : ''}`;
}

/** Send a request and read its JSON, with the ETag it came under. */
export const requestJson = <T>(path: string, options: RequestOptions = {}): Promise<Tagged<T>> =>
  send(path, options, async (response) => {
    const data: unknown = response.status === 204 ? undefined : ((await response.json()) as unknown);
    return { data: data as T, etag: response.headers.get('ETag') };
  });

/** Read an answer that is plain text. */
export const getText = (path: string, options: RequestOptions = {}): Promise<string> =>
  send(path, { ...options, headers: { Accept: 'text/plain, */*' } }, (response) => response.text());

async function send<T>(path: string, options: RequestOptions, read: (response: Response) => Promise<T>): Promise<T> {
  const { method = 'GET', query, body, headers = {}, signal, timeoutMs = ANSWER_TIMEOUT_MS } = options;
  const limit = new AbortController();
  const timer = setTimeout(() => limit.abort(), timeoutMs);
  const stop = () => limit.abort();
  signal?.addEventListener('abort', stop);
  try {
    const response = await fetch(apiAddress(path, query), {
      method,
      credentials: 'same-origin',
      signal: limit.signal,
      headers: {
        Accept: 'application/json',
        ...(body === undefined ? {} : { 'Content-Type': 'application/json' }),
        ...headers,
      },
      ...(body === undefined ? {} : { body: JSON.stringify(body) }),
    });
    if (!response.ok) throw await refusalOf(response);
    return await read(response);
  } catch (error) {
    throw asApiError(error, { stopped: signal?.aborted === true, late: limit.signal.aborted, timeoutMs });
  } finally {
    clearTimeout(timer);
    signal?.removeEventListener('abort', stop);
  }
}

export const getJson = async <T>(path: string, options: RequestOptions = {}): Promise<T> =>
  (await requestJson<T>(path, options)).data;

export const postJson = async <T>(path: string, body?: unknown, options: RequestOptions = {}): Promise<T> =>
  (await requestJson<T>(path, { ...options, method: 'POST', body })).data;

export const patchJson = async <T>(path: string, body: unknown, options: RequestOptions = {}): Promise<T> =>
  (await requestJson<T>(path, { ...options, method: 'PATCH', body })).data;

export const deleteJson = async <T>(path: string, options: RequestOptions = {}): Promise<T> =>
  (await requestJson<T>(path, { ...options, method: 'DELETE' })).data;

/** The header that makes a repeated POST create only one thing; one key for one intention of the person. */
export const idempotencyHeader = (key: string): Record<string, string> => ({ 'Idempotency-Key': key });

/** A fresh key; works on plain http too, where randomUUID does not. */
export function newIdempotencyKey(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(16));
  return [...bytes].map((byte) => byte.toString(16).padStart(2, '0')).join('');
}

async function refusalOf(response: Response): Promise<ApiError> {
  const problem = await problemOf(response);
  return new ApiError({
    kind: response.status >= 500 ? 'server' : 'refused',
    message: problem?.detail ?? `The server answered ${response.status}.`,
    status: response.status,
    problem,
    requestId: response.headers.get('X-Request-Id'),
    retryAfter: secondsOf(response.headers.get('Retry-After')),
  });
}

async function problemOf(response: Response): Promise<Problem | null> {
  if (!response.headers.get('Content-Type')?.includes('json')) return null;
  try {
    const body = (await response.json()) as Partial<Problem>;
    return typeof body.code === 'string' ? { ...emptyProblem, ...body } : null;
  } catch {
    return null;
  }
}

const emptyProblem: Problem = {
  type: 'about:blank',
  title: '',
  status: 0,
  detail: '',
  code: '',
  instance: null,
  errors: [],
  meanwhile: null,
};

const secondsOf = (header: string | null): number | null =>
  header !== null && /^\d+$/.test(header) ? Number.parseInt(header, 10) : null;

function asApiError(error: unknown, when: { stopped: boolean; late: boolean; timeoutMs: number }): unknown {
  if (error instanceof ApiError || when.stopped) return error;
  if (when.late) {
    return new ApiError({ kind: 'timeout', message: `The archive took longer than ${when.timeoutMs / 1000} s.` });
  }
  if (error instanceof SyntaxError) return new ApiError({ kind: 'server', message: 'The answer could not be read.' });
  return new ApiError({ kind: 'offline', message: 'No connection.' });
}
