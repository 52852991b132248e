import type { FuseClass } from '@/features/ui';
import type { SearchableSystem } from '@/features/catalogue/search-term';

/** How far a word may be from a system's name: 0 is the same, 1 anything. */
const FUZZINESS = 0.35;
/** Shorter words must be right: too many names are near them. */
const SHORTEST_FUZZY = 4;
/** A beginning of at least so many letters stands for the name, when only one name begins so. */
const SHORTEST_PREFIX = 3;

export type FindSystem = (words: string) => SearchableSystem | null;

/**
 * A finder of systems by name or slug, forgiving accents, hyphens and case, and, once the fuzzy search is there, a
 * slip of the finger.
 */
export function createSystemFinder(systems: readonly SearchableSystem[], fuzzy: FuseClass | null): FindSystem {
  const named = systems.map((system) => ({ system, names: [plain(system.name), plain(system.slug)] }));
  const fuse = fuzzy && new fuzzy(named, { keys: ['names'], threshold: FUZZINESS, includeScore: true });

  return (words) => {
    const wanted = plain(words);
    const same = named.find(({ names }) => names.includes(wanted));
    if (same) return same.system;
    if (wanted.length >= SHORTEST_PREFIX) {
      const beginning = named.filter(({ names }) => names.some((name) => name.startsWith(wanted)));
      if (beginning.length === 1) return beginning[0]!.system;
      if (beginning.length > 1) return null;
    }
    if (wanted.length < SHORTEST_FUZZY) return null;
    return fuse?.search(wanted, { limit: 1 })[0]?.item.system ?? null;
  };
}

/** Small letters without accents; hyphens, dashes and dots become single spaces. */
const plain = (text: string): string =>
  text
    .normalize('NFD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/[^\p{L}\d]+/gu, ' ')
    .trim();
