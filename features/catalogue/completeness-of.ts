import type { KnownByReturns, System } from '@/schemas/generated/contract';

/** How complete the catalogue is for one system and one set of parameters. */
export type Completeness = {
  /** name → value, in the system's order */
  parameters: [string, string][];
  known: number;
} & (
  | { kind: 'complete'; upTo: number; allowed: number }
  | { kind: 'partial'; upTo: number; allowed: number }
  | { kind: 'unknown' }
);

/**
 * Entries against what the symbolic dynamics allows.
 *
 * @param chosen parameters that differ from the system's defaults.
 * @returns null when nothing is known for these parameters.
 */
export function completenessOf(system: System, chosen: Record<string, string> = {}): Completeness | null {
  const parameters = system.document.parameters.map(({ name, value }): [string, string] => [
    name,
    chosen[name] ?? String(value),
  ]);
  const table = bestTable(system.knownByReturns, parameters);
  if (!table) return null;
  const counted = table.rows.filter((row): row is Counted => row.allowed !== null);
  if (counted.length === 0) return { kind: 'unknown', parameters, known: table.known };
  const complete = completeRows(counted);
  if (complete.length > 0) return { kind: 'complete', parameters, ...sum(complete) };
  const upTo = Math.max(...counted.filter(({ known }) => known > 0).map(({ returns }) => returns));
  const reached = counted.filter(({ returns }) => returns <= upTo);
  if (reached.length === 0) return { kind: 'unknown', parameters, known: table.known };
  return { kind: 'partial', parameters, ...sum(reached) };
}

interface Counted {
  returns: number;
  known: number;
  allowed: number;
}

/** The section with a count to compare with, else the one with the most entries. */
function bestTable(tables: KnownByReturns[], parameters: [string, string][]): KnownByReturns | undefined {
  const fitting = tables.filter((table) => parameters.every(([name, value]) => table.parameters[name] === value));
  const counted = fitting.filter((table) => table.rows.some((row) => row.allowed !== null));
  return [...(counted.length > 0 ? counted : fitting)].sort((a, b) => b.known - a.known)[0];
}

/** The rows from the first number of returns on up to the last before one is missing something. */
function completeRows(rows: Counted[]): Counted[] {
  const rising = [...rows].sort((a, b) => a.returns - b.returns);
  const missing = rising.findIndex(({ known, allowed }) => known < allowed);
  return missing < 0 ? rising : rising.slice(0, missing);
}

function sum(rows: Counted[]): { upTo: number; known: number; allowed: number } {
  return {
    upTo: Math.max(...rows.map(({ returns }) => returns)),
    known: rows.reduce((total, row) => total + Math.min(row.known, row.allowed), 0),
    allowed: rows.reduce((total, row) => total + row.allowed, 0),
  };
}
