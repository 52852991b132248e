import { useReturnedSubmissions, useReviewQueue } from '@/features/api/submissions';
import { queueGroups } from '@/features/desk/queue-groups';

/** The queue by whose turn it is, with the addresses of its submissions in the order shown. */
export function useQueue(isCurator: boolean) {
  const review = useReviewQueue(isCurator);
  const returned = useReturnedSubmissions(isCurator);
  const itemsOf = (list: typeof review) => list.data?.pages.flatMap(({ items }) => items) ?? [];
  const groups = queueGroups(itemsOf(review), itemsOf(returned));
  const waiting = groups.find(({ title }) => title === 'Your turn')?.items ?? [];
  return { review, returned, groups, waiting, all: groups.flatMap(({ items }) => items) };
}
