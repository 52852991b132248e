import { Comment } from '@/server/models/comment';
import { changeReviewState } from '@/server/services/change-review-state';
import { renewClaim } from '@/server/services/claim-submission';
import type { Desk } from '@/server/services/desk';
import { lockSubmission, type Person } from '@/server/services/find-submission';

/**
 * Say something about a submission; the other side gets a mail.
 *
 * @throws {Problem} 404 for everybody but its owner and curators.
 */
export function commentSubmission(
  desk: Desk,
  person: Person,
  { id, text }: { id: string; text: string },
): Promise<void> {
  return desk.db.transaction(async (transaction) => {
    const submission = await lockSubmission(id, person, transaction);
    const { revision } = submission;
    await Comment.create({ submissionId: id, authorId: person.id, revision, text }, { transaction });
    await changeReviewState(desk, submission, { kind: 'commented', actorId: person.id, comment: text }, transaction);
    await renewClaim(submission, person, transaction);
  });
}
