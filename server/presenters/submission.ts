import type { CheckState, Submission, SubmissionEvent, SubmissionSummary } from '@/schemas/generated/contract';
import type { EventRow, SubmissionHistory } from '@/server/services/find-submission';
import type { SubmissionRow } from '@/server/services/submission-rows';

/** A submission in a list, as one person sees it. */
export const presentSubmissionSummary = (row: SubmissionRow, personId: string): SubmissionSummary => ({
  id: row.id,
  number: row.number,
  revision: row.revision,
  reviewState: row.review_state,
  checkState: checkStateOf(row),
  turn: row.turn,
  verdict: row.report?.verdict ?? null,
  report: row.report,
  reportIsCurrent: row.report_current ?? false,
  check: row.check_id,
  failure: row.failure === null ? null : { message: row.failure, attempts: row.attempts ?? 0 },
  progress: row.check_state === 'running' ? row.progress : null,
  body: row.body,
  owner: { id: row.owner_id, name: row.owner_name },
  isMine: row.owner_id === personId,
  claim: claimOf(row, personId),
  blocked: row.blocked,
  decision: decisionOf(row),
  accession: row.accession,
  createdAt: row.created_at.toISOString(),
  sentAt: row.sent_at?.toISOString() ?? null,
  updatedAt: row.updated_at.toISOString(),
});

/** A submission with its revisions, history and discussion. */
export const presentSubmission = (history: SubmissionHistory, personId: string): Submission => ({
  ...presentSubmissionSummary(history.submission, personId),
  revisions: history.revisions.map(({ revision, at, body, check_id }) => ({
    revision,
    at: at.toISOString(),
    body,
    check: check_id,
  })),
  events: history.events.map(presentEvent),
  comments: history.comments.map(({ id, at, who, revision, text }) => ({
    id,
    at: at.toISOString(),
    who,
    revision,
    text,
  })),
  links: { self: `/api/v1/submissions/${history.submission.id}` },
});

/** One line of a submission's history. */
export const presentEvent = (event: EventRow): SubmissionEvent => ({
  id: event.id,
  at: event.at.toISOString(),
  who: event.who,
  kind: event.kind,
  from: event.from_state,
  to: event.to_state,
  revision: event.revision,
  report: event.check_id,
  reason: event.reason,
  comment: event.comment,
});

/** A finished check counts as stale once the engine or the system has a newer version, unless the matter is closed. */
function checkStateOf({ check_state, check_current, review_state }: SubmissionRow): CheckState {
  if (check_state === null) return 'none';
  const isOpen = review_state !== 'accepted' && review_state !== 'declined' && review_state !== 'withdrawn';
  return check_state === 'done' && isOpen && !check_current ? 'stale' : check_state;
}

const claimOf = (row: SubmissionRow, personId: string): SubmissionSummary['claim'] =>
  row.claimed_by !== null && row.claimer_name !== null && row.claimed_until !== null
    ? { by: row.claimer_name, byMe: row.claimed_by === personId, until: row.claimed_until.toISOString() }
    : null;

const decisionOf = (row: SubmissionRow): SubmissionSummary['decision'] =>
  row.decision !== null && row.decider_name !== null && row.decided_at !== null
    ? {
        decision: row.decision,
        reason: row.reason,
        comment: row.decision_comment,
        by: row.decider_name,
        at: row.decided_at.toISOString(),
      }
    : null;
