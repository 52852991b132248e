import type { Pool } from 'pg';
import type { SystemDocument } from '@/schemas/generated/contract';

/** An accepted system in its current version. */
interface SystemRow {
  id: string;
  slug: string;
  version: number;
  document: SystemDocument;
  accepted_at: Date;
  entries: number;
  /** Accession of the entry with the shortest period. */
  shortest: string | null;
}

/** Entries of one system with the same section, parameters and number of returns. */
export interface ReturnsRow {
  system_id: string;
  /** Name of the section, or its formula where the system has no name for it. */
  section: string;
  parameters: Record<string, string>;
  parameter_values: Record<string, number>;
  returns: number;
  known: number;
}

export interface ListedSystem extends SystemRow {
  returns: ReturnsRow[];
}

/** Accepted systems with what the catalogue holds of them, in their order; with a slug only that one. */
export async function listSystems(pool: Pool, slug: string | null = null): Promise<ListedSystem[]> {
  const systems = await pool.query<SystemRow>(
    `select s.id, s.slug, v.version, v.document, v.accepted_at,
       (select count(*)::integer from orbit o where o.system_id = s.id and o.status = 'accepted') as entries,
       (select o.accession from orbit o where o.system_id = s.id and o.status = 'accepted'
        order by o.period, o.number limit 1) as shortest
     from system s join system_version v on v.system_id = s.id and v.version = s.current_version
     where v.state = 'accepted' and ($1::text is null or s.slug = $1)
     order by s.position, v.document ->> 'name', s.slug`,
    [slug],
  );
  const returns = await pool.query<ReturnsRow>(
    `select o.system_id, coalesce(c.name, c.formula) as section, (array_agg(o.parameters))[1] as parameters,
       o.parameter_values, o.returns, count(*)::integer as known
     from orbit o join section c on c.id = o.section_id
     where o.status = 'accepted' and o.system_id = any($1::uuid[])
     group by o.system_id, section, o.parameter_values, o.returns`,
    [systems.rows.map(({ id }) => id)],
  );
  return systems.rows.map((system) => ({
    ...system,
    returns: returns.rows.filter(({ system_id }) => system_id === system.id),
  }));
}
