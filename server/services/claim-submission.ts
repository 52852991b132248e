import type { Transaction } from 'sequelize';
import { notAllowed, Problem } from '@/server/errors';
import type { Submission } from '@/server/models/submission';
import { User } from '@/server/models/user';
import { changeReviewState } from '@/server/services/change-review-state';
import type { Desk } from '@/server/services/desk';
import { isCurator, lockSubmission, type Person } from '@/server/services/find-submission';

/** How long a claim holds without any activity. */
const CLAIM_MINUTES = 30;
const MINUTE_MS = 60_000;

const leaseEnd = (): Date => new Date(Date.now() + CLAIM_MINUTES * MINUTE_MS);

/**
 * Claim a submission, or renew one's own claim.
 *
 * @param takeOver  Take it from another curator; that is logged.
 * @throws {Problem} 404, `own-submission`, `claimed-by-another` or `wrong-state`.
 */
export function claimSubmission(
  desk: Desk,
  curator: Person,
  { id, takeOver }: { id: string; takeOver: boolean },
): Promise<void> {
  return desk.db.transaction(async (transaction) => {
    const submission = await lockForReview(id, curator, transaction);
    await holdClaim(desk, submission, { curator, takeOver }, transaction);
  });
}

/**
 * Give one's claim up.
 *
 * @throws {Problem} 404, `own-submission`, `claimed-by-another`, or `wrong-state` when nobody holds it.
 */
export function releaseSubmission(desk: Desk, curator: Person, id: string): Promise<void> {
  return desk.db.transaction(async (transaction) => {
    const submission = await lockForReview(id, curator, transaction);
    if (submission.claimedBy !== null && submission.claimedBy !== curator.id) throw await claimedByAnother(submission);
    await changeReviewState(desk, submission, { kind: 'released', actorId: curator.id }, transaction);
  });
}

/**
 * Lock a submission for somebody who is going to act as its curator.
 *
 * @throws {Problem} 404 for strangers, 403 for its owner.
 */
export async function lockForReview(id: string, person: Person, transaction: Transaction): Promise<Submission> {
  const submission = await lockSubmission(id, person, transaction);
  if (submission.ownerId === person.id) {
    throw new Problem('own-submission', 'This is your own submission: somebody else has to look at it.');
  }
  if (!isCurator(person)) throw notAllowed('curator');
  return submission;
}

/** Make sure that the curator holds the claim of a locked submission, and renew it. */
export async function holdClaim(
  desk: Desk,
  submission: Submission,
  { curator, takeOver }: { curator: Person; takeOver: boolean },
  transaction: Transaction,
): Promise<void> {
  const mine = { claimedBy: curator.id, claimedUntil: leaseEnd() };
  if (submission.claimedBy === curator.id) {
    await submission.update(mine, { transaction });
    return;
  }
  if (submission.claimedUntil !== null && submission.claimedUntil.getTime() <= Date.now()) {
    await changeReviewState(desk, submission, { kind: 'claim-expired', actorId: null }, transaction);
  }
  if (submission.claimedBy !== null && !takeOver) throw await claimedByAnother(submission);
  const kind = submission.claimedBy === null ? 'claimed' : 'taken-over';
  await changeReviewState(desk, submission, { kind, actorId: curator.id, set: mine }, transaction);
}

/** Renew the claim of somebody who is at work on a submission; nothing happens when it is not theirs. */
export async function renewClaim(submission: Submission, person: Person, transaction: Transaction): Promise<void> {
  if (submission.claimedBy !== person.id) return;
  await submission.update({ claimedUntil: leaseEnd() }, { transaction });
}

async function claimedByAnother({ claimedBy, claimedUntil }: Submission): Promise<Problem> {
  const holder = await User.findByPk(claimedBy!);
  const until = claimedUntil?.toISOString() ?? '';
  return new Problem(
    'claimed-by-another',
    `${holder?.name ?? 'Another curator'} holds this submission until ${until}.`,
  );
}
