import type { Transaction } from 'sequelize';
import type { DraftBody, SubmissionBody } from '@/schemas/generated/contract';
import { type FieldError, invalidContent, notFound } from '@/server/errors';
import type { Submission } from '@/server/models/submission';
import { SubmissionRevision } from '@/server/models/submission-revision';
import { changeReviewState } from '@/server/services/change-review-state';
import type { Desk } from '@/server/services/desk';
import { enqueueCheck } from '@/server/services/enqueue-check';
import { expectVersion, type SeenVersion } from '@/server/services/expect-version';
import { lockSubmission, type Person } from '@/server/services/find-submission';
import { knownSystem } from '@/server/services/known-system';
import { nextRevision } from '@/server/services/next-revision';
import { validateClaim } from '@/server/services/validate-claim';

/** How a body is judged before it is sent. */
export interface SendRules {
  /** What the contract's schema of a submission's body says against it. */
  formErrors: (body: DraftBody) => FieldError[];
}

/**
 * Send a draft or a returned submission: the check of exactly this revision starts.
 *
 * @param seen  Checked when given; sending does not ask for it.
 * @throws {Problem} `invalid-content`, `unknown-system` or `wrong-state`; the draft stays as it is.
 */
export function sendSubmission(
  desk: Desk,
  owner: Person,
  { id, seen, rules }: { id: string; seen: SeenVersion; rules: SendRules },
): Promise<void> {
  return desk.db.transaction(async (transaction) => {
    const submission = await lockSubmission(id, owner, transaction);
    if (submission.ownerId !== owner.id) throw notFound('submission');
    if (seen !== null) await expectVersion(desk.db, submission, seen, transaction);
    await sendRevision(desk, submission, rules, transaction);
  });
}

/** Send the current revision of a locked submission; one that was sent before becomes the next revision. */
export async function sendRevision(
  desk: Desk,
  submission: Submission,
  { formErrors }: SendRules,
  transaction: Transaction,
): Promise<void> {
  const revision = await unsentRevision(submission, transaction);
  const errors = formErrors(revision.body);
  if (errors.length > 0) throw invalidContent(errors);
  const body = revision.body as unknown as SubmissionBody;
  const system = await knownSystem(desk.db, body.system);
  validateClaim(system.checked, body);
  const sentAt = new Date();
  await revision.update({ sentAt, systemId: system.id, systemVersion: system.version }, { transaction });
  const check = await enqueueCheck(
    desk.db,
    {
      requester: { accountId: submission.ownerId },
      body,
      system,
      submission: { id: submission.id, revision: revision.revision },
    },
    transaction,
  );
  const change = { kind: 'sent', actorId: submission.ownerId, checkId: check.id } as const;
  await changeReviewState(desk, submission, { ...change, set: { revision: revision.revision, sentAt } }, transaction);
}

async function unsentRevision(submission: Submission, transaction: Transaction): Promise<SubmissionRevision> {
  const current = await SubmissionRevision.findOne({
    where: { submissionId: submission.id, revision: submission.revision },
    rejectOnEmpty: true,
    transaction,
  });
  return current.sentAt === null ? current : nextRevision(submission, current.body, transaction);
}
