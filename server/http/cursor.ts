import { createHash } from 'node:crypto';
import { invalidQuery } from '@/server/errors';

/** Where a page ended: the values of its last row in the order of the sort. */
export type CursorValues = readonly (string | null)[];

const HASH_LENGTH = 12;

/** The cursor for `after`. It belongs to one query: everything that selects and sorts goes into `query`. */
export const encodeCursor = (query: unknown, values: CursorValues): string =>
  Buffer.from(JSON.stringify([hashOf([query, values]), hashOf(query), ...values]), 'utf8').toString('base64url');

/**
 * Read a cursor back.
 *
 * @throws {Problem} `invalid-query` at `#after` when it is not one of ours or belongs to another query.
 */
export function decodeCursor(query: unknown, cursor: string, length: number): CursorValues {
  const [seal, owner, ...values] = parse(cursor) ?? [];
  const bound = owner === hashOf(query);
  if (values.length !== length || (bound && seal !== hashOf([query, values]))) {
    throw invalidQuery([
      { pointer: '#after', message: 'after is not a cursor: take it from "next" of the page before.' },
    ]);
  }
  if (!bound) {
    throw invalidQuery([
      { pointer: '#after', message: 'after belongs to another search or sort: start that search without it.' },
    ]);
  }
  return values;
}

function parse(cursor: string): CursorValues | null {
  try {
    const values: unknown = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'));
    const isCursor =
      Array.isArray(values) &&
      values.every((value) => value === null || (typeof value === 'string' && !value.includes('\u0000')));
    return isCursor ? (values as CursorValues) : null;
  } catch {
    return null;
  }
}

const hashOf = (query: unknown): string =>
  createHash('sha256').update(JSON.stringify(query)).digest('base64url').slice(0, HASH_LENGTH);
