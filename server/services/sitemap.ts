import type { Pool } from 'pg';

/** Addresses that one file of a site map may hold (sitemaps.org). */
const FILE_ADDRESSES = 50_000;

/** How many files the map of all entries takes; numbers of accessions go by `FILE_ADDRESSES` a file. */
export async function countSitemapFiles(pool: Pool): Promise<number> {
  const { rows } = await pool.query<{ last: number }>('select coalesce(max(number), 0) as last from orbit');
  return Math.ceil(rows[0]!.last / FILE_ADDRESSES);
}

/** Accepted entries of one file of the map, with the day that each was last revised. */
export async function entriesOfSitemap(pool: Pool, file: number): Promise<{ accession: string; day: string }[]> {
  const { rows } = await pool.query<{ accession: string; day: string }>(
    `select o.accession, to_char(r.at at time zone 'UTC', 'YYYY-MM-DD') as day
     from orbit o join orbit_revision r on r.orbit_number = o.number and r.revision = o.revision
     where o.status = 'accepted' and o.number > $1 and o.number <= $2 order by o.number`,
    [(file - 1) * FILE_ADDRESSES, file * FILE_ADDRESSES],
  );
  return rows;
}

/** Accepted systems, by slug. */
export async function systemsOfSitemap(pool: Pool): Promise<string[]> {
  const { rows } = await pool.query<{ slug: string }>(
    `select s.slug from system s join system_version v on v.system_id = s.id and v.version = s.current_version
     where v.state = 'accepted' order by s.slug`,
  );
  return rows.map(({ slug }) => slug);
}
