import { ageWords } from '@/features/desk/time-words';
import type { SubmissionPage, SubmissionSummary } from '@/schemas/generated/contract';

/** "4 wait, oldest since 3 h": what is in the queue, and how long the oldest has been there. */
export function queueWords(
  total: SubmissionPage['total'] | undefined,
  oldest: SubmissionSummary | undefined,
  now: number,
) {
  if (!total || total.value === 0 || !oldest) return 'nothing waits';
  const age = ageWords(oldest.sentAt ?? oldest.updatedAt, now);
  return `${total.value} ${total.value === 1 ? 'waits' : 'wait'}, oldest since ${age}`;
}
