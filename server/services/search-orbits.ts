import type { Pool, PoolClient } from 'pg';
import type { OrbitPage } from '@/schemas/generated/contract';
import { type EntryRow, entryColumns, entryTables } from '@/server/services/entry-rows';
import { readOnly } from '@/server/services/read-only';
import { nearestOrbits } from '@/server/services/nearest-orbits';
import { resolveSearch } from '@/server/services/resolve-search';
import { orbitConditions, type ResolvedSearch } from '@/server/search/orbit-conditions';
import { afterPlace, orderBy, orbitOrders, orderTexts } from '@/server/search/orbit-orders';
import type { OrbitSearch } from '@/server/search/read-search';
import { Binds } from '@/server/search/sql';

/** Results are counted up to here; beyond, the total is "at least" this. */
const MAX_COUNTED = 10_000;

/** One entry of a result, with the values that its order goes by. */
interface FoundRow extends EntryRow {
  place_texts: string[];
  distance: number | null;
}

export interface FoundPage {
  rows: FoundRow[];
  /** Where the next page begins; null at the end. */
  last: string[] | null;
  total: OrbitPage['total'];
  upToSymmetry: OrbitPage['upToSymmetry'];
}

interface PageRequest {
  limit: number;
  /** Values of the order's columns of the last entry before. */
  after: readonly (string | null)[] | null;
  statementMs: number;
}

/**
 * One page of a search, in its order, and how many entries it has in all.
 *
 * Pages are found by value, not by number: entries that are accepted meanwhile neither repeat nor hide others.
 *
 * @throws {Problem} `invalid-query` when the search names what does not exist.
 */
export function searchOrbits(pool: Pool, search: OrbitSearch, request: PageRequest): Promise<FoundPage> {
  return readOnly(pool, request.statementMs, async (client) => {
    const resolved = await resolveSearch(client, search);
    const found = await (resolved.sort === 'distance' ? nearestOrbits : orbitsInOrder)(client, resolved, request);
    const rows = found.slice(0, request.limit);
    const total = await countOrbits(client, resolved);
    return {
      rows,
      last: found.length > request.limit ? (rows.at(-1)?.place_texts ?? null) : null,
      total,
      upToSymmetry: await countUpToSymmetry(client, resolved, total),
    };
  });
}

async function orbitsInOrder(
  client: PoolClient,
  search: ResolvedSearch,
  { limit, after }: PageRequest,
): Promise<FoundRow[]> {
  const binds = new Binds();
  const order = orbitOrders[search.sort];
  const conditions = orbitConditions(search, binds);
  if (after) conditions.push(afterPlace(order, after, binds));
  // The page is cut before the joins, so that they are made for its entries only.
  const { rows } = await client.query<FoundRow>(
    `select ${entryColumns}, o.place_texts, ${distanceOf(search, binds)} as distance
     from (select o.*, ${orderTexts(order)} as place_texts, row_number() over () as rank
           from (select * from orbit o where ${conditions.join(' and ')} order by ${orderBy(order)} limit ${binds.add(limit + 1)}) o) o
     ${entryTables} order by o.rank`,
    binds.values,
  );
  return rows;
}

/** With `near` and another sort, the distance is told and does not decide. */
const distanceOf = ({ place }: ResolvedSearch, binds: Binds): string =>
  place === null
    ? 'null::float8'
    : `(select min(x.place <-> ${binds.add(place)}::cube) from crossing x where x.system_id = o.system_id and x.orbit_number = o.number)`;

/** How many entries a search has, counted up to `MAX_COUNTED`. */
async function countOrbits(client: PoolClient, search: ResolvedSearch): Promise<OrbitPage['total']> {
  const binds = new Binds();
  const { rows } = await client.query<{ found: number }>(
    `select count(*)::integer as found from (${foundNumbers(search, binds)}) o`,
    binds.values,
  );
  const found = rows[0]?.found ?? 0;
  return found > MAX_COUNTED ? { value: MAX_COUNTED, relation: 'at-least' } : { value: found, relation: 'exact' };
}

function foundNumbers(search: ResolvedSearch, binds: Binds): string {
  const conditions = orbitConditions(search, binds);
  return `select o.number from orbit o where ${conditions.join(' and ')} limit ${binds.add(MAX_COUNTED + 1)}`;
}

/** How many entries of a counted search are left when images of each other count once; null where none are images. */
async function countUpToSymmetry(
  client: PoolClient,
  search: ResolvedSearch,
  { value, relation }: OrbitPage['total'],
): Promise<OrbitPage['upToSymmetry']> {
  if (search.found === null || relation === 'at-least' || value < 2) return null;
  const binds = new Binds();
  const { rows } = await client.query<{ repeated: number; symmetries: string[] | null }>(
    // In two steps: put together, the planner pairs every entry with every other before it looks for images.
    `with found as materialized (${foundNumbers(search, binds)}),
     image as materialized (select i.* from found join orbit_image i on i.orbit_number = found.number)
     select count(distinct orbit_number) filter (where image_number < orbit_number)::integer as repeated,
       array_agg(distinct symmetry order by symmetry) as symmetries
     from image where image_number in (select number from found)`,
    binds.values,
  );
  const { repeated, symmetries } = rows[0]!;
  return symmetries && { value: value - repeated, symmetries };
}
