import { useMemo } from 'react';
import { useEntriesOf } from '@/features/api/orbits';
import { searchFilter } from '@/features/catalogue/search-filter';
import type { SearchTerm } from '@/features/catalogue/search-term';
import { toDouble } from '@/features/notation/to-double';

/** How the periods of a result are spread: for a picture. */
export interface PeriodSlices {
  /** Orbits in slices of equal width. */
  counts: number[];
  shortest: string;
  longest: string;
}

const SLICES = 56;
/** A picture of fewer says nothing. */
const FEWEST = 3;

/**
 * The periods under all filters but the one on the period; null without a system, and where the result is larger
 * than one answer, since a part of it would give a wrong picture.
 */
export function usePeriodSlices(terms: readonly SearchTerm[]): PeriodSlices | null {
  const others = terms.filter(({ kind }) => kind !== 'period' && kind !== 'period-range' && kind !== 'near');
  const hasSystem = others.some(({ kind }) => kind === 'system');
  const found = useEntriesOf(searchFilter(others, 'period'), hasSystem);
  return useMemo(() => {
    if (!hasSystem || !found.data || found.data.next !== null) return null;
    return slicesOf(found.data.items.map(({ period }) => period));
  }, [hasSystem, found.data]);
}

/** Periods, rising, in slices. */
export function slicesOf(periods: readonly string[]): PeriodSlices | null {
  const [shortest] = periods;
  const longest = periods.at(-1);
  if (shortest === undefined || longest === undefined || periods.length < FEWEST) return null;
  const from = toDouble(shortest);
  const width = (toDouble(longest) - from) / SLICES;
  if (width <= 0) return null;
  const counts = Array.from({ length: SLICES }, () => 0);
  for (const period of periods) {
    const slice = Math.min(SLICES - 1, Math.floor((toDouble(period) - from) / width));
    counts[slice] = (counts[slice] ?? 0) + 1;
  }
  return { counts, shortest, longest };
}
