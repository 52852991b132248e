import type { Pool } from 'pg';
import type { SystemDocument } from '@/schemas/generated/contract';
import { findEntry } from '@/server/services/find-entry';
import type { TraceRequest } from '@/server/services/tracer';

/**
 * What has to be followed to draw an entry: its corrected start, in the version of the system that it is about.
 *
 * @throws {Problem} as `findEntry`.
 */
export async function findTraceRequest(
  pool: Pool,
  { accession, points }: { accession: string; points: number },
): Promise<TraceRequest> {
  const entry = await findEntry(pool, accession);
  const { rows } = await pool.query<{ document: SystemDocument }>(
    `select v.document from system_version v join system s on s.id = v.system_id where s.slug = $1 and v.version = $2`,
    [entry.slug, entry.system_version],
  );
  return {
    document: rows[0]!.document,
    parameters: entry.parameters,
    section: { formula: entry.section_formula },
    point: entry.content.point,
    period: entry.content.period,
    crossings: entry.content.crossings,
    points,
  };
}
