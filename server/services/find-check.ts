import type { CheckReport as Report } from '@/schemas/generated/contract';
import { notFound } from '@/server/errors';
import { CheckReport } from '@/server/models/check-report';
import { OrbitCheck } from '@/server/models/orbit-check';
import { Submission } from '@/server/models/submission';
import { isCurator, type Person } from '@/server/services/find-submission';

const ID = /^[A-Za-z0-9_-]{22}$/;

/**
 * A check by its id. The id of a private check is its secret; one that belongs to a submission is seen by its owner and
 * by curators.
 *
 * @throws {Problem} 404 for everybody else.
 */
export async function findCheck(id: string, person: Person | null): Promise<OrbitCheck> {
  const check = ID.test(id) ? await OrbitCheck.findByPk(id) : null;
  if (!check) throw notFound('check');
  if (check.submissionId === null || (person && isCurator(person))) return check;
  const submission = await Submission.findByPk(check.submissionId);
  if (!person || submission?.ownerId !== person.id) throw notFound('check');
  return check;
}

/** The report of a check that is done. */
export async function reportOf(check: OrbitCheck): Promise<Report | null> {
  return (await CheckReport.findByPk(check.id))?.report ?? null;
}
