import type { Pool } from 'pg';
import { notFound } from '@/server/errors';
import { Refinement } from '@/server/models/refinement';
import { findEntry } from '@/server/services/find-entry';

/** Refinements of an entry that are shown: those before had fewer digits or ended the same way. */
const MOST_LISTED = 20;

/** Refinements with the accession of their entry, which addresses are made of. */
export interface FoundRefinements {
  accession: string;
  refinements: Refinement[];
}

/**
 * The newest refinements of an entry, or the one of that id.
 *
 * @throws {Problem} as `findEntry`; 404 for an id that is not of this entry.
 */
export async function findRefinements(pool: Pool, typed: string, id: string | null = null): Promise<FoundRefinements> {
  const { number: orbitNumber, accession } = await findEntry(pool, typed);
  const refinements = await Refinement.findAll({
    where: { orbitNumber, ...(id !== null && { id }) },
    order: [['createdAt', 'DESC']],
    limit: MOST_LISTED,
  });
  if (id !== null && refinements.length === 0) throw notFound('refinement');
  return { accession, refinements };
}
