import type { Refinement as RefinementBody } from '@/schemas/generated/contract';
import type { Refinement } from '@/server/models/refinement';

/** A refinement as the API shows it; who asked for it is nobody's business. */
export const presentRefinement = (row: Refinement, accession: string): RefinementBody => ({
  id: row.id,
  accession,
  digits: row.digits,
  state: row.state,
  askedBySystem: row.askedBy === null,
  revision: row.revision,
  obstacle:
    row.reason === null || row.message === null
      ? null
      : { digits: row.digits, reason: row.reason, message: row.message },
  failure: row.failure,
  computeMs: row.computeMs,
  createdAt: row.createdAt.toISOString(),
  finishedAt: row.finishedAt?.toISOString() ?? null,
  links: {
    self: `/api/v1/orbits/${accession}/refinements/${row.id}`,
    entry: `/api/v1/orbits/${accession}`,
  },
});
