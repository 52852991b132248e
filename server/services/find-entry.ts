import type { Pool } from 'pg';
import { Problem } from '@/server/errors';
import { readAccession } from '@/server/services/accession';
import { type EntryRow, entryColumns, entryTables } from '@/server/services/entry-rows';

/**
 * The entry of an accession as somebody typed it, withdrawn or not.
 *
 * @throws {Problem} `wrong-check-character`, which names the right accession, or `unknown-accession`.
 */
export async function findEntry(pool: Pool, typed: string): Promise<EntryRow> {
  const accession = knownAccession(typed);
  const { rows } = await pool.query<EntryRow>(
    `select ${entryColumns} from orbit o ${entryTables} where o.accession = $1`,
    [accession],
  );
  if (!rows[0]) throw new Problem('unknown-accession', `There is no entry ${accession}.`);
  return rows[0];
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
