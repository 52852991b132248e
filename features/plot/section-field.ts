import { crossingLetters } from '@/features/notation/crossing-letters';
import { toDouble } from '@/features/notation/to-double';
import type { Entry, System } from '@/schemas/generated/contract';
import { compileFormula, type Scope } from './compile-formula';
import { planeLevel } from './plane-level';
import type { RegionLetter } from './section-sheet';

type SystemSection = System['sections'][number];
type PlanePoint = readonly [number, number];

/** A section that is a plane of two coordinates, with what is needed to draw it. */
export interface SectionField {
  /** The two coordinates that vary on it. */
  names: [string, string];
  /** grad u · f there. */
  sign: (x: number, y: number) => number;
}

/**
 * The section as a plane of two coordinates: of a system of three variables, the level of one of them.
 * null for every other section, and where a formula cannot be read here.
 *
 * @param chosen parameters that differ from the system's.
 */
export function sectionField(
  system: System,
  section: Pick<SystemSection, 'formula'>,
  chosen: Readonly<Record<string, string>> = {},
): SectionField | null {
  const { document } = system;
  const variables = document.variables.map(({ name }) => name);
  const level = planeLevel(section.formula, variables);
  const free = variables.filter((name) => name !== level?.variable);
  const [a, b] = free;
  if (!level || free.length !== 2 || a === undefined || b === undefined) return null;
  const speed = compileFormula(document.equations[level.variable] ?? '');
  const u = compileFormula(section.formula);
  if (!speed || !u) return null;
  const parameters = Object.fromEntries(
    document.parameters.map(({ name, value }) => [name, toDouble(chosen[name] ?? value)]),
  );
  const scopeAt = definedScope(document);
  if (!scopeAt) return null;
  const side = u({ ...parameters, [level.variable]: level.level + 1 }) < 0 ? -1 : 1;
  return {
    names: [a, b],
    sign: (x, y) => side * speed(scopeAt({ ...parameters, [a]: x, [b]: y, [level.variable]: level.level })),
  };
}

/** Adds the values of the definitions, in their order; null where one cannot be read. */
function definedScope(document: System['document']): ((scope: Scope) => Scope) | null {
  const definitions = (document.definitions ?? []).map(({ name, formula }) => ({
    name,
    value: compileFormula(formula),
  }));
  if (definitions.some(({ value }) => value === null)) return null;
  return (scope) => {
    const defined: Record<string, number> = { ...scope };
    for (const { name, value } of definitions) defined[name] = value?.(defined) ?? NaN;
    return defined;
  };
}

/** One known crossing and the entry that it belongs to. */
export interface KnownCrossing {
  accession: string;
  point: PlanePoint;
  letter: string | null;
}

/** The crossings of entries on one section, in the plane of two coordinates. */
export function knownCrossings(
  entries: readonly Entry[],
  system: System,
  section: SystemSection,
  names: readonly [string, string],
): KnownCrossing[] {
  const variables = system.document.variables.map(({ name }) => name);
  const [a, b] = [variables.indexOf(names[0]), variables.indexOf(names[1])];
  return entries
    .filter((entry) => entry.section.name === section.name)
    .flatMap(({ accession, crossings }) => {
      const letters = crossingLetters(
        section.letters,
        variables,
        crossings.map(({ point }) => point),
      );
      return crossings.map(({ point }, index) => ({
        accession,
        point: [toDouble(point[a] ?? '0'), toDouble(point[b] ?? '0')] as const,
        letter: letters?.[index] ?? null,
      }));
    });
}

/** How far beyond its outermost crossing a letter stands, in distances of that crossing from the middle. */
const BEYOND = 0.1;

/** Where each letter stands: outside its region, beyond the crossing farthest from the middle of all. */
export function regionLetters(crossings: readonly KnownCrossing[]): RegionLetter[] {
  if (crossings.length === 0) return [];
  const middle = [0, 1].map((i) => crossings.reduce((sum, { point }) => sum + point[i as 0 | 1], 0) / crossings.length);
  const [mx = 0, my = 0] = middle;
  const farthest = new Map<string, PlanePoint>();
  for (const { letter, point } of crossings) {
    if (letter === null) continue;
    const known = farthest.get(letter);
    const distance = ([x, y]: PlanePoint) => Math.hypot(x - mx, y - my);
    if (!known || distance(point) > distance(known)) farthest.set(letter, point);
  }
  return [...farthest].map(([letter, [x, y]]) => ({
    letter,
    x: x + (x - mx) * BEYOND,
    y: y + (y - my) * BEYOND,
  }));
}
