import { ageWords } from '@/features/desk/time-words';
import type { Submission, SubmissionEvent } from '@/schemas/generated/contract';

/** Why a submission cannot be accepted now; null when it can. */
export function hindrance({ report, reportIsCurrent, checkState }: Submission): string | null {
  if (checkState === 'queued' || checkState === 'running') return 'Its check is not done yet.';
  if (report === null) return 'There is no report of this revision.';
  return reportIsCurrent ? null : 'Checked by an older engine: check again first.';
}

const isCheckDone = ({ kind }: SubmissionEvent): boolean => kind === 'checked';

/** What a decision stands on: the revision, and how old its report is. */
export function standsOn(submission: Submission, now: number): string {
  const { revision, reportIsCurrent, report, events } = submission;
  const checked = events.findLast((event) => event.revision === revision && isCheckDone(event));
  const age = checked ? ageWords(checked.at, now) : null;
  const old = age === null ? '' : age === 'just now' ? ', just made' : `, ${age} old`;
  const words =
    report === null ? '' : reportIsCurrent ? ` Report by the current engine${old}.` : ' Report by an older engine.';
  return `On revision ${revision}.${words}`;
}
