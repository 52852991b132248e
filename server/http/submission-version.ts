import type { Request, Response } from 'express';
import { answerWithEtag, strongEtag } from '@/server/http/conditional';
import { signedInUser } from '@/server/http/require-role';
import { presentSubmission } from '@/server/presenters/submission';
import type { SeenVersion } from '@/server/services/expect-version';
import type { SubmissionHistory } from '@/server/services/find-submission';

/** `"v12"` or, with what makes the whole answer, `"v12-…"`; what a change insists on is the number. */
const TAG = /^"v([0-9]{1,9})(?:-[\w-]+)?"$/;

/**
 * Answer a submission as the person sees it, under an ETag of exactly this answer.
 *
 * The tag begins with the number of changes: progress of a check or the end of a claim make another answer, and yet
 * nothing that a decision would have to know.
 */
export function answerSubmission(req: Request, res: Response, history: SubmissionHistory): void {
  const body = presentSubmission(history, signedInUser(req).id);
  const hash = strongEtag(JSON.stringify(body)).slice(1, -1);
  answerWithEtag(req, res, { etag: `"v${history.submission.changes}-${hash}"`, body });
}

/** What `If-Match` says about the version that was seen; null without the header. A tag of anything else matches nothing. */
export function seenVersion(req: Request): SeenVersion {
  const header = req.headers['if-match'];
  if (header === undefined) return null;
  if (header.trim() === '*') return 'any';
  return (header.match(/(?:W\/)?"[^"]*"/g) ?? []).flatMap((tag) => {
    const [, changes] = TAG.exec(tag) ?? [];
    return changes === undefined ? [] : [parseInt(changes, 10)];
  });
}
