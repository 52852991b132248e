import { useEffect } from 'react';
import { countWords, wholeNumber } from '@/features/catalogue/count-words';
import { sortLabel } from '@/features/catalogue/sort-choices';
import type { Results } from '@/features/catalogue/use-results';
import { useAnnounce } from '@/features/ui';

/** A result is said when it has rested for so long. */
const REST_MS = 500;

/** The count of a result in figures, said politely once it rests; null while it is not known. */
export function useResultCount(results: Results, order: string): string | null {
  const announce = useAnnounce();
  const { value, relation } = results.total;
  const isKnown = !results.isPending && !results.isOld && results.error === null;
  useEffect(() => {
    if (!isKnown) return undefined;
    const words = `${countWords({ value, relation })}, sorted by ${sortLabel(order)}`;
    const timer = setTimeout(() => announce(words), REST_MS);
    return () => clearTimeout(timer);
  }, [isKnown, value, relation, order, announce]);
  return isKnown ? `${wholeNumber(value)}${relation === 'at-least' ? '+' : ''}` : null;
}
