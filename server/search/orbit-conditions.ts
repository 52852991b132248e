import type { OrbitSearch } from '@/server/search/read-search';
import { foldText } from '@/server/search/fold-text';
import type { Binds } from '@/server/search/sql';

/** What a search needs to know of the database before it can be put into SQL. */
export interface KnownSystem {
  id: string;
  /** Units of the coordinates of `crossing.place`; null before the first entry. */
  extents: number[] | null;
}

/** A search whose typed values have been looked up. */
export interface ResolvedSearch extends OrbitSearch {
  found: KnownSystem | null;
  /** The point of `near` as a cube in units of the system's extents. */
  place: string | null;
}

/** Conditions on `orbit o` that hold for every entry of the search, and for no other. */
export function orbitConditions(search: ResolvedSearch, binds: Binds): string[] {
  return [
    `o.status = 'accepted'`,
    ...systemConditions(search, binds),
    ...periodConditions(search, binds),
    ...wordConditions(search, binds),
  ];
}

function systemConditions({ found, parameters, returns, stability, evidence }: ResolvedSearch, binds: Binds): string[] {
  const conditions: string[] = [];
  if (found) conditions.push(`o.system_id = ${binds.add(found.id)}`);
  if (parameters.length > 0) {
    conditions.push(`o.parameter_values @> ${binds.add(JSON.stringify(Object.fromEntries(parameters)))}::jsonb`);
  }
  if (returns) conditions.push(`o.returns between ${binds.add(returns.from)} and ${binds.add(returns.to)}`);
  if (stability) conditions.push(`o.stability = any(${binds.add(stability)}::text[])`);
  if (evidence) conditions.push(`o.evidence = any(${binds.add(evidence)}::text[])`);
  return conditions;
}

/**
 * Bounds of the period, exact: `period_digits` decides, and the indexed double beside it, which rounds to nearest and
 * so never crosses a bound, narrows the scan.
 */
function periodConditions({ period, periodMin, periodMax }: ResolvedSearch, binds: Binds): string[] {
  const conditions: string[] = [];
  const bound = (text: string, holds: '>=' | '<' | '<='): void => {
    const place = `${binds.add(text)}::numeric`;
    conditions.push(`o.period ${holds === '<' ? '<=' : holds} ${place}::float8`, `o.period_digits ${holds} ${place}`);
  };
  if (period) {
    bound(period.from, '>=');
    bound(period.to, '<');
  }
  if (periodMin) bound(periodMin, '>=');
  if (periodMax) bound(periodMax, '<=');
  return conditions;
}

function wordConditions({ itinerary, itineraryContains, text }: ResolvedSearch, binds: Binds): string[] {
  const conditions: string[] = [];
  if (itinerary) conditions.push(`o.itinerary = ${binds.add(itinerary)}`);
  if (itineraryContains) {
    const letters = binds.add(itineraryContains);
    // Read round: as many turns as the letters asked for can reach over.
    const turns = `${binds.add(itineraryContains.length)}::integer / length(o.itinerary) + 2`;
    conditions.push(`strpos(repeat(o.itinerary, ${turns}), ${letters}) > 0`);
  }
  for (const word of foldText(text ?? '')
    .split(/\s+/)
    .filter(Boolean)) {
    conditions.push(`o.search_text like ${binds.add(`%${word.replaceAll(/[\\%_]/g, '\\$&')}%`)}`);
  }
  return conditions;
}
