import { notFound } from '@/server/errors';
import { changeReviewState } from '@/server/services/change-review-state';
import type { Desk } from '@/server/services/desk';
import { lockSubmission, type Person } from '@/server/services/find-submission';

/**
 * Withdraw one's own submission before it is accepted or declined.
 *
 * @throws {Problem} 404, `already-decided` or `wrong-state`.
 */
export function withdrawSubmission(
  desk: Desk,
  owner: Person,
  { id, comment }: { id: string; comment: string | null },
): Promise<void> {
  return desk.db.transaction(async (transaction) => {
    const submission = await lockSubmission(id, owner, transaction);
    if (submission.ownerId !== owner.id) throw notFound('submission');
    const said = comment === null ? {} : { comment };
    await changeReviewState(desk, submission, { kind: 'withdrawn', actorId: owner.id, ...said }, transaction);
  });
}
