import type { SearchTerm, TermKind } from '@/features/catalogue/search-term';

const tidy = (text: string): string => text.replace(/\s+/g, ' ').replace(/\s+,/g, ',').trim();

/** The search line without a term's words. */
export const removeTerm = (text: string, term: SearchTerm): string =>
  tidy(`${text.slice(0, term.start)} ${text.slice(term.end)}`);

/**
 * The search line with other words for one kind of term: in the place of the old ones, else at the end.
 * No words takes the term out.
 */
export function replaceTerm(
  text: string,
  terms: readonly SearchTerm[],
  change: { kinds: readonly TermKind[]; words: string },
): string {
  const old = terms.find((term) => change.kinds.includes(term.kind));
  if (!old) return tidy(`${text} ${change.words}`);
  return tidy(`${text.slice(0, old.start)} ${change.words} ${text.slice(old.end)}`);
}
