import type { Pool } from 'pg';
import { notFound, Problem } from '@/server/errors';
import { readAccession } from '@/server/services/accession';
import { type EntryRow, entryColumns, tablesWith } from '@/server/services/entry-rows';

/**
 * The entry of an accession as somebody typed it, withdrawn or not.
 *
 * @param revision one of its revisions; null: the current one.
 * @throws {Problem} `wrong-check-character`, which names the right accession, `unknown-accession`, or `not-found` where it
 *   has no such revision.
 */
export async function findEntry(pool: Pool, typed: string, revision: number | null = null): Promise<EntryRow> {
  const accession = knownAccession(typed);
  const { rows } = await pool.query<EntryRow>(
    `select ${entryColumns} from orbit o ${tablesWith('coalesce($2::integer, o.revision)')} where o.accession = $1`,
    [accession, revision],
  );
  if (rows[0]) return rows[0];
  if (revision === null) throw new Problem('unknown-accession', `There is no entry ${accession}.`);
  await findEntry(pool, typed);
  throw notFound(`revision ${revision} of ${accession}`);
}

function knownAccession(typed: string): string {
  const read = readAccession(typed);
  if (read.ok) return read.accession;
  if (read.reason === 'form') {
    const shown = typed.slice(0, 40);
    throw new Problem('unknown-accession', `"${shown}" is not an accession: RTN-, seven digits and a check character.`);
  }
  const message = `The check character of ${typed.toUpperCase()} does not fit its digits. With these digits it is ${read.right}: look at both.`;
  throw new Problem('wrong-check-character', message);
}
