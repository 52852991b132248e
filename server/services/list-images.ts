import type { Pool } from 'pg';
import type { EntryImage } from '@/schemas/generated/contract';

/** Entries in the catalogue that are an entry's images under symmetries of its system. */
export async function listImages(pool: Pool, orbitNumber: number): Promise<EntryImage[]> {
  const { rows } = await pool.query<EntryImage>(
    `select o.accession, i.symmetry from orbit_image i join orbit o on o.number = i.image_number
     where i.orbit_number = $1 and o.status = 'accepted' order by o.number`,
    [orbitNumber],
  );
  return rows;
}
