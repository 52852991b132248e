import type { Pool } from 'pg';
import type { EntryRevision } from '@/schemas/generated/contract';

interface RevisionRow {
  revision: number;
  at: Date;
  by: string | null;
  why: string;
}

/** Revisions of an entry, the newest first. */
export async function listRevisions(pool: Pool, orbitNumber: number): Promise<EntryRevision[]> {
  const { rows } = await pool.query<RevisionRow>(
    `select r.revision, r.at, a.name as by, r.why from orbit_revision r left join account a on a.id = r.made_by
     where r.orbit_number = $1 order by r.revision desc`,
    [orbitNumber],
  );
  return rows.map(({ revision, at, by, why }) => ({ revision, at: at.toISOString(), by, why }));
}
