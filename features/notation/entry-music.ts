import type { Entry, System } from '@/schemas/generated/contract';
import { crossingLetters } from './crossing-letters';
import type { IncipitMusic } from './incipit-props';
import { orbitMusic, type IncipitChoice } from './orbit-music';

/** Levels where nothing is known of the system: five whole units around zero. */
const PLAIN_LEVELS = [2, 1, 0, -1, -2];

/** The staff on which orbits of a section are drawn: the section's own, else that of the system's first section. */
export function sectionStaff(system: System | undefined, sectionName: string | null): IncipitChoice {
  const section = system?.sections.find(({ name }) => name === sectionName) ?? system?.sections[0];
  return section?.incipit ?? { coordinate: system?.document.variables[0]?.name ?? '', levels: PLAIN_LEVELS };
}

/** What the incipit of an entry draws. */
export function entryMusic(
  entry: Entry,
  system: System | undefined,
  flow: readonly (readonly number[])[] | null = null,
): IncipitMusic {
  const incipit = sectionStaff(system, entry.section.name);
  const variables = system?.document.variables.map(({ name }) => name) ?? [];
  const angle = system?.document.variables.find(({ name }) => name === incipit.coordinate)?.modulus;
  const letters = system?.sections.find(({ name }) => name === entry.section.name)?.letters ?? [];
  return {
    ...orbitMusic(entry, {
      variables,
      incipit,
      state: entry.status,
      flow,
      modulus: angle === undefined ? null : angleModulus(angle),
    }),
    letters: entry.itinerary === null ? null : crossingLetters(letters, variables, startFirst(entry)),
  };
}

/** The points of the crossings as an incipit draws them: the last, which is the start, first. */
function startFirst({ crossings }: Entry): string[][] {
  const points = crossings.map(({ point }) => point);
  const last = points.at(-1);
  return last === undefined ? [] : [last, ...points.slice(0, -1)];
}

/** A modulus such as `2*pi` or `360`, for drawing. */
function angleModulus(formula: string): number | null {
  const [, factor, isPi] = /^(?:([\d.]+)\s*\*?\s*)?(pi)?$/.exec(formula.trim()) ?? [];
  if (factor === undefined && isPi === undefined) return null;
  return parseFloat(factor ?? '1') * (isPi ? Math.PI : 1);
}
