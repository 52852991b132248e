import type { System } from '@/schemas/generated/contract';

/** With so many or fewer, every parameter is named; else those that differ from the system's own. */
const FEW = 3;

/** The parameters that a line of text names, of all that an orbit has. */
export function shownParameters(
  parameters: Readonly<Record<string, string>>,
  system: System | undefined,
): Record<string, string> {
  const names = Object.keys(parameters);
  if (names.length <= FEW || !system) return { ...parameters };
  const own = new Map(system.document.parameters.map(({ name, value }) => [name, String(value)]));
  return Object.fromEntries(Object.entries(parameters).filter(([name, value]) => own.get(name) !== value));
}
