import type { Binds } from '@/server/search/sql';
import type { SortName } from '@/server/search/search-words';

/** A sort as SQL: the columns that decide, all in one direction, the entry's number last. */
export interface OrbitOrder {
  columns: readonly { sql: string; type: 'float8' | 'integer' | 'timestamptz' }[];
  direction: 'asc' | 'desc';
}

const NUMBER = { sql: 'o.number', type: 'integer' } as const;
const by = (
  sql: string,
  type: 'float8' | 'integer' | 'timestamptz',
  direction: 'asc' | 'desc' = 'asc',
): OrbitOrder => ({
  columns: [{ sql, type }, NUMBER],
  direction,
});

/** Every order of results; migrations hold an index for each. */
export const orbitOrders: Readonly<Record<SortName, OrbitOrder>> = {
  period: by('o.period', 'float8'),
  '-period': by('o.period', 'float8', 'desc'),
  returns: by('o.returns', 'integer'),
  '-returns': by('o.returns', 'integer', 'desc'),
  multiplier: by('o.unstable_multiplier', 'float8'),
  '-multiplier': by('o.unstable_multiplier', 'float8', 'desc'),
  newest: by('o.accepted_at', 'timestamptz', 'desc'),
  oldest: by('o.accepted_at', 'timestamptz'),
  accession: { columns: [NUMBER], direction: 'asc' },
  distance: by('near.distance', 'float8'),
};

export const orderBy = ({ columns, direction }: OrbitOrder): string =>
  columns.map(({ sql }) => `${sql} ${direction}`).join(', ');

/** The condition that an entry comes after a place in the order. */
export function afterPlace(
  { columns, direction }: OrbitOrder,
  after: readonly (string | null)[],
  binds: Binds,
): string {
  const values = columns.map(({ type }, i) => `${binds.add(after[i])}::${type}`);
  return `(${columns.map(({ sql }) => sql).join(', ')}) ${direction === 'asc' ? '>' : '<'} (${values.join(', ')})`;
}

/** The values of the order's columns as exact texts, for a cursor. */
export const orderTexts = ({ columns }: OrbitOrder): string =>
  `array[${columns.map(({ sql }) => `(${sql})::text`).join(', ')}]`;
