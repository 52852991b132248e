import type { FuseClass } from '@/features/ui';
import type { System } from '@/schemas/generated/contract';

/** How far a word may be from what it finds: 0 is the same, 1 anything. */
const FUZZINESS = 0.35;

const withoutAccents = (text: string): string => text.normalize('NFD').replace(/\p{M}/gu, '');

/**
 * A search of systems by name, address or summary; all of them, by name, when nothing is typed. Without fuzzy search
 * it finds what holds the words as typed.
 */
export function createSystemSearch(systems: readonly System[], fuzzy: FuseClass | null): (text: string) => System[] {
  const byName = [...systems].sort((a, b) => a.name.localeCompare(b.name, 'en'));
  const items = byName.map((system) => ({
    system,
    name: withoutAccents(system.name),
    slug: system.slug,
    summary: withoutAccents(system.summary ?? ''),
  }));
  const fuse =
    fuzzy &&
    new fuzzy(items, {
      keys: [{ name: 'name', weight: 3 }, { name: 'slug', weight: 2 }, 'summary'],
      threshold: FUZZINESS,
      ignoreLocation: true,
      minMatchCharLength: 2,
    });
  return (text) => {
    const wanted = withoutAccents(text.trim());
    if (wanted === '') return byName;
    if (fuse) return fuse.search(wanted).map(({ item }) => item.system);
    const holds = (part: string) => part.toLowerCase().includes(wanted.toLowerCase());
    return items.filter(({ name, slug, summary }) => [name, slug, summary].some(holds)).map(({ system }) => system);
  };
}
