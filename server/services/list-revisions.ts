import type { Pool } from 'pg';
import type { Entry, EntryRevision } from '@/schemas/generated/contract';
import type { EntryRow } from '@/server/services/entry-rows';

interface RevisionRow {
  revision: number;
  at: Date;
  by: string | null;
  why: string;
  evidence: Entry['evidence']['level'];
  digits: number;
}

/** Revisions of an entry, the newest first. */
export async function listRevisions(
  pool: Pool,
  { number: orbitNumber, accession }: Pick<EntryRow, 'number' | 'accession'>,
): Promise<EntryRevision[]> {
  const { rows } = await pool.query<RevisionRow>(
    `select r.revision, r.at, a.name as by, r.why, r.evidence, r.digits from orbit_revision r left join account a on a.id = r.made_by
     where r.orbit_number = $1 order by r.revision desc`,
    [orbitNumber],
  );
  return rows.map(({ revision, at, by, why, evidence: level, digits }) => ({
    ...{ revision, at: at.toISOString(), by, why },
    evidence: { level, digits },
    links: { self: `/api/v1/orbits/${accession}?revision=${revision}` },
  }));
}
