import type { PlaneLevel } from './plane-level';

/** The first two coordinates that vary on the section; in the plane, both. */
export function sectionAxes(variables: readonly string[], section: PlaneLevel | null): [string, string] {
  const free = variables.filter((name) => name !== section?.variable);
  const [a, b] = free.length > 1 ? free : variables;
  return [a ?? '', b ?? a ?? ''];
}
