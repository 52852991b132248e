import type { System } from '@/schemas/generated/contract';
import { knownByReturns } from '@/server/services/known-by-returns';
import type { ListedSystem } from '@/server/services/list-systems';
import { staffOf } from '@/server/services/staff-of';
import { typesetSystem } from '@/server/services/typeset-system';

/** A system as the API shows it. */
export function presentSystem(system: ListedSystem): System {
  const { slug, version, document, returns } = system;
  const typeset = typesetSystem(system);
  return {
    slug,
    version,
    name: document.name,
    summary: document.summary ?? null,
    acceptedAt: system.accepted_at.toISOString(),
    dimension: document.variables.length,
    document,
    mathml: typeset.mathml,
    text: typeset.text,
    divergence: typeset.divergence,
    sections: (document.sections ?? []).map(({ name, formula, description, letters }) => ({
      name,
      formula: typeset.sections.get(name)?.formula ?? formula,
      description: description ?? null,
      mathml: typeset.sections.get(name)?.mathml ?? '',
      letters: (letters ?? []).map(({ letter, where }) => ({ letter, where })),
      incipit: staffOf(document, name),
      entries: returns.reduce((sum, row) => (row.section === name ? sum + row.known : sum), 0),
    })),
    entries: system.entries,
    shortest: system.shortest,
    knownByReturns: knownByReturns(document, returns),
    links: {
      self: `/api/v1/systems/${slug}`,
      page: `/systems/${slug}`,
      orbits: `/api/v1/orbits?system=${slug}`,
    },
  };
}
