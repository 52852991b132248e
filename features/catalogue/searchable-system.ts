import type { System } from '@/schemas/generated/contract';
import type { SearchableSystem } from '@/features/catalogue/search-term';

/** What the search line needs to know of a system. */
export const searchableSystem = ({ slug, name, document, sections }: System): SearchableSystem => ({
  slug,
  name,
  parameters: document.parameters.map((parameter) => parameter.name),
  letters: [...new Set(sections.flatMap((section) => section.letters.map(({ letter }) => letter)))],
});
