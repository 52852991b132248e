import type { System, SystemDocument } from '@/schemas/generated/contract';

type Staff = System['sections'][number]['incipit'];

/** Levels where the system names none: five whole units around zero. */
const PLAIN_LEVELS = [2, 1, 0, -1, -2];

/**
 * The coordinate and the five levels of the staff on which orbits of a section are drawn.
 *
 * A section that the system does not name, or names without a staff, is drawn on that of the first section that has
 * one; without any, on the first coordinate that is not an angle.
 */
export function staffOf(document: SystemDocument, sectionName: string | null): Staff {
  const sections = document.sections ?? [];
  const own = sections.find(({ name }) => name === sectionName)?.incipit;
  const first = sections.find(({ incipit }) => incipit)?.incipit;
  const coordinate = (document.variables.find(({ modulus }) => modulus === undefined) ?? document.variables[0])?.name;
  return own ?? first ?? { coordinate: coordinate ?? '', levels: PLAIN_LEVELS };
}
