import { submissionHref } from '@/features/api/page-addresses';
import { useSystem } from '@/features/api/systems';
import { draftOfBody } from '@/features/checking/orbit-draft';
import { reportMusic } from '@/features/checking/report-music';
import { reasonWords } from '@/features/desk/reason-words';
import { ageWords, minutesLeft } from '@/features/desk/time-words';
import { Incipit } from '@/features/notation/incipit';
import { orbitState } from '@/features/notation/orbit-state';
import { StateWord } from '@/features/notation/state-word';
import { followLink, Text } from '@/features/ui';
import type { CheckReport, SubmissionSummary } from '@/schemas/generated/contract';

interface QueueItemProps {
  submission: SubmissionSummary;
  /** It is the one that is open. */
  isOpen: boolean;
  now: number;
  /** In the column beside a submission there is less room: nothing found is not told. */
  narrow?: boolean;
}

/** One submission in the queue: number, state, incipit, findings, since when; all of it is the link. */
export function QueueItem({ submission, isOpen, now, narrow = false }: QueueItemProps) {
  const { id, number, report, body, isMine } = submission;
  const draft = draftOfBody(body);
  const system = useSystem(draft.system, draft.system !== '');
  const state = orbitState(submission.reviewState, submission.checkState, submission.verdict);
  const music = report ? reportMusic({ report, system: system.data, section: draft.section, state }) : null;
  const returns = draft.returns || report?.orbit?.returns.toString();
  const facts = [
    returns ? `${returns} ${returns === '1' ? 'return' : 'returns'}` : (system.data?.name ?? draft.system),
    submission.decision?.reason
      ? reasonWords[submission.decision.reason]
      : report
        ? findingWords(report, narrow)
        : null,
  ].filter(Boolean);
  return (
    <div role="listitem">
      <a
        href={submissionHref(id)}
        className="r-queue-item"
        data-queue-item={id}
        {...(isOpen && { 'aria-current': 'page' as const })}
        onClick={(event) => followLink(event, submissionHref(id))}
      >
        <span className="r-queue-line">
          <Text weight="semibold">
            <span className="r-hidden">Submission </span>
            {number}
          </Text>
          <StateWord state={state} size={14} />
        </span>
        {music ? <Incipit {...music} space={5} /> : null}
        <span className="r-queue-line">
          <Text size={14} tone="muted">
            {facts.join(' · ')}
          </Text>
          <Text size={14} tone="muted">
            {isMine ? 'yours · ' : ''}
            {waitWords(submission, now)}
          </Text>
        </span>
      </a>
    </div>
  );
}

/** "no findings", "1 note", "2 warnings": the gravest kind, counted. */
function findingWords({ findings }: CheckReport, narrow: boolean): string | null {
  for (const severity of ['blocker', 'warning', 'note'] as const) {
    const count = findings.filter((finding) => finding.severity === severity).length;
    if (count > 0) return `${count} ${severity}${count === 1 ? '' : 's'}`;
  }
  return narrow ? null : 'no findings';
}

/** What is going on: the lease, the check's progress, or how long it has waited. */
function waitWords(submission: SubmissionSummary, now: number): string {
  const { claim, progress, sentAt, decision, updatedAt } = submission;
  if (claim) return claim.byMe ? `claimed, ${minutesLeft(claim.until, now)} min left` : `claimed by ${claim.by}`;
  if (progress) return `returned ${progress.returns} times so far`;
  if (decision) return `since ${ageWords(decision.at, now)}`;
  const age = ageWords(sentAt ?? updatedAt, now);
  return age === 'just now' ? 'sent just now' : `sent ${age} ago`;
}
