import type { Problem } from '@/schemas/generated/contract';

/** What went wrong, as far as the person can do something about it. */
export type ApiErrorKind =
  /** The network is gone: nothing reached the server. */
  | 'offline'
  /** The server did not answer in time. */
  | 'timeout'
  /** The server answered that something broke on its side. */
  | 'server'
  /** The server refused the request and says why. */
  | 'refused';

interface ApiErrorDetails {
  kind: ApiErrorKind;
  message: string;
  status?: number;
  problem?: Problem | null;
  requestId?: string | null;
  /** Seconds to wait, from `Retry-After`. */
  retryAfter?: number | null;
}

/** A request that did not succeed. */
export class ApiError extends Error {
  readonly kind: ApiErrorKind;
  /** HTTP status; 0 when there was no answer. */
  readonly status: number;
  readonly problem: Problem | null;
  readonly requestId: string | null;
  readonly retryAfter: number | null;

  constructor(details: ApiErrorDetails) {
    super(details.message);
    this.name = 'ApiError';
    this.kind = details.kind;
    this.status = details.status ?? 0;
    this.problem = details.problem ?? null;
    this.requestId = details.requestId ?? details.problem?.instance ?? null;
    this.retryAfter = details.retryAfter ?? null;
  }

  /** The stable code of the refusal, null when the server gave none. */
  get code(): string | null {
    return this.problem?.code ?? null;
  }

  /** The sentence for one member of the body, such as `/point/1`; null when the server found nothing there. */
  messageAt(pointer: string): string | null {
    return this.problem?.errors.find((error) => error.pointer === pointer)?.message ?? null;
  }
}

/** Whether an unknown error is a refusal with one of these codes. */
export const isRefusal = (error: unknown, ...codes: string[]): error is ApiError =>
  error instanceof ApiError && error.code !== null && codes.includes(error.code);
