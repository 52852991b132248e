import type { Transaction } from 'sequelize';
import type { DraftBody } from '@/schemas/generated/contract';
import { notFound } from '@/server/errors';
import { Event } from '@/server/models/event';
import type { Submission } from '@/server/models/submission';
import { SubmissionRevision } from '@/server/models/submission-revision';
import { changeReviewState } from '@/server/services/change-review-state';
import type { Desk } from '@/server/services/desk';
import { expectVersion, type SeenVersion } from '@/server/services/expect-version';
import { lockSubmission, type Person } from '@/server/services/find-submission';
import { nextRevision } from '@/server/services/next-revision';

/**
 * Replace the body of a draft or a returned submission; one that was sent and that nobody has claimed becomes a draft
 * again. What was sent stays: the new body is the next revision.
 *
 * @throws {Problem} 404, 428, 412, or `wrong-state` once it is claimed or decided.
 */
export function changeSubmission(
  desk: Desk,
  owner: Person,
  { id, seen, body }: { id: string; seen: SeenVersion; body: DraftBody },
): Promise<void> {
  return desk.db.transaction(async (transaction) => {
    const submission = await lockSubmission(id, owner, transaction);
    if (submission.ownerId !== owner.id) throw notFound('submission');
    await expectVersion(desk.db, submission, seen, transaction);
    const kind = submission.reviewState === 'submitted' ? 'pulled-back' : 'edited';
    const current = await SubmissionRevision.findOne({
      where: { submissionId: id, revision: submission.revision },
      rejectOnEmpty: true,
      transaction,
    });
    if (current.sentAt !== null) {
      const { revision } = await nextRevision(submission, body, transaction);
      await changeReviewState(desk, submission, { kind, actorId: owner.id, set: { revision } }, transaction);
      return;
    }
    await current.update({ body }, { transaction });
    if (await wasEditedLast(submission, transaction)) await countChange(submission, transaction);
    else await changeReviewState(desk, submission, { kind, actorId: owner.id }, transaction);
  });
}

/** Typing is saved every few seconds: a run of edits of one revision is one line of the history. */
async function wasEditedLast(submission: Submission, transaction: Transaction): Promise<boolean> {
  const last = await Event.findOne({ where: { submissionId: submission.id }, order: [['id', 'DESC']], transaction });
  return last?.kind === 'edited' && last.revision === submission.revision;
}

const countChange = (submission: Submission, transaction: Transaction): Promise<unknown> =>
  submission.update({ changes: submission.changes + 1, updatedAt: new Date() }, { transaction });
