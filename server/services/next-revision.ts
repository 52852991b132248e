import type { Transaction } from 'sequelize';
import type { DraftBody } from '@/schemas/generated/contract';
import type { Submission } from '@/server/models/submission';
import { SubmissionRevision } from '@/server/models/submission-revision';

/** Begin the next revision of a locked submission; the caller makes it the current one. */
export const nextRevision = (
  submission: Submission,
  body: DraftBody,
  transaction: Transaction,
): Promise<SubmissionRevision> =>
  SubmissionRevision.create({ submissionId: submission.id, revision: submission.revision + 1, body }, { transaction });
