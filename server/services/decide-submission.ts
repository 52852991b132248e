import type { Transaction } from 'sequelize';
import type { Decision } from '@/schemas/generated/contract';
import { type FieldError, invalidContent, Problem } from '@/server/errors';
import type { Submission } from '@/server/models/submission';
import { acceptSubmission, type AcceptanceParts } from '@/server/services/accept-submission';
import { changeReviewState } from '@/server/services/change-review-state';
import { holdClaim, lockForReview } from '@/server/services/claim-submission';
import type { Desk } from '@/server/services/desk';
import { expectVersion, type SeenVersion } from '@/server/services/expect-version';
import type { Person } from '@/server/services/find-submission';
import { findAcceptance } from '@/server/services/find-acceptance';
import type { Tracer } from '@/server/services/tracer';

/**
 * Accept, return or decline a submission; an unclaimed one is claimed by deciding.
 *
 * @throws {Problem} 404, `own-submission`, 428, 412, `claimed-by-another`, `already-decided`, `invalid-content` without
 *   a reason; for an acceptance also `check-missing`, `stale-check`, `blocked-by-finding` or `already-known`.
 */
export async function decideSubmission(
  desk: Desk & { tracer: Tracer },
  curator: Person,
  { id, seen, decision }: { id: string; seen: SeenVersion; decision: Decision },
): Promise<void> {
  // Drawn before anything is locked; what is accepted then is the very check that was drawn.
  const parts = decision.decision === 'accept' ? await findAcceptance(desk, id, curator) : null;
  await desk.db.transaction(async (transaction) => {
    const submission = await lockForReview(id, curator, transaction);
    await expectVersion(desk.db, submission, seen, transaction);
    if (decision.decision !== 'accept') requireReason(decision);
    await holdClaim(desk, submission, { curator, takeOver: false }, transaction);
    if (decision.decision === 'accept') await accept(desk, submission, { curator, decision, parts }, transaction);
    else await refuse(desk, submission, { curator, decision }, transaction);
  });
}

interface Deciding {
  curator: Person;
  decision: Decision;
}

async function accept(
  desk: Desk,
  submission: Submission,
  { curator, decision, parts }: Deciding & { parts: AcceptanceParts | Problem | null },
  transaction: Transaction,
): Promise<void> {
  if (parts === null || parts instanceof Problem) throw parts ?? new Problem('check-missing', 'There is no check.');
  const entryNumber = await acceptSubmission(desk.db, submission, { ...parts, curatorId: curator.id }, transaction);
  await change(desk, submission, { curator, decision, kind: 'accepted', entryNumber }, transaction);
}

const refuse = (desk: Desk, submission: Submission, deciding: Deciding, transaction: Transaction): Promise<void> =>
  change(
    desk,
    submission,
    { ...deciding, kind: deciding.decision.decision === 'return' ? 'returned' : 'declined' },
    transaction,
  );

async function change(
  desk: Desk,
  submission: Submission,
  {
    curator,
    decision,
    kind,
    entryNumber,
  }: Deciding & { kind: 'accepted' | 'returned' | 'declined'; entryNumber?: number },
  transaction: Transaction,
): Promise<void> {
  const { reason, comment } = decision;
  await changeReviewState(
    desk,
    submission,
    {
      kind,
      actorId: curator.id,
      ...(reason === undefined ? {} : { reason }),
      ...(comment === undefined ? {} : { comment }),
      set: {
        ...{ decision: decision.decision, decidedBy: curator.id, decidedAt: new Date() },
        ...{ reason: reason ?? null, decisionComment: comment ?? null, entryNumber: entryNumber ?? null },
      },
    },
    transaction,
  );
}

/** Whoever is refused learns why. */
function requireReason({ decision, reason, comment }: Decision): void {
  const errors: FieldError[] = [];
  const verb = decision === 'return' ? 'returned' : 'declined';
  if (reason === undefined) {
    errors.push({ pointer: '/reason', message: `A submission is ${verb} for a reason: choose one.` });
  }
  if (!comment?.trim()) {
    errors.push({ pointer: '/comment', message: `Say in your own words why it is ${verb}: the contributor reads it.` });
  }
  if (errors.length > 0) throw invalidContent(errors);
}
