import type { Role } from '@/schemas/generated/contract';
import type { ProblemCode } from '@/server/problem-codes';

/** A parameter in the path, the query or a header. */
export interface OperationParameter {
  name: string;
  in: 'path' | 'query' | 'header';
  description: string;
  schema: Readonly<Record<string, unknown>>;
}

/** A successful answer: its schema's name, or media types for what is not JSON of the contract. */
export interface OperationAnswer {
  status: number;
  description: string;
  schema?: string;
  /** Schema of the items where the answer is `{ "items": […] }` of the whole list. */
  itemsOf?: string;
  media?: readonly string[];
}

/** One call of the API, as it is mounted and as it is described. */
export interface Operation {
  id: string;
  method: 'get' | 'post' | 'patch' | 'delete';
  /** As Express mounts it below `/api/v1`: `/orbits/:accession`. */
  path: string;
  summary: string;
  description?: string;
  /** Least role; left out when anyone may call. */
  role?: Role;
  parameters?: readonly OperationParameter[];
  /** Name of the body's schema. */
  body?: string;
  answers: readonly OperationAnswer[];
  problems: readonly ProblemCode[];
}

export const pathParameter = (name: string, description: string): OperationParameter => ({
  name,
  in: 'path',
  description,
  schema: { type: 'string' },
});

export const queryParameter = (
  name: string,
  description: string,
  schema: Readonly<Record<string, unknown>> = { type: 'string' },
): OperationParameter => ({ name, in: 'query', description, schema });

export const headerParameter = (name: string, description: string): OperationParameter => ({
  name,
  in: 'header',
  description,
  schema: { type: 'string' },
});

export const idempotencyKey = headerParameter(
  'Idempotency-Key',
  'Makes a repeated request safe: the same key with the same body answers what the first one did.',
);
export const ifMatch = headerParameter('If-Match', 'ETag of the version that was seen, or * for any.');
export const ifNoneMatch = headerParameter('If-None-Match', 'ETag of the version at hand: 304 when it is current.');
export const pageParameters: readonly OperationParameter[] = [
  queryParameter('limit', 'Items of a page.', { type: 'integer', minimum: 1, maximum: 200, default: 50 }),
  queryParameter('after', 'Cursor: "next" of the page before.'),
];
