import { createSystemFinder, type FindSystem } from '@/features/catalogue/find-system';
import { scanSearchLine } from '@/features/catalogue/scan-search-line';
import type { FuseClass } from '@/features/ui';
import type { SearchableSystem, SearchTerm } from '@/features/catalogue/search-term';

/** A system's name may be so many words long. */
const LONGEST_NAME = 5;

export type ParseSearchLine = (text: string) => SearchTerm[];

/** A parser that knows these systems; with fuzzy search it forgives slips in their names. */
export function createSearchParser(
  systems: readonly SearchableSystem[],
  fuzzy: FuseClass | null = null,
): ParseSearchLine {
  const find = createSystemFinder(systems, fuzzy);
  return (text) => {
    const named = nameSystem(scanSearchLine(text, null), find);
    const term = named.find((one) => one.kind === 'system');
    const system = term && systems.find(({ slug }) => slug === term.slug);
    const terms = system ? nameSystem(scanSearchLine(text, system), find) : named;
    return joinWords(keepFirst(terms, text));
  };
}

/** Turn the first run of words that names a system into a term; the longest run wins. */
function nameSystem(terms: SearchTerm[], find: FindSystem): SearchTerm[] {
  for (let length = LONGEST_NAME; length > 0; length -= 1) {
    for (let first = 0; first + length <= terms.length; first += 1) {
      const run = terms.slice(first, first + length);
      const words = run.map((term) => (term.kind === 'words' ? term.value : null));
      const system = words.includes(null) ? null : find(words.join(' '));
      if (!system) continue;
      const { slug, name } = system;
      const named: SearchTerm = { kind: 'system', slug, name, start: run[0]!.start, end: run.at(-1)!.end };
      return [...terms.slice(0, first), named, ...terms.slice(first + length)];
    }
  }
  return terms;
}

/** A search holds one term of each kind, parameters by name: a second one is searched as words. */
function keepFirst(terms: SearchTerm[], text: string): SearchTerm[] {
  const seen = new Set<string>();
  return terms.map((term) => {
    const key = keyOf(term);
    if (term.kind === 'words' || !seen.has(key)) {
      seen.add(key);
      return term;
    }
    return { kind: 'words', value: text.slice(term.start, term.end), start: term.start, end: term.end };
  });
}

function keyOf(term: SearchTerm): string {
  if (term.kind === 'period-range') return 'period';
  return term.kind === 'parameter' ? `parameter ${term.name}` : term.kind;
}

/** Plain words that stand side by side are searched together. */
function joinWords(terms: SearchTerm[]): SearchTerm[] {
  const joined: SearchTerm[] = [];
  for (const term of terms) {
    const before = joined.at(-1);
    if (term.kind === 'words' && before?.kind === 'words') {
      joined[joined.length - 1] = { ...before, value: `${before.value} ${term.value}`, end: term.end };
    } else {
      joined.push(term);
    }
  }
  return joined;
}
