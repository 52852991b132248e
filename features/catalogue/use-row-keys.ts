import { useEffect, useState } from 'react';
import { usePageKeys } from '@/features/ui';

/** `j` and `k` walk the results, Enter opens the one selected, Escape lets go. */
export function useRowKeys(
  hrefs: readonly string[],
  onOpen: (href: string) => void,
): [selected: number | null, clear: () => void] {
  const [selected, setSelected] = useState<number | null>(null);
  const last = hrefs.length - 1;
  const at = selected !== null && selected <= last ? selected : null;
  const clear = () => setSelected(null);
  usePageKeys({
    j: () => setSelected(at === null ? 0 : Math.min(last, at + 1)),
    k: () => setSelected(at === null ? last : Math.max(0, at - 1)),
    Escape: clear,
    ...(at !== null && { Enter: () => onOpen(hrefs[at]!) }),
  });
  useEffect(() => {
    if (at === null) return;
    document.querySelectorAll('[data-result]')[at]?.scrollIntoView({ block: 'nearest' });
  }, [at]);
  return [at, clear];
}
