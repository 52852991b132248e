import type { Sequelize, Transaction } from 'sequelize';
import { preconditionFailed, preconditionRequired } from '@/server/errors';
import type { Submission } from '@/server/models/submission';
import { presentEvent } from '@/server/presenters/submission';
import { eventsSince } from '@/server/services/find-submission';

/** What a change expects to find: the numbers of changes it has seen, any, or nothing said. */
export type SeenVersion = readonly number[] | 'any' | null;

/** The ETag that stands for a submission after so many changes, however it is shown. */
const versionTag = (changes: number): string => `"v${changes}"`;

/**
 * Insist that a change was made knowing the submission as it is. Test rights before.
 *
 * @throws {Problem} 428 when nothing was said, 412 with what happened meanwhile when something else was seen.
 */
export async function expectVersion(
  db: Sequelize,
  submission: Submission,
  seen: SeenVersion,
  transaction: Transaction,
): Promise<void> {
  if (seen === null) throw preconditionRequired();
  if (seen === 'any' || seen.includes(submission.changes)) return;
  const events = await eventsSince(db, submission.id, Math.max(0, ...seen), transaction);
  throw preconditionFailed({
    reviewState: submission.reviewState,
    revision: submission.revision,
    etag: versionTag(submission.changes),
    events: events.map(presentEvent),
  });
}
