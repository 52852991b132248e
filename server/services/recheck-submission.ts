import type { SubmissionBody } from '@/schemas/generated/contract';
import { OrbitCheck } from '@/server/models/orbit-check';
import { SubmissionRevision } from '@/server/models/submission-revision';
import { changeReviewState } from '@/server/services/change-review-state';
import { renewClaim } from '@/server/services/claim-submission';
import type { Desk } from '@/server/services/desk';
import { enqueueCheck } from '@/server/services/enqueue-check';
import { lockSubmission, type Person } from '@/server/services/find-submission';
import { knownSystem } from '@/server/services/known-system';
import { validateClaim } from '@/server/services/validate-claim';

/**
 * Check the current revision again, by the engine and the system as they are now. While a check of it waits or runs,
 * no other is started.
 *
 * @throws {Problem} 404, or `wrong-state` when it was not sent or is decided.
 */
export function recheckSubmission(desk: Desk, person: Person, id: string): Promise<void> {
  return desk.db.transaction(async (transaction) => {
    const submission = await lockSubmission(id, person, transaction);
    const { revision } = submission;
    await renewClaim(submission, person, transaction);
    const isOpen = submission.reviewState === 'submitted' || submission.reviewState === 'in-review';
    const underWay = { submissionId: id, revision, state: ['queued', 'running'] };
    if (isOpen && (await OrbitCheck.count({ where: underWay, transaction })) > 0) return;
    const { body } = await SubmissionRevision.findOne({
      where: { submissionId: id, revision },
      rejectOnEmpty: true,
      transaction,
    });
    await changeReviewState(desk, submission, { kind: 'recheck-asked', actorId: person.id }, transaction);
    const claim = body as unknown as SubmissionBody;
    const system = await knownSystem(desk.db, claim.system);
    validateClaim(system.checked, claim);
    const requester = { accountId: submission.ownerId };
    await enqueueCheck(desk.db, { requester, body: claim, system, submission: { id, revision } }, transaction);
  });
}
