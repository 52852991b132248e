import type { SubmissionSummary } from '@/schemas/generated/contract';

type States = Pick<SubmissionSummary, 'reviewState' | 'checkState' | 'verdict'>;

/** The check's state in words, beside the review state. */
export function checkWords({ checkState, verdict }: States): string {
  switch (checkState) {
    case 'none':
      return 'not checked';
    case 'queued':
      return 'waits for its check';
    case 'running':
      return 'is being checked';
    case 'failed':
      return 'the check broke';
    case 'stale':
      return 'checked by an older engine';
    case 'done':
      return verdict === null ? 'checked' : verdict.replace(/-/g, ' ');
  }
}
