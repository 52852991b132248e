import { router } from 'expo-router';
import { submissionHref } from '@/features/api/page-addresses';
import { usePageKeys } from '@/features/ui';

/** The neighbour of one in a list, `step` further; the first or last from nowhere; undefined beyond its ends. */
function neighbour(ids: readonly string[], current: string | null, step: 1 | -1): string | undefined {
  const at = current === null ? -1 : ids.indexOf(current);
  if (at < 0) return step === 1 ? ids[0] : ids.at(-1);
  return ids[at + step];
}

/** Id of the queue's item that has the focus. */
const focused = (): string | null =>
  document.activeElement?.closest('[data-queue-item]')?.getAttribute('data-queue-item') ?? null;

/** `j` and `k` go through the queue: with a submission open to the next one, else from item to item, which Enter opens. */
export function useQueueKeys(ids: readonly string[], open: string | null): void {
  const go = (step: 1 | -1) => () => {
    const next = neighbour(ids, open ?? focused(), step);
    if (next === undefined) return;
    if (open !== null) router.push(submissionHref(next));
    else document.querySelector<HTMLElement>(`[data-queue-item="${next}"]`)?.focus();
  };
  usePageKeys({ j: go(1), k: go(-1) });
}
