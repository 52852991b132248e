import type { PoolClient } from 'pg';
import { type FieldError, invalidQuery } from '@/server/errors';
import type { KnownSystem, ResolvedSearch } from '@/server/search/orbit-conditions';
import type { OrbitSearch } from '@/server/search/read-search';

interface SystemRow extends KnownSystem {
  dimension: number;
  names: string[];
}

/**
 * Look up the system of a search and turn its typed values into those that are stored.
 *
 * @throws {Problem} `invalid-query` for a system that does not exist, a parameter that it does not have, or a point
 *   with another number of coordinates.
 */
export async function resolveSearch(client: PoolClient, search: OrbitSearch): Promise<ResolvedSearch> {
  const found = search.system === null ? null : await findSystem(client, search.system);
  const errors: FieldError[] = [];
  if (search.system !== null && !found) {
    errors.push({ pointer: '#system', message: `system: there is none called ${search.system}.` });
  }
  if (found) errors.push(...wrongParameters(search, found));
  if (found && search.near && search.near.length !== found.dimension) {
    const message = `near has ${search.near.length} coordinates; the system has ${found.dimension} variables.`;
    errors.push({ pointer: '#near', message });
  }
  if (errors.length > 0) throw invalidQuery(errors);
  return {
    ...search,
    found,
    place: search.near && found?.extents ? await placeOf(client, search.near, found.extents) : null,
  };
}

/** A point as the database keeps crossings: in units of the system's extents. */
async function placeOf(client: PoolClient, point: readonly string[], extents: readonly number[]): Promise<string> {
  const { rows } = await client.query<{ place: string }>(
    `select cube(array(select c / e from unnest($1::float8[], $2::float8[]) with ordinality as u (c, e, i) order by i))::text as place`,
    [point, extents],
  );
  return rows[0]!.place;
}

const wrongParameters = ({ parameters }: OrbitSearch, { names }: SystemRow): FieldError[] =>
  parameters
    .filter(([name]) => !names.includes(name))
    .map(([name]) => ({
      pointer: `#parameters[${name}]`,
      message: `The system has no parameter ${name}; it has ${names.join(', ') || 'none'}.`,
    }));

async function findSystem(client: PoolClient, slug: string): Promise<SystemRow | null> {
  const { rows } = await client.query<SystemRow>(
    `select s.id, s.extents, json_array_length(v.document -> 'variables') as dimension,
       array(select p ->> 'name' from json_array_elements(v.document -> 'parameters') p) as names
     from system s join system_version v on v.system_id = s.id and v.version = s.current_version
     where s.slug = $1 and v.state = 'accepted'`,
    [slug],
  );
  return rows[0] ?? null;
}
