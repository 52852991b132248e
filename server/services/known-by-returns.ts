import type { KnownByReturns, SystemDocument } from '@/schemas/generated/contract';
import { readTypedNumber } from '@/server/formulas/typed-number';
import type { ReturnsRow } from '@/server/services/list-systems';

/** Sets of parameters that are listed for a system, those with most entries first. */
const MAX_SETS = 40;

interface CountSet {
  section: string;
  parameters: Record<string, string>;
  known: Map<number, number>;
  allowed: Map<number, number>;
  source: string | null;
}

/**
 * Entries by number of returns, for each section and set of parameters: beside what the catalogue holds, what the
 * system's symbolic dynamics allows where its document has a table.
 */
export function knownByReturns(document: SystemDocument, rows: readonly ReturnsRow[]): KnownByReturns[] {
  const sets = new Map<string, CountSet>();
  const setOf = (section: string, parameters: Record<string, string>, values: Record<string, number>): CountSet => {
    const key = JSON.stringify([section, Object.entries(values).sort(([a], [b]) => (a < b ? -1 : 1))]);
    const set = sets.get(key) ?? { section, parameters, known: new Map(), allowed: new Map(), source: null };
    sets.set(key, set);
    return set;
  };
  for (const { section, parameters, source, allowedByReturns } of document.counts ?? []) {
    const whole = wholeParameters(document, parameters);
    const set = setOf(section, whole, valuesOf(whole));
    set.source = source;
    for (const [returns, allowed] of Object.entries(allowedByReturns)) set.allowed.set(parseInt(returns, 10), allowed);
  }
  for (const { section, parameters, parameter_values, returns, known } of rows) {
    setOf(section, parameters, parameter_values).known.set(returns, known);
  }
  return [...sets.values()]
    .map(present)
    .sort((a, b) => b.known - a.known)
    .slice(0, MAX_SETS);
}

function present({ section, parameters, known, allowed, source }: CountSet): KnownByReturns {
  const returns = [...new Set([...known.keys(), ...allowed.keys()])].sort((a, b) => a - b);
  return {
    section,
    parameters,
    known: [...known.values()].reduce((sum, count) => sum + count, 0),
    rows: returns.map((n) => ({ returns: n, known: known.get(n) ?? 0, allowed: allowed.get(n) ?? null })),
    source,
  };
}

/** All parameters of a system, those left out with its own values. */
function wholeParameters(
  document: SystemDocument,
  given: NonNullable<SystemDocument['counts']>[number]['parameters'],
): Record<string, string> {
  return Object.fromEntries(document.parameters.map(({ name, value }) => [name, String(given[name] ?? value)]));
}

const valuesOf = (parameters: Record<string, string>): Record<string, number> =>
  Object.fromEntries(
    Object.entries(parameters).flatMap(([name, text]) => {
      const read = readTypedNumber(text);
      return read.ok ? [[name, read.number.value]] : [];
    }),
  );
