import { useEffect, useMemo } from 'react';
import { useOrbitSearch } from '@/features/api/orbits';
import { entryHref, searchHref } from '@/features/api/page-addresses';
import { useSystems } from '@/features/api/systems';
import { countWords } from '@/features/catalogue/count-words';
import { termInText } from '@/features/catalogue/describe-term';
import { searchFilter } from '@/features/catalogue/search-filter';
import { useSearchParser } from '@/features/catalogue/use-search-parser';
import type { System } from '@/schemas/generated/contract';

const NONE: System[] = [];

/** Where an entry was found: the way back, and its neighbours in the result. */
export interface SearchTrail {
  href: string;
  /** "12 orbits" */
  label: string;
  /** What was asked for, in words. */
  detail: string;
  previous: string | null;
  next: string | null;
}

/** The search that led to an entry; null when none did. */
export function useSearchTrail(accession: string, text: string, sort: string): SearchTrail | null {
  const systems = useSystems();
  const parse = useSearchParser(systems.data ?? NONE, text);
  const terms = useMemo(() => parse(text), [parse, text]);
  const search = useOrbitSearch(searchFilter(terms, sort), text !== '' && systems.isSuccess);
  const pages = search.data?.pages ?? [];
  const accessions = pages.flatMap((page) => page.items.map((item) => item.accession));
  const at = accessions.indexOf(accession);
  const { hasNextPage, isFetchingNextPage, fetchNextPage } = search;

  // The neighbour of the last one is on the next page.
  const isAtEnd = at >= 0 && at === accessions.length - 1;
  useEffect(() => {
    if (isAtEnd && hasNextPage && !isFetchingNextPage) void fetchNextPage();
  }, [isAtEnd, hasNextPage, isFetchingNextPage, fetchNextPage]);

  if (text === '') return null;
  const hrefAt = (index: number) => {
    const other = at < 0 ? undefined : accessions[index];
    return other === undefined ? null : entryHref(other, { text, sort });
  };
  const total = pages[0]?.total;
  return {
    href: searchHref(text, sort),
    label: total ? countWords(total) : 'Results',
    detail: terms.map(termInText).join(', '),
    previous: at > 0 ? hrefAt(at - 1) : null,
    next: hrefAt(at + 1),
  };
}
