import { formatCount } from '@/features/notation/format-count';
import type { CheckedOrbit, System } from '@/schemas/generated/contract';

/** What the catalogue would hold of orbits with as many returns once this one is in it; null where nothing is counted. */
export function withIt(
  orbit: CheckedOrbit,
  system: System | undefined,
  { section, parameters }: { section: string; parameters: Readonly<Record<string, string>> },
): string | null {
  const own = system?.document.parameters.map(({ name, value }) => [name, parameters[name] ?? String(value)]) ?? [];
  const table = system?.knownByReturns.find(
    (one) => one.section === section && own.every(([name = '', value]) => one.parameters[name] === value),
  );
  const row = table?.rows.find(({ returns }) => returns === orbit.returns);
  const known = (row?.known ?? 0) + 1;
  const returns = `${orbit.returns} ${orbit.returns === 1 ? 'return' : 'returns'}`;
  if (!system) return null;
  if (row === undefined || row.allowed === null) {
    return `With it, the catalogue holds ${formatCount(known)} ${known === 1 ? 'orbit' : 'orbits'} of it with ${returns}.`;
  }
  return `With it, the catalogue holds ${formatCount(known)} of ${formatCount(row.allowed)} orbits with ${returns}.`;
}
