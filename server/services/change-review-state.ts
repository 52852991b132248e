import type { Transaction } from 'sequelize';
import type { ReviewState } from '@/schemas/generated/contract';
import { Problem } from '@/server/errors';
import { Event, type EventKind } from '@/server/models/event';
import type { Submission } from '@/server/models/submission';
import type { Change, Desk } from '@/server/services/desk';
import { mailAbout } from '@/server/services/mail-about';

interface Act {
  from: readonly ReviewState[];
  /** Null: the state stays as it is. */
  to: ReviewState | null;
}

const ALL: readonly ReviewState[] = [
  'draft',
  'submitted',
  'in-review',
  'accepted',
  'returned',
  'declined',
  'withdrawn',
];
const BEFORE_A_DECISION: readonly ReviewState[] = ['submitted', 'in-review'];
const ENDS: readonly ReviewState[] = ['accepted', 'declined', 'withdrawn'];

const acts: Readonly<Record<EventKind, Act>> = {
  created: { from: ['draft'], to: null },
  edited: { from: ['draft', 'returned'], to: null },
  sent: { from: ['draft', 'returned'], to: 'submitted' },
  'pulled-back': { from: ['submitted'], to: 'draft' },
  checked: { from: ALL, to: null },
  'check-failed': { from: ALL, to: null },
  'recheck-asked': { from: BEFORE_A_DECISION, to: null },
  claimed: { from: ['submitted'], to: 'in-review' },
  'taken-over': { from: ['in-review'], to: null },
  released: { from: ['in-review'], to: 'submitted' },
  'claim-expired': { from: ['in-review'], to: 'submitted' },
  commented: { from: ALL, to: null },
  accepted: { from: ['in-review'], to: 'accepted' },
  returned: { from: ['in-review'], to: 'returned' },
  declined: { from: ['in-review'], to: 'declined' },
  withdrawn: { from: ['draft', 'submitted', 'in-review', 'returned'], to: 'withdrawn' },
};

/** What a state lacks that the one before may have had. */
const cleared: Readonly<Record<ReviewState, Partial<Submission>>> = {
  draft: { claimedBy: null, claimedUntil: null },
  submitted: {
    claimedBy: null,
    claimedUntil: null,
    decision: null,
    decidedBy: null,
    decidedAt: null,
    reason: null,
    decisionComment: null,
  },
  'in-review': {},
  accepted: { claimedBy: null, claimedUntil: null },
  returned: { claimedBy: null, claimedUntil: null },
  declined: { claimedBy: null, claimedUntil: null },
  withdrawn: {
    claimedBy: null,
    claimedUntil: null,
    decision: null,
    decidedBy: null,
    decidedAt: null,
    reason: null,
    decisionComment: null,
  },
};

/**
 * Make one change of a submission, with its event and its mail: all of it or nothing.
 *
 * @param submission  Locked by this very transaction.
 * @throws {Problem} `wrong-state`, or `already-decided` after a decision.
 */
export async function changeReviewState(
  desk: Desk,
  submission: Submission,
  change: Change,
  transaction: Transaction,
): Promise<void> {
  const from = submission.reviewState;
  const act = acts[change.kind];
  if (!act.from.includes(from)) throw wrongState(from, change.kind);
  const to = act.to ?? from;
  const changes = submission.changes + 1;
  await submission.update(
    { ...(act.to ? cleared[act.to] : {}), ...change.set, reviewState: to, changes, updatedAt: new Date() },
    { transaction },
  );
  await Event.create(
    {
      submissionId: submission.id,
      kind: change.kind,
      actorId: change.actorId,
      fromState: change.kind === 'created' ? null : from,
      toState: to,
      revision: submission.revision,
      checkId: change.checkId ?? null,
      reason: change.reason ?? null,
      comment: change.comment ?? null,
      change: changes,
    },
    { transaction },
  );
  await mailAbout(desk, submission, change, transaction);
}

function wrongState(state: ReviewState, kind: EventKind): Problem {
  const code = ENDS.includes(state) && state !== 'withdrawn' ? 'already-decided' : 'wrong-state';
  return new Problem(code, `The submission is ${state}: it cannot be ${words[kind] ?? kind} now. Nothing was changed.`);
}

const words: Partial<Record<EventKind, string>> = {
  'pulled-back': 'pulled back',
  'recheck-asked': 'checked again',
  'taken-over': 'taken over',
};
