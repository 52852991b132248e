import type { DraftBody } from '@/schemas/generated/contract';
import { Submission } from '@/server/models/submission';
import { SubmissionRevision } from '@/server/models/submission-revision';
import { changeReviewState } from '@/server/services/change-review-state';
import type { Desk } from '@/server/services/desk';
import type { Person } from '@/server/services/find-submission';
import { sendRevision, type SendRules } from '@/server/services/send-submission';

/**
 * Keep a new draft exactly as typed; send it at once when asked to.
 *
 * @param send  How a body is judged before it is sent; null keeps the draft.
 * @throws {Problem} `unknown-system` or `invalid-content` when it cannot be sent; nothing is stored then.
 */
export function createSubmission(
  desk: Desk,
  owner: Person,
  { body, send }: { body: DraftBody; send: SendRules | null },
): Promise<string> {
  return desk.db.transaction(async (transaction) => {
    const submission = await Submission.create({ ownerId: owner.id }, { transaction });
    await SubmissionRevision.create({ submissionId: submission.id, revision: 1, body }, { transaction });
    await changeReviewState(desk, submission, { kind: 'created', actorId: owner.id }, transaction);
    if (send) await sendRevision(desk, submission, send, transaction);
    return submission.id;
  });
}
