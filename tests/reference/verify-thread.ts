import { checkSystem } from '@/server/formulas/check-system';
import type { CheckedSystem } from '@/server/formulas/checked-system';
import { builtInSystems } from '@/server/systems/built-in-systems';
import { readDatasetLine } from '@/tests/reference/dataset-line';
import { measureOrbit, type OrbitErrors } from '@/tests/reference/measure-orbit';

const systems = new Map<string, CheckedSystem>();

/** Check every orbit of some lines; a line that cannot be read is an orbit that is wrong. */
export function verifyLines(lines: readonly string[]): OrbitErrors[] {
  return lines.flatMap((line) => {
    try {
      const orbit = readDatasetLine(line);
      return orbit === null ? [] : [measureOrbit(systemOf(orbit.body.system), orbit)];
    } catch (error) {
      const fault = error instanceof Error ? error.message : String(error);
      return [
        { label: line.slice(0, 60), faults: [fault], period: NaN, multiplier: NaN, returnTimes: NaN, closure: NaN },
      ];
    }
  });
}

function systemOf(named: unknown): CheckedSystem {
  const slug = String(named);
  const known = systems.get(slug);
  if (known) return known;
  const document = builtInSystems.find((system) => system.slug === slug);
  if (!document) throw new Error(`there is no built-in system ${slug}`);
  const checked = checkSystem(document);
  if (!checked.ok) throw new Error(checked.errors.map(({ message }) => message).join(' '));
  systems.set(slug, checked.system);
  return checked.system;
}
