import { Op } from 'sequelize';
import { Submission } from '@/server/models/submission';
import { changeReviewState } from '@/server/services/change-review-state';
import type { Desk } from '@/server/services/desk';

/** End the claims that nobody renewed in time: their submissions are anybody's to review again. */
export async function expireClaims(desk: Desk): Promise<void> {
  const isOver = { claimedUntil: { [Op.lt]: new Date() } };
  for (const { id } of await Submission.findAll({ where: isOver, attributes: ['id'] })) {
    await desk.db.transaction(async (transaction) => {
      const submission = await Submission.findOne({
        where: { id, ...isOver },
        lock: transaction.LOCK.UPDATE,
        skipLocked: true,
        transaction,
      });
      if (submission) {
        await changeReviewState(desk, submission, { kind: 'claim-expired', actorId: null }, transaction);
      }
    });
  }
}
