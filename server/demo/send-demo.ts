import type { InstallTools } from '@/server/demo/demo-tools';
import { formErrors } from '@/server/http/form-errors';
import { OrbitCheck } from '@/server/models/orbit-check';
import { Submission } from '@/server/models/submission';
import { SubmissionRevision } from '@/server/models/submission-revision';
import type { User } from '@/server/models/user';
import type { SendRules } from '@/server/services/send-submission';
import { waitForCheck } from '@/server/services/wait-for-check';

/** Longest wait for one check; the worker that computes it may have died. */
const PATIENCE_SECONDS = 120;

/** The demo's submissions are judged as everybody's. */
export const demoRules: SendRules = { formErrors: (body) => formErrors('submission-body', body) };

/** Submissions of the contributor by what was typed in their current revision. */
export async function knownBodies(contributor: User): Promise<Map<string, Submission>> {
  const submissions = await Submission.findAll({ where: { ownerId: contributor.id } });
  const bodies = new Map<string, Submission>();
  for (const submission of submissions) {
    const { id: submissionId, revision } = submission;
    const row = await SubmissionRevision.findOne({ where: { submissionId, revision }, rejectOnEmpty: true });
    bodies.set(JSON.stringify(row.body), submission);
  }
  return bodies;
}

/** Wait for the newest check of a submission. */
export async function checked({ checks, signal }: InstallTools, submissionId: string): Promise<void> {
  const check = await OrbitCheck.findOne({
    where: { submissionId },
    order: [['createdAt', 'DESC']],
    rejectOnEmpty: true,
  });
  await waitForCheck(checks, check, { seconds: PATIENCE_SECONDS, signal });
}
