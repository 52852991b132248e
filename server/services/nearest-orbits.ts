import type { PoolClient } from 'pg';
import { type EntryRow, entryColumns, entryTables } from '@/server/services/entry-rows';
import { orbitConditions, type ResolvedSearch } from '@/server/search/orbit-conditions';
import { Binds } from '@/server/search/sql';

/** Crossings looked at first; long orbits have thousands, so more are taken until enough entries are found. */
const FIRST_CROSSINGS = 500;
const GROWTH = 16;

interface NearRow extends EntryRow {
  place_texts: string[];
  distance: number;
}

/** How many crossings a row's statement looked at; a row without entry says only that. */
interface Looked {
  looked: number;
}

interface Request {
  limit: number;
  after: readonly (string | null)[] | null;
}

/**
 * Entries by the distance of their nearest crossing from a point, `limit` + 1 of them.
 *
 * The index on crossings answers nearest first. Its first K crossings decide the entries nearer than the K-th of
 * them; when those are too few, more crossings are looked at, in the end all of the system's: no entry is missed.
 */
export async function nearestOrbits(client: PoolClient, search: ResolvedSearch, request: Request): Promise<NearRow[]> {
  if (!search.found || search.place === null) return [];
  for (let crossings = FIRST_CROSSINGS; ; crossings *= GROWTH) {
    const { rows, all } = await within(client, search, { ...request, crossings });
    if (all || rows.length > request.limit) return rows;
  }
}

async function within(
  client: PoolClient,
  search: ResolvedSearch,
  { limit, after, crossings }: Request & { crossings: number },
): Promise<{ rows: NearRow[]; all: boolean }> {
  const binds = new Binds();
  const place = `${binds.add(search.place)}::cube`;
  const conditions = orbitConditions(search, binds);
  if (after) {
    conditions.push(`(near.distance, o.number) > (${binds.add(after[0])}::float8, ${binds.add(after[1])}::integer)`);
  }
  const { rows } = await client.query<Looked & (NearRow | { number: null })>(
    `with nearest as materialized (
       select x.orbit_number, x.place <-> ${place} as distance from crossing x
       where x.system_id = ${binds.add(search.found?.id)} order by x.place <-> ${place} limit ${binds.add(crossings)}),
     reach as (select count(*)::integer as looked, max(distance) as furthest from nearest),
     near as (select orbit_number, min(distance) as distance from nearest group by orbit_number)
     select reach.looked, e.* from reach left join lateral (
       select ${entryColumns}, o.distance, array[o.distance::text, o.number::text] as place_texts
       from (select o.*, near.distance from near join orbit o on o.number = near.orbit_number
             where ${conditions.join(' and ')} and (near.distance < reach.furthest or reach.looked < ${binds.add(crossings)})
             order by near.distance, o.number limit ${binds.add(limit + 1)}) o ${entryTables}) e on true
     order by e.distance, e.number`,
    binds.values,
  );
  const looked = rows[0]?.looked ?? 0;
  return { rows: rows.filter((row): row is Looked & NearRow => row.number !== null), all: looked < crossings };
}
