import type { SearchTerm } from '@/features/catalogue/search-term';
import type { System } from '@/schemas/generated/contract';

/** The system that the terms name; undefined without one. */
export function systemOf(terms: readonly SearchTerm[], systems: readonly System[]): System | undefined {
  const term = terms.find((one) => one.kind === 'system');
  return term && systems.find(({ slug }) => slug === term.slug);
}

/** Names of the named system's variables; null without a system. */
export const variablesOf = (terms: readonly SearchTerm[], systems: readonly System[]): string[] | null =>
  systemOf(terms, systems)?.document.variables.map(({ name }) => name) ?? null;
