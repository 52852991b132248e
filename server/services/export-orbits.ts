import type { Pool, PoolClient } from 'pg';
import { type EntryRow, entryColumns, entryTables } from '@/server/services/entry-rows';
import { readOnly } from '@/server/services/read-only';
import { resolveSearch } from '@/server/services/resolve-search';
import { orbitConditions, type ResolvedSearch } from '@/server/search/orbit-conditions';
import { orderBy, orbitOrders } from '@/server/search/orbit-orders';
import type { OrbitSearch } from '@/server/search/read-search';
import { Binds } from '@/server/search/sql';

/** Entries held in memory at a time. */
const BATCH = 100;
/** A reader that takes nothing for so long is given up, and its connection goes back. */
const IDLE_MS = 120_000;

/** What an export says about itself before its first entry. */
export interface ExportShape {
  /** Most state variables of an entry in it. */
  dimension: number;
  /** Names of all parameters in it. */
  parameters: string[];
}

/** A whole search result, read entry by entry. */
export interface OrbitExport {
  shape: ExportShape;
  rows: AsyncIterable<EntryRow>;
}

/**
 * Read every entry of a search in its order, through a cursor of the database: memory stays constant, and all of it is
 * one state of the catalogue.
 *
 * @param write  Called once, with the entries still to be read; the export ends when it is done.
 * @throws {Problem} `invalid-query` before `write` is called.
 */
export function exportOrbits(
  pool: Pool,
  search: OrbitSearch,
  { statementMs, write }: { statementMs: number; write: (found: OrbitExport) => Promise<void> },
): Promise<void> {
  return readOnly(pool, statementMs, async (client) => {
    await client.query(`set local idle_in_transaction_session_timeout = ${IDLE_MS}`);
    await write(await openExport(client, search));
  });
}

/**
 * The same within a transaction of the caller's: one export at a time, read to its end before the next.
 *
 * @throws {Problem} `invalid-query`.
 */
export async function openExport(client: PoolClient, search: OrbitSearch): Promise<OrbitExport> {
  const resolved = await resolveSearch(client, search);
  return { shape: await shapeOf(client, resolved), rows: rowsOf(client, resolved) };
}

async function shapeOf(client: PoolClient, search: ResolvedSearch): Promise<ExportShape> {
  const binds = new Binds();
  const versions = search.found
    ? `s.id = ${binds.add(search.found.id)}`
    : `exists (select 1 from orbit o where o.system_id = s.id and ${orbitConditions(search, binds).join(' and ')})`;
  const { rows } = await client.query<{ dimension: number; parameters: string[] }>(
    `select coalesce(max(json_array_length(v.document -> 'variables')), 0) as dimension,
       coalesce(array_agg(distinct p.name order by p.name) filter (where p.name is not null), '{}') as parameters
     from system s join system_version v on v.system_id = s.id
     left join lateral (select q ->> 'name' as name from json_array_elements(v.document -> 'parameters') q) p on true
     where v.state = 'accepted' and ${versions}`,
    binds.values,
  );
  return rows[0] ?? { dimension: 0, parameters: [] };
}

async function* rowsOf(client: PoolClient, search: ResolvedSearch): AsyncGenerator<EntryRow> {
  const binds = new Binds();
  const conditions = orbitConditions(search, binds);
  await client.query(
    `declare entries no scroll cursor for
     select ${entryColumns} from orbit o ${entryTables} ${nearJoin(search, binds)}
     where ${conditions.join(' and ')} order by ${orderBy(orbitOrders[search.sort])}`,
    binds.values,
  );
  for (;;) {
    const { rows } = await client.query<EntryRow>(`fetch ${BATCH} from entries`);
    yield* rows;
    if (rows.length < BATCH) break;
  }
  await client.query('close entries');
}

const nearJoin = ({ place, sort }: ResolvedSearch, binds: Binds): string =>
  sort === 'distance'
    ? `join lateral (select min(x.place <-> ${binds.add(place)}::cube) as distance from crossing x
         where x.system_id = o.system_id and x.orbit_number = o.number) near on true`
    : '';
