import { QueryTypes, type Sequelize } from 'sequelize';
import type { CheckRequest } from '@/schemas/generated/contract';
import type { CatalogueOrbit } from '@/server/checks/match-orbits';
import type { EntryContent } from '@/server/models/orbit-revision';
import { numberOf, parametersOf } from '@/server/services/parameters-of';
import type { KnownSystem } from '@/server/services/known-system';

/**
 * Share of the period by which an entry's may differ from the period as typed: twice the largest tolerance, since the
 * corrected period, with which entries are compared, lies within the tolerance.
 */
const PERIOD_WINDOW = 2e-4;
/** An orbit run through more often than this is told by its own crossings that it is not prime. */
const MOST_TURNS = 32;
/** Entries compared with one orbit, those with the nearest periods. */
const MOST_ENTRIES = 300;

interface CatalogueRow extends Pick<CatalogueOrbit, 'accession' | 'section' | 'itinerary'> {
  content: EntryContent;
}

/**
 * Entries that an orbit may turn out to be: of the same flow, with its period or a whole fraction of it.
 *
 * The same orbit from any start, on any section, and under any symmetry has the same period, so none is missed.
 */
export async function catalogueNear(
  db: Sequelize,
  system: KnownSystem,
  body: Pick<CheckRequest, 'parameters' | 'period'>,
): Promise<CatalogueOrbit[]> {
  const { hash } = parametersOf(system.checked, body.parameters);
  const found = await db.query<CatalogueRow>(
    `select o.accession, c.formula as section, r.content, o.itinerary
     from generate_series(1, $4::integer) turns
     join orbit o on o.system_id = $1 and o.parameters_hash = $2
       and o.period between $3::float8 / turns * (1 - $5::float8) and $3::float8 / turns * (1 + $5::float8)
     join section c on c.id = o.section_id
     join orbit_revision r on r.orbit_number = o.number and r.revision = o.revision
     where o.status = 'accepted'
     order by turns, abs(o.period - $3::float8 / turns), o.number limit $6`,
    {
      bind: [system.id, hash, numberOf(body.period).value, MOST_TURNS, PERIOD_WINDOW, MOST_ENTRIES],
      type: QueryTypes.SELECT,
    },
  );
  return found.map(({ content: { period, crossings, returnTimes }, ...entry }) => ({
    ...entry,
    period,
    crossings: crossings.map(({ point }, i) => ({ point, returnTime: returnTimes[i]! })),
  }));
}
