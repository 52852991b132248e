import { QueryTypes, type Sequelize, type Transaction } from 'sequelize';
import type { CheckedOrbit } from '@/schemas/generated/contract';
import { Problem } from '@/server/errors';
import { sameCrossings } from '@/server/checks/same-crossings';
import type { CheckedSection } from '@/server/formulas/checked-system';
import type { EntryContent } from '@/server/models/orbit-revision';
import type { KnownSystem } from '@/server/services/known-system';
import { numberOf } from '@/server/services/parameters-of';

/** An acceptance takes no longer than this from its first row to its end, when others can see it. */
const UNSEEN_SECONDS = 30;
/** Periods of one orbit, corrected twice, differ by less than this share. */
const PERIOD_WINDOW = 1e-6;

export interface OrbitToAccept {
  system: KnownSystem;
  section: CheckedSection;
  parametersHash: string;
  orbit: CheckedOrbit;
  tolerance: number;
  /** The check compared the orbit with everything that was in the catalogue then. */
  comparedAt: Date;
}

/**
 * Let acceptances into one system pass one at a time, and refuse an orbit that came in since its check.
 *
 * @throws {Problem} `already-known`; `stale-check` when an entry with this period came in on another section, which
 *   only a new check can compare.
 */
export async function refuseKnownOrbit(
  db: Sequelize,
  { system, section, parametersHash, orbit, tolerance, comparedAt }: OrbitToAccept,
  transaction: Transaction,
): Promise<void> {
  await db.query('select pg_advisory_xact_lock(hashtextextended($1, 2))', { bind: [system.id], transaction });
  const recent = await db.query<{ accession: string; formula: string; content: EntryContent }>(
    `select o.accession, c.formula, r.content from orbit o
     join section c on c.id = o.section_id
     join orbit_revision r on r.orbit_number = o.number and r.revision = o.revision
     where o.system_id = $1 and o.parameters_hash = $2 and o.status = 'accepted' and o.accepted_at >= $4::timestamptz - make_interval(secs => $6)
       and o.period between $3::float8 * (1 - $5::float8) and $3::float8 * (1 + $5::float8)`,
    {
      bind: [system.id, parametersHash, numberOf(orbit.period).value, comparedAt, PERIOD_WINDOW, UNSEEN_SECONDS],
      type: QueryTypes.SELECT,
      transaction,
    },
  );
  const moduli = system.checked.variables.map(({ modulus }) => modulus);
  const own = { points: orbit.crossings.map(({ point }) => point), extent: orbit.extent, tolerance };
  for (const { accession, formula, content } of recent) {
    if (formula !== section.formula) {
      throw new Problem(
        'stale-check',
        `${accession}, of the same period on another section, was accepted since this check. Check it again.`,
      );
    }
    if (sameCrossings(own, { points: content.crossings.map(({ point }) => point) }, moduli)) {
      throw new Problem('already-known', `This orbit was accepted as ${accession} since it was checked.`);
    }
  }
}
