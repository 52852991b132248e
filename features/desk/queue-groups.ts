import type { SubmissionSummary } from '@/schemas/generated/contract';

/** Part of the queue: whose turn it is, and what waits for them. */
export interface QueueGroup {
  title: string;
  items: readonly SubmissionSummary[];
}

/** A curator decides on what is nobody's claim or their own, and never on what they sent. */
const isMyTurn = ({ turn, isMine, claim }: SubmissionSummary): boolean =>
  turn === 'curator' && !isMine && (claim === null || claim.byMe);

/** The queue as a curator sees it, their own turn first; groups without an item are left out. */
export function queueGroups(
  review: readonly SubmissionSummary[],
  returned: readonly SubmissionSummary[],
): readonly QueueGroup[] {
  const contributors = [...review.filter(({ turn }) => turn === 'contributor'), ...returned];
  return [
    { title: 'Your turn', items: review.filter(isMyTurn) },
    { title: 'Another curator’s turn', items: review.filter((item) => item.turn === 'curator' && !isMyTurn(item)) },
    { title: 'Contributor’s turn', items: contributors },
    { title: 'Machine’s turn', items: review.filter(({ turn }) => turn === 'machine') },
  ].filter(({ items }) => items.length > 0);
}
