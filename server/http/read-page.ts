import { type FieldError, invalidQuery } from '@/server/errors';

const MAX_LIMIT = 200;
const DEFAULT_LIMIT = 50;

/** The part of a query that every list takes. */
export interface PageRequest {
  limit: number;
  after: string | null;
}

/** What Express's simple parser makes of a query: a repeated parameter is a list. */
export type Query = Readonly<Record<string, unknown>>;

/**
 * Read `limit` and `after`, and refuse parameters that the list does not know.
 *
 * @throws {Problem} `invalid-query` with a pointer `#name` for each wrong parameter.
 */
export function readPage(query: Query, known: readonly string[] = []): PageRequest {
  const errors: FieldError[] = [];
  for (const [name, value] of Object.entries(query)) {
    if (name !== 'limit' && name !== 'after' && !known.includes(name)) {
      errors.push({ pointer: `#${name}`, message: `${name} is not a parameter of this list.` });
    } else if (typeof value !== 'string') {
      errors.push({ pointer: `#${name}`, message: `${name} is given more than once.` });
    }
  }
  const limit = readLimit(query['limit'], errors);
  if (errors.length > 0) throw invalidQuery(errors);
  return { limit, after: typeof query['after'] === 'string' && query['after'] !== '' ? query['after'] : null };
}

/** A whole number from 1 to 200; anything else is noted in `errors`. */
function readLimit(given: unknown, errors: FieldError[]): number {
  if (given === undefined) return DEFAULT_LIMIT;
  const limit = typeof given === 'string' && /^[0-9]{1,4}$/.test(given) ? parseInt(given, 10) : 0;
  if (limit < 1 || limit > MAX_LIMIT) {
    errors.push({ pointer: '#limit', message: `limit is a whole number from 1 to ${MAX_LIMIT}.` });
  }
  return limit;
}
