import { useMemo } from 'react';
import { createSearchParser, type ParseSearchLine } from '@/features/catalogue/parse-search-line';
import { searchableSystem } from '@/features/catalogue/searchable-system';
import { useFuse } from '@/features/ui';
import type { System } from '@/schemas/generated/contract';

/** A parser of search lines that knows these systems; once a text holds words that it does not know, also a fuzzy one. */
export function useSearchParser(systems: readonly System[], ...texts: string[]): ParseSearchLine {
  const searchable = useMemo(() => systems.map(searchableSystem), [systems]);
  const exact = useMemo(() => createSearchParser(searchable), [searchable]);
  const fuzzy = useFuse(texts.some((text) => exact(text).some(({ kind }) => kind === 'words')));
  return useMemo(() => (fuzzy ? createSearchParser(searchable, fuzzy) : exact), [searchable, exact, fuzzy]);
}
